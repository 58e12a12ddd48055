import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { readPart } from '#evidence/chain/read-part.ts';
import { ShapeError } from '#evidence/errors.ts';
import { readSealedJson } from '#evidence/json/read-sealed-json.ts';
import { isCaseKind, isLogKind, isPartName } from '#evidence/seal/kinds.ts';
import { partCommitment } from '#evidence/seal/part-commitment.ts';
import type { Findings } from '#evidence/verify/finding.ts';
import { attempt, placeOf, type Item } from '#evidence/verify/work.ts';

/**
 * Every disclosed part: its bytes against its commitment, then against the form its kind, name and
 * `v` prescribe. What holds is kept on the item for the checks that follow.
 */
export function checkParts(items: Item[], findings: Findings): void {
  let opened = 0;
  for (const item of items) {
    if (!item.header || !item.entry) continue;
    const { kind, parts: commitments } = item.header;
    if (!isCaseKind(kind) && !isLogKind(kind)) {
      findings.notChecked('unknown-kind', { ...placeOf(item), kind });
    }
    for (const name of Object.keys(commitments).filter((part) => !isPartName(part))) {
      findings.notChecked('unknown-part', { ...placeOf(item), part: name });
    }
    for (const [name, { bytes, salt }] of Object.entries(item.entry.parts)) {
      const commitment = Object.hasOwn(commitments, name) ? commitments[name]! : null;
      const data = { ...placeOf(item), part: name };
      attempt(findings, 'parts', data, () => {
        open(item, kind, name, { bytes: toUtf8(bytes), salt: fromHex(salt, 32) }, commitment);
        opened += 1;
      });
    }
  }
  if (!findings.anyFailed('parts')) findings.checked('parts', { count: opened });
}

function open(
  item: Item,
  kind: string,
  name: string,
  part: { bytes: Uint8Array; salt: Uint8Array },
  commitment: string | null,
): void {
  if (toHex(partCommitment(name, part.salt, part.bytes)) !== commitment) {
    throw new ShapeError('It is not what was sealed.');
  }
  const known = isCaseKind(kind) || isLogKind(kind) ? kind : null;
  // The parts but `shown` are alike in every kind, so an unknown kind does not close them.
  if (isPartName(name) && (known || name !== 'shown')) {
    item.parts.set(name, readPart(known ?? 'entry', name, part.bytes));
  } else {
    readSealedJson(part.bytes);
  }
}
