import { ShapeError } from '#evidence/errors.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import { HEADER_BYTES } from '#evidence/limits.ts';
import { checkHeader } from '#evidence/seal/check-header.ts';
import { HeaderSchema, type Header } from '#evidence/seal/header.ts';
import { isCaseKind, isLogKind, isPartName } from '#evidence/seal/kinds.ts';
import { readShape } from '#evidence/shape/read-shape.ts';

/**
 * The sealed bytes of a header, after every rule that a header can be held to alone.
 * @throws ShapeError for a header that breaks one, or an unknown kind or part: what is written is
 *   always known; LimitError beyond 128 KiB
 */
export function headerBytes(header: Header): Uint8Array {
  const checked = readShape(HeaderSchema, header, 'header');
  if (!isCaseKind(checked.kind) && !isLogKind(checked.kind)) {
    throw new ShapeError('The header has a kind that is not one of ours.', 'kind');
  }
  if (!Object.keys(checked.parts).every(isPartName)) {
    throw new ShapeError('The header has a part that is not one of ours.', 'parts');
  }
  checkHeader(checked);
  return sealJson(checked, HEADER_BYTES);
}
