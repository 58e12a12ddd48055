import { readSealedJson } from '#evidence/json/read-sealed-json.ts';
import { HEADER_BYTES } from '#evidence/limits.ts';
import { checkHeader } from '#evidence/seal/check-header.ts';
import { HeaderSchema, type Header } from '#evidence/seal/header.ts';
import { readShape, readVersion, unknownForm } from '#evidence/shape/read-shape.ts';

/**
 * Reads the sealed bytes of a header. An unknown kind or part name is let through: the caller
 * reports it as not checked and still checks the rest.
 * @throws UnknownFormError for a `v` this program does not know; LimitError, EncodingError,
 *   SealedJsonError or ShapeError for bytes that are no header
 */
export function readHeader(bytes: Uint8Array): Header {
  const value = readSealedJson(bytes, HEADER_BYTES);
  const v = readVersion(value, 'header');
  if (v !== 1) throw unknownForm(`Form ${v} of a header`);
  const header = readShape(HeaderSchema, value, 'header');
  checkHeader(header);
  return header;
}
