import { describe, expect, test } from 'vitest';
import { expectRefused, verdictOf } from '#tests/evidence/expect-verdict.ts';
import { entryShown, tellCase } from '#tests/evidence/told-case.ts';
import type { WitnessShop } from '#tests/evidence/witness-shop.ts';
import { CASE, type Sealed } from '#tests/evidence/witness-shop.ts';

describe('rules of kinds', () => {
  const broken = (tell: (shop: WitnessShop, sealed: ReturnType<typeof tellCase>) => unknown) => {
    const sealed = tellCase();
    tell(sealed.shop, sealed);
    return sealed.shop.bundle(CASE);
  };
  const text = { parts: { shown: { v: 1, text: '' } } };

  test.each([
    [
      'an amendment of an amendment',
      (s: WitnessShop, t: { amended: Sealed }) =>
        s.append('amendment', CASE, { names: [t.amended], parts: { shown: entryShown({}) } }),
    ],
    [
      'an amendment of nothing',
      (s: WitnessShop) => s.append('amendment', CASE, { parts: { shown: entryShown({}) } }),
    ],
    [
      'an entry that names one',
      (s: WitnessShop, t: { takenIn: Sealed }) =>
        s.append('entry', CASE, { names: [t.takenIn], ...text }),
    ],
    [
      'a close that lists too few',
      (s: WitnessShop, t: { takenIn: Sealed }) =>
        s.append('close', CASE, {
          names: [t.takenIn],
          parts: { shown: { v: 1, text: '', entries: 1, photos: 2 } },
        }),
    ],
    [
      'a close that counts wrongly',
      (s: WitnessShop) =>
        s.append('close', CASE, {
          names: s.chainOf(CASE),
          parts: { shown: { v: 1, text: '', entries: 6, photos: 3 } },
        }),
    ],
    [
      'a hand-back without a close before it',
      (s: WitnessShop, t: { closed: Sealed }) =>
        s.append('handed-back', CASE, { names: [t.closed], ...text }),
    ],
    [
      'a claim on something else',
      (s: WitnessShop, t: { closed: Sealed }) =>
        s.append('claim', CASE, { names: [t.closed], ...text }),
    ],
    [
      'a replacement of one warranty only',
      (s: WitnessShop, t: { warranty: Sealed }) =>
        s.append('standing', CASE, {
          names: [t.warranty],
          parts: { shown: { v: 1, act: 'replace', reason: null } },
        }),
    ],
    [
      'an erasure of nothing',
      (s: WitnessShop) =>
        s.append('erased', CASE, {
          parts: { shown: { v: 1, parts: ['owner'], photos: [], reason: null } },
        }),
    ],
    [
      'names out of order',
      (s: WitnessShop, t: { takenIn: Sealed; bench: Sealed }) =>
        s.append('visibility', CASE, {
          names: [t.bench, t.takenIn],
          parts: { shown: { v: 1, to: 'bench', n: null } },
        }),
    ],
  ] as [string, (shop: WitnessShop, sealed: ReturnType<typeof tellCase>) => unknown][])(
    '%s',
    (_, tell) => {
      expectRefused(broken(tell), 'names');
    },
  );

  test('a name from another case', () => {
    const bundle = broken((shop) => {
      const other = shop.log.find(({ header }) => header.case === '09'.repeat(16))!;
      shop.append('amendment', CASE, { names: [other], parts: { shown: entryShown({}) } });
    });
    expectRefused(bundle, 'names');
  });

  test('photos: a number used twice, words about a bench photo, a copy of nothing', () => {
    const again = broken((shop, { takenIn }) =>
      shop.append('amendment', CASE, { names: [takenIn], photos: [{ n: 4 }] }),
    );
    expectRefused(again, 'photos');
    const words = [{ n: 9, caption: '', taken: null, pins: [] }];
    const photos = [{ n: 9, visibility: 'bench' as const }];
    const told9 = broken((shop) =>
      shop.append('entry', CASE, { photos, parts: { shown: entryShown({ photos: words }) } }),
    );
    expectRefused(told9, 'photos');
    const copy = broken((shop) =>
      shop.append('entry', CASE, {
        photos,
        parts: { shown: entryShown({ copies: [{ n: 9, of: 1 }] }) },
      }),
    );
    expectRefused(copy, 'photos');
  });

  test('time that goes back, unless a clock entry says so', () => {
    const back = broken((shop) => shop.append('entry', CASE, { ...text, minutes: -30 }));
    expectRefused(back, 'order');
    const said = broken((shop) => {
      const [old, set] = [shop.time, shop.time - 30 * 60_000].map((time) =>
        new Date(time).toISOString(),
      );
      const shown = { v: 1, old, new: set, reason: 'The clock ran half an hour fast.' };
      shop.append('clock', new Uint8Array(16), { parts: { shown }, minutes: -30 });
      shop.append('entry', CASE, text);
    });
    expect(verdictOf(said)).toBe('Intact');
  });
});
