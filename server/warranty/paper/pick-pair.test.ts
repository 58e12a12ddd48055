import { describe, expect, it } from 'vitest';
import { pickPair } from './pick-pair.ts';

const photo = (n: number, caption: string, damage = false) => ({ n, caption, damage });

describe('the pair on the paper', () => {
  it('shows the same part before and after', () => {
    const before = [photo(1, 'Whole front'), photo(2, 'Bridge lifted along its back edge', true)];
    const after = [photo(7, 'Bridge seated on its marks'), photo(8, 'Whole front, strung')];
    expect(pickPair(before.slice(1), after)?.after.n).toBe(7);
    expect(pickPair(before, after.slice(1))?.before.n).toBe(1);
  });

  it('falls back on the marked damage and the latest picture', () => {
    const before = [photo(1, 'Head'), photo(2, 'Break from behind', true)];
    const after = [photo(5, 'Done'), photo(6, 'Clean')];
    expect(pickPair(before, after)).toMatchObject({ before: { n: 2 }, after: { n: 6 } });
  });

  it('is none when one side is missing', () => {
    expect(pickPair([photo(1, 'Head')], [])).toBeNull();
    expect(pickPair([], [photo(1, 'Head')])).toBeNull();
  });
});
