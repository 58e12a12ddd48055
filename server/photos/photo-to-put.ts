import { validate } from 'uuid';
import { Invalid, TooLarge } from '#domain/errors.ts';
import { EMPTY_PHOTO, sizeSentence } from '#domain/photo-file.ts';
import type { SaidOfBody } from './checked-body.ts';

/** What comes with a photo's bytes. */
export interface PhotoToPut extends SaidOfBody {
  caseNumber: string;
  /** Made by the sender, so that sending again is the same photo. */
  photoId: string;
  /** As it is called on the sender's device; null when nothing is said. */
  fileName: string | null;
  /** The draft it is to be linked to. */
  entryId: string | null;
}

// Control characters and whatever a system takes for a folder.
// eslint-disable-next-line no-control-regex
const HARMFUL = /[\u0000-\u001f\u007f-\u009f\u202a-\u202e\u2066-\u2069/\\]/g;

const tidyName = (name: string) => [...name.replace(HARMFUL, '').trim()].slice(0, 120).join('');

/** Checks what can be known before the first byte. Throws Invalid or TooLarge with the sentence. */
export function checkPhotoToPut(input: PhotoToPut): PhotoToPut {
  const { photoId, sha256, length, fileName, entryId } = input;
  if (!validate(photoId) || (entryId !== null && !validate(entryId))) {
    throw new Invalid({ photo: 'This photo was sent to no address. Open the case again.' });
  }
  if (!/^[0-9a-f]{64}$/.test(sha256)) {
    throw new Invalid({ photo: 'This photo came without its SHA-256. Open the case again.' });
  }
  if (length === 0) throw new Invalid({ photo: EMPTY_PHOTO });
  if (!Number.isSafeInteger(length) || length < 0) {
    throw new Invalid({ photo: 'This photo came without its length. Open the case again.' });
  }
  const tooLarge = sizeSentence(length);
  if (tooLarge !== null) throw new TooLarge(tooLarge);
  return { ...input, fileName: fileName === null ? null : tidyName(fileName) || null };
}
