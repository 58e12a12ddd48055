import { describe, expect, it } from 'vitest';
import { CAUTIONS, CAUTIONS_DEFER, cautionsAt } from './cautions.ts';

describe('cautions', () => {
  it('have an id of their own, a sentence and a place', () => {
    expect(new Set(CAUTIONS.map((caution) => caution.id)).size).toBe(CAUTIONS.length);
    for (const { text, at } of CAUTIONS) {
      expect(text).toMatch(/^[A-Z].*\.$/);
      expect(text).not.toContain('!');
      expect(at.length).toBeGreaterThan(0);
    }
  });

  it('stand with every joint check in full and never say safe', () => {
    const joint = cautionsAt('joint check').map((caution) => caution.text);
    expect(joint).toHaveLength(7);
    expect(joint.join(' ')).not.toMatch(/\bsafe\b|safety factor/i);
    expect(joint.join(' ')).toContain('it does not certify a repair');
  });

  it('come up where they are needed', () => {
    expect(cautionsAt('crack').map((caution) => caution.id)).toContain('dry-crack');
    expect(cautionsAt('two-part finish').map((caution) => caution.id)).toEqual(['isocyanates']);
    expect(CAUTIONS_DEFER).toContain('data sheet');
  });
});
