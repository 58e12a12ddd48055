import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { findBundle } from './find-bundle.ts';

/** The code that the record in a dropped file is of; null when there is no such record in it. */
export function readPaperCode(file: Uint8Array): string | null {
  const bundle = findBundle(file);
  if (bundle === null) return null;
  return verifyBundle(bundle).record?.credential?.credentialSubject.code ?? null;
}
