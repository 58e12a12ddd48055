import { describe, expect, it } from 'vitest';
import type { TimelineEntry } from '#domain/timeline.ts';
import { comparePair } from './compare-pair.ts';

const entry = (phase: 'before' | 'after', photos: [n: number, caption: string, more?: object][]) =>
  ({
    phase,
    photos: photos.map(([n, caption, more]) => ({
      ...{ n, caption, state: 'ready', width: 4000, height: 3000 },
      ...more,
    })),
  }) as unknown as TimelineEntry;

const numbers = (timeline: TimelineEntry[]) => {
  const pair = comparePair(timeline);
  return pair && [pair.before.photo.n, pair.after.photo.n];
};

describe('what is offered to compare', () => {
  it('is the latest after photo with the before photo that is described most like it', () => {
    const before = entry('before', [
      [1, 'On blocks, nut still on the neck'],
      [2, 'The break from the back of the neck'],
    ]);
    const after = entry('after', [
      [6, 'On blocks'],
      [7, 'Back of the neck, refinished'],
    ]);
    expect(numbers([before, after])).toEqual([2, 7]);
  });

  it('is the first of equals, of the same shape, and ready', () => {
    const upright = { width: 3000, height: 4000 };
    const before = entry('before', [
      [1, 'Whole front', upright],
      [2, 'Bridge', { state: 'waiting' }],
      [3, 'Label'],
      [4, 'Heel'],
    ]);
    expect(numbers([before, entry('after', [[9, 'Strung']])])).toEqual([3, 9]);
    expect(numbers([before, entry('after', [[9, 'Strung', upright]])])).toEqual([1, 9]);
  });

  it('is nothing without both', () => {
    expect(numbers([])).toBeNull();
    expect(numbers([entry('after', [[9, 'Strung']])])).toBeNull();
    expect(numbers([entry('before', [[1, 'Front']]), entry('after', [])])).toBeNull();
  });
});
