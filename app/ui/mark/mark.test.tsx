import { expect, it } from 'vitest';
import { markup } from '#tests/helpers/markup.tsx';
import { PhaseMark } from './phase-mark.tsx';
import { cellHeights, Rosette } from './rosette.tsx';
import { HALF, HALF_SMALL } from './strokes.ts';
import { Tick } from './tick.tsx';
import { WitnessMark } from './witness-mark.tsx';

const seal = '41d077e2c8a1530f7be490c30d51c86ab6093e5ad8127fc4913c60eb2d75f80a';

it('fills both halves when aligned, in line on one joint', () => {
  const html = markup(<WitnessMark state="aligned" size={24} />);
  expect(html).toContain('class="wm-aligned"');
  expect(html.match(/fill="currentColor"/g)).toHaveLength(2);
  expect(html).toContain('d="M12 1V23"');
  expect(html).toContain('transform="rotate(180 12 12)"');
});

it('outlines both halves when hollow', () => {
  const html = markup(<WitnessMark state="hollow" size={24} />);
  expect(html.match(/fill="none"/g)).toHaveLength(2);
  expect(html).not.toContain('fill="currentColor"');
});

it('drops the right half when displaced, further in the small cut', () => {
  expect(markup(<WitnessMark state="displaced" size={24} />)).toContain(
    'transform="translate(0 5.6) rotate(180 12 12)"',
  );
  expect(markup(<WitnessMark state="displaced" size={20} />)).toContain(
    'transform="translate(0 6.6) rotate(180 12 12)"',
  );
});

it('takes the heavier cut at 20 px and less', () => {
  expect(markup(<WitnessMark state="aligned" size={20} />)).toContain(HALF_SMALL);
  expect(markup(<WitnessMark state="aligned" size={21} />)).toContain(HALF);
});

it('is hidden from screen readers, unless it stands alone', () => {
  expect(markup(<WitnessMark state="aligned" />)).toContain('aria-hidden="true"');
  const alone = markup(<WitnessMark state="aligned" label="Sealed" />);
  expect(alone).toContain('role="img" aria-label="Sealed"');
  expect(alone).not.toContain('aria-hidden');
});

it('moves only when an answer has arrived', () => {
  expect(markup(<WitnessMark state="aligned" />)).not.toContain('wm-arrive');
  expect(markup(<WitnessMark state="aligned" arrive />)).toContain('wm-arrive');
});

it('has no joint of its own on a spine', () => {
  const html = markup(<Tick state="hollow" />);
  expect(html).toContain('tick-hollow');
  expect(html.match(/<path/g)).toHaveLength(2);
});

it('draws the joint open, clamped, closed', () => {
  const lines = (phase: 'before' | 'during' | 'after') =>
    (
      markup(<PhaseMark phase={phase} />)
        .match(/[^c]d="(M[^"]+)"/)?.[1]
        ?.match(/M/g) ?? []
    ).length;
  expect([lines('before'), lines('during'), lines('after')]).toEqual([2, 2, 1]);
});

it.each([
  ['0', 1, 1],
  ['3', 1, 4],
  ['4', 2, 1],
  ['9', 3, 2],
  ['c', 4, 1],
  ['f', 4, 4],
])('draws digit %s as bars %i and %i high', (digit, left, right) => {
  expect(cellHeights(digit)).toEqual([left, right]);
});

it('draws 64 cells of two bars each, and others for another value', () => {
  const path = (value: string) =>
    markup(<Rosette sealValue={value} />).match(/fill="currentColor" d="([^"]+)"/)?.[1] ?? '';
  expect(path(seal).match(/M/g)).toHaveLength(128);
  expect(path(`5${seal.slice(1)}`)).not.toBe(path(seal));
});

it('draws the heights it says, from the inner ring outwards', () => {
  // One digit f in a field of 0: exactly its two bars reach four steps above their ring.
  const html = markup(<Rosette sealValue={`f${'0'.repeat(63)}`} />);
  const bars = [...html.matchAll(/M([\d.]+) ([\d.]+)L([\d.]+) ([\d.]+)L/g)].map((m) => {
    const [x0, y0, x1, y1] = m.slice(1).map(Number) as [number, number, number, number];
    return Math.hypot(x1 - 50, y1 - 50) - Math.hypot(x0 - 50, y0 - 50);
  });
  expect(bars.filter((height) => height > 4)).toHaveLength(2);
  expect(bars[0]).toBeCloseTo(4 * 2.15, 1);
  expect(bars[2]).toBeCloseTo(2.15, 1);
  expect(bars[64]).toBeCloseTo(2, 1);
});
