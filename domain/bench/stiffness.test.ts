import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { inharmonicity, partialSharpness } from './inharmonicity.ts';

describe('stiffness of a string', () => {
  const string = { diameterMm: 0.4572, lengthMm: 647.7, tensionN: 83 };

  it('sharpens higher partials more, thin and tight strings less', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 20 }), (partial) => {
        const B = inharmonicity(string);
        expect(partialSharpness(B, partial + 1)).toBeGreaterThan(partialSharpness(B, partial));
        expect(inharmonicity({ ...string, diameterMm: 0.3 })).toBeLessThan(B);
        expect(inharmonicity({ ...string, tensionN: 100 })).toBeLessThan(B);
      }),
    );
  });

  it('vanishes for an ideal string', () => {
    expect(partialSharpness(0, 12)).toBe(0);
  });
});
