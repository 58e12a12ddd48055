import type { Basis } from './figure.ts';

export interface StringMaterial {
  name: string;
  densityKgM3: number;
  basis: Basis;
  source: string;
}

const MEMORY = { basis: 'from memory', source: 'Handbook value, from memory' } as const;

/** Materials of plain strings and cores, kg/m³. */
export const CORE_MATERIALS = {
  steel: {
    name: 'Steel',
    densityKgM3: 7850,
    basis: 'from memory',
    source:
      'Carbon steel, from memory; a materials page for ASTM A228 wire that was read gives 7800: ±0.6 %',
  },
  nylon: { name: 'Nylon', densityKgM3: 1140, ...MEMORY },
  fluorocarbon: { name: 'Fluorocarbon (PVDF)', densityKgM3: 1780, ...MEMORY },
  gut: { name: 'Gut', densityKgM3: 1300, ...MEMORY },
} as const satisfies Record<string, StringMaterial>;

/** Materials of wraps, kg/m³. */
export const WRAP_MATERIALS = {
  'nickel-plated steel': { name: 'Nickel-plated steel', densityKgM3: 7900, ...MEMORY },
  nickel: { name: 'Pure nickel', densityKgM3: 8900, ...MEMORY },
  'stainless steel': {
    name: 'Stainless steel',
    densityKgM3: 7800,
    basis: 'from memory',
    source: 'Middle of 7700 to 7900, from memory',
  },
  'phosphor bronze': { name: 'Phosphor bronze', densityKgM3: 8860, ...MEMORY },
  brass: { name: '80/20 brass', densityKgM3: 8670, ...MEMORY },
  copper: { name: 'Copper', densityKgM3: 8960, ...MEMORY },
  silver: { name: 'Silver', densityKgM3: 10490, ...MEMORY },
  tungsten: { name: 'Tungsten', densityKgM3: 19300, ...MEMORY },
  aluminium: { name: 'Aluminium', densityKgM3: 2700, ...MEMORY },
} as const satisfies Record<string, StringMaterial>;

export type CoreMaterial = keyof typeof CORE_MATERIALS;
