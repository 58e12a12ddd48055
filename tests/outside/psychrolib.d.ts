/** The part of npm psychrolib (no types of its own) that the climate checks call. */
declare module 'psychrolib' {
  const psychrolib: {
    readonly SI: number;
    SetUnitSystem(system: number): void;
    /** Dew point in °C from dry bulb in °C and relative humidity from 0 to 1. */
    GetTDewPointFromRelHum(dryBulb: number, relativeHumidity: number): number;
    /** Saturation pressure in Pa over water or ice. */
    GetSatVapPres(dryBulb: number): number;
  };
  export default psychrolib;
}
