import { describe, expect, it } from 'vitest';
import { INSTRUMENT_KINDS, instrumentKind, kindInSentence } from './instrument-kinds.ts';

describe('kinds of instrument', () => {
  it('each have a photo list that begins with the whole front and repeats nothing', () => {
    for (const { name, photoList } of INSTRUMENT_KINDS) {
      expect(photoList[0], name).toBe('Whole front');
      expect(new Set(photoList).size, name).toBe(photoList.length);
      expect(photoList.length, name).toBeGreaterThanOrEqual(8);
    }
  });
  it('are found by name, once each', () => {
    expect(new Set(INSTRUMENT_KINDS.map(({ name }) => name)).size).toBe(INSTRUMENT_KINDS.length);
    expect(instrumentKind('Mandolin')?.photoList).toContain('Tailpiece');
    expect(instrumentKind('mandolin; DROP TABLE')).toBeUndefined();
    expect(kindInSentence('Parlour guitar')).toBe('parlour guitar');
  });
});
