import {
  BUNDLE_FORMAT,
  BundleEntrySchema,
  BundleFrameSchema,
  LostEntrySchema,
  type Bundle,
} from '#evidence/bundle/bundle-shape.ts';
import { unknownMembers } from '#evidence/bundle/unknown-members.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { LimitError, ShapeError } from '#evidence/errors.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { readJson } from '#evidence/json/read-json.ts';
import { BUNDLE_BYTES } from '#evidence/limits.ts';
import { readShape, unknownForm } from '#evidence/shape/read-shape.ts';

/** A bundle as it was read; `unknownMembers` are paths this program cannot judge. */
export type ReadBundle = { bundle: Bundle; unknownMembers: string[] };

/**
 * Reads a bundle file. Only its own frame is judged: what stands in its texts is for the verifier.
 * @returns null when the text is no bundle of ours at all
 * @throws UnknownFormError for a bundle of another version; LimitError beyond 64 MiB or 32 levels;
 *   SealedJsonError for a member given twice; ShapeError when a member is missing or not in form
 */
export function readBundle(text: string): ReadBundle | null {
  if (text.length > BUNDLE_BYTES || toUtf8(text).length > BUNDLE_BYTES) {
    throw new LimitError('A bundle is at most 64 MiB long.');
  }
  if (!text.includes('"witnessmark-bundle/')) return null;
  const value = readJson(text, BUNDLE_BYTES);
  const format = formatOf(value);
  if (!format.startsWith('witnessmark-bundle/')) return null;
  if (format !== BUNDLE_FORMAT) throw unknownForm(`A bundle of the form ${format}`);
  const frame = readShape(BundleFrameSchema, value, 'bundle');
  const entries = frame.entries.map((item) => {
    const lost = typeof item === 'object' && item !== null && 'entry' in item;
    if (lost && 'header' in item) throw new ShapeError('An entry is both lost and there.');
    return lost
      ? readShape(LostEntrySchema, item, 'bundle')
      : readShape(BundleEntrySchema, item, 'bundle');
  });
  return { bundle: { ...frame, entries }, unknownMembers: unknownMembers(value) };
}

function formatOf(value: JsonValue): string {
  const format = typeof value === 'object' && value && !Array.isArray(value) && value.format;
  return typeof format === 'string' ? format : '';
}
