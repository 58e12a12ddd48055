import { partForms, type PartValue } from '#evidence/chain/part-schema.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { readSealedJson } from '#evidence/json/read-sealed-json.ts';
import {
  isCaseKind,
  isLogKind,
  isPartName,
  type Kind,
  type PartName,
} from '#evidence/seal/kinds.ts';
import { readShape, readVersion, unknownForm } from '#evidence/shape/read-shape.ts';
import type { z } from '#evidence/shape/zod.ts';

/**
 * Reads the sealed bytes of one part. Whether they match their commitment is for the caller.
 * @param kind the kind its header gives
 * @param name the part's name
 * @throws UnknownFormError for a kind, name or `v` this program does not know; LimitError,
 *   EncodingError, SealedJsonError or ShapeError for bytes that are no such part
 */
export function readPart<K extends Kind, N extends PartName>(
  kind: K,
  name: N,
  bytes: Uint8Array,
): PartValue<K, N> {
  if (!isCaseKind(kind) && !isLogKind(kind)) throw unknownForm(`The kind "${String(kind)}"`);
  if (!isPartName(name)) throw unknownForm(`The part "${String(name)}"`);
  return partValue(kind, name, readSealedJson(bytes));
}

function partValue<K extends Kind, N extends PartName>(
  kind: K,
  name: N,
  value: JsonValue,
): PartValue<K, N> {
  const what = `part "${name}" of kind "${kind}"`;
  const v = readVersion(value, what);
  const forms: Record<number, z.ZodMiniType> = partForms(kind, name);
  const schema = Object.hasOwn(forms, v) ? forms[v] : undefined;
  if (!schema) throw unknownForm(`Form ${v} of ${what}`);
  return readShape(schema, value, what) as PartValue<K, N>;
}
