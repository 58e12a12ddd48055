import type { Bundle } from '#evidence/bundle/bundle-shape.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { LimitError } from '#evidence/errors.ts';
import { BUNDLE_BYTES } from '#evidence/limits.ts';

/**
 * A bundle as the text of its file, plain JSON with one member of an entry to a line so that
 * people can read it.
 * @throws LimitError beyond 64 MiB
 */
export function writeBundle(bundle: Bundle): string {
  const text = `${JSON.stringify(bundle, null, 1)}\n`;
  if (toUtf8(text).length > BUNDLE_BYTES) throw new LimitError('A bundle is at most 64 MiB long.');
  return text;
}
