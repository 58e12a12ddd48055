import { describe, expect, it } from 'vitest';
import { phaseSuggested } from './phase-suggested.ts';

describe('the phase suggested', () => {
  it.each([
    [{ state: 'bench', used: ['before'], authorised: false }, 'before'],
    [{ state: 'bench', used: [], authorised: false }, 'before'],
    [{ state: 'owner', used: ['before'], authorised: false }, 'before'],
    [{ state: 'bench', used: ['before'], authorised: true }, 'during'],
    [{ state: 'rest', used: ['before'], authorised: false }, 'during'],
    [{ state: 'bench', used: ['before', 'during'], authorised: false }, 'during'],
    [{ state: 'bench', used: ['before', 'during', 'after'], authorised: true }, 'after'],
    [{ state: 'home', used: ['before'], authorised: false }, 'after'],
    [{ state: 'handed back', used: ['before', 'during'], authorised: true }, 'after'],
  ] as const)('of %j is %s', (facts, phase) => {
    expect(phaseSuggested(facts)).toBe(phase);
  });
});
