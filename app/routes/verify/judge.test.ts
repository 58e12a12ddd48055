import { describe, expect, it } from 'vitest';
import type { Report } from '#evidence/verify/verify-bundle.ts';
import { judge, type HeldFacts } from './judge.ts';

const report = (verdict: Report['verdict'], findings: Report['findings'] = []): Report => ({
  verdict,
  standing: { word: 'in force', at: null, size: null },
  findings,
  record: null,
});
const bare: HeldFacts = {
  paper: null,
  sameWarranty: false,
  scanned: false,
  strangeKey: false,
  recordHolds: true,
};
const shop = { shop: 'Harrow Lane Repairs', sealedOn: '24 April 2026, 16:05' };
const say = (verdict: Report['verdict'], held: Partial<HeldFacts>) =>
  judge(report(verdict), { ...bare, ...held }, shop);

describe('the verdict on what is held', () => {
  it('is never Intact for a number alone', () => {
    expect(say('Intact', {})).toEqual({
      kind: 'not-fully-checked',
      sentence:
        'Known. Your paper has not been checked: compare these lines with it, or drop the PDF.',
    });
  });

  it('is Intact for the very file, and for a QR code of a record that is', () => {
    expect(say('Intact', { paper: 'this-file' })).toEqual({
      kind: 'intact',
      sentence:
        'Nothing in this paper has changed since Harrow Lane Repairs sealed it on 24 April 2026, 16:05.',
    });
    expect(say('Intact', { scanned: true }).kind).toBe('intact');
    expect(say('Not fully checked', { paper: 'this-file' }).kind).toBe('not-fully-checked');
  });

  it.each([
    ['added-to', false, 'not-fully-checked'],
    ['no-paper-named', false, 'not-fully-checked'],
    ['other-file', true, 'not-fully-checked'],
    ['other-file', false, 'does-not-match'],
  ] as const)('of a PDF that is %s (same warranty: %s) is %s', (paper, sameWarranty, kind) => {
    expect(say('Intact', { paper, sameWarranty, scanned: true }).kind).toBe(kind);
  });

  it('does not match with a key from elsewhere, or where anything fails', () => {
    expect(say('Intact', { scanned: true, strangeKey: true }).kind).toBe('does-not-match');
    expect(say('Does not match', { paper: 'this-file' }).sentence).toContain('What you hold');
    const broken = say('Does not match', { recordHolds: false });
    expect(broken.kind).toBe('does-not-match');
    expect(broken.sentence).toContain('does not agree with itself');
  });
});
