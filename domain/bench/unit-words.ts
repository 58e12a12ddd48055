import type { Unit } from './units.ts';

const WORDS: Record<string, Unit> = {
  mm: 'mm',
  cm: 'cm',
  in: 'in',
  inch: 'in',
  inches: 'in',
  '"': 'in',
  '″': 'in',
  '”': 'in',
  n: 'N',
  lbf: 'lbf',
  lb: 'lbf',
  lbs: 'lbf',
  mpa: 'MPa',
  kpa: 'kPa',
  psi: 'lbf/in²',
  'lbf/in²': 'lbf/in²',
  'lbf/in2': 'lbf/in²',
  c: '°C',
  '°c': '°C',
  '℃': '°C',
  f: '°F',
  '°f': '°F',
  '℉': '°F',
  '%': '%',
  '°': '°',
  deg: '°',
  hz: 'Hz',
  cent: 'cents',
  cents: 'cents',
  ct: 'cents',
  '¢': 'cents',
  'kg/m³': 'kg/m³',
  'kg/m3': 'kg/m³',
};

/** The unit somebody wrote behind a number, however they write it; undefined when it is none. */
export function unitByWord(word: string): Unit | undefined {
  return WORDS[word.toLowerCase().replace(/\.$/, '').replace(/\s+/g, '')];
}
