import type { PartValue } from '#evidence/chain/part-schema.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import type { Kind, PartName } from '#evidence/seal/kinds.ts';

/**
 * Writes one part as the bytes that are sealed; what is written is read back first, so nothing can
 * be sealed that no verifier would read.
 * @throws ShapeError or UnknownFormError when the value is not what this part of this kind holds;
 *   SealedJsonError when it cannot be sealed; LimitError beyond 256 KiB
 */
export function writePart<K extends Kind, N extends PartName>(
  kind: K,
  name: N,
  value: PartValue<K, N>,
): Uint8Array {
  const bytes = sealJson(value);
  readPart(kind, name, bytes);
  return bytes;
}
