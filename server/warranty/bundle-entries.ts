import type { BundleEntry } from '#evidence/bundle/bundle-shape.ts';
import { fromUtf8 } from '#evidence/bytes/utf8.ts';
import { writeTlogProof } from '#evidence/proof/tlog-proof.ts';
import { readHeader } from '#evidence/seal/read-header.ts';
import { select } from '#server/db/sql.ts';
import type { PublishedHead } from '#server/evidence/newest-checkpoint.ts';
import { OWN_CHAIN } from '#server/evidence/own-chain.ts';
import { inclusionProofs } from '#server/evidence/prove.ts';
import type { SealedWarranty } from './sealed-warranty.ts';

// What these kinds show names nobody and is needed to judge a warranty; the rest stays closed.
const OPEN_KINDS = [
  ...['log-start', 'key', 'stamps', 'clock', 'lost'],
  ...['close', 'handed-back', 'warranty', 'paper', 'standing', 'visibility', 'erased'],
];

interface Row {
  leaf_index: string;
  header: Buffer;
  header_salt: Buffer;
  shown: Buffer | null;
  shown_salt: Buffer | null;
}

const rowsUnder = ({ record, closeSeq }: SealedWarranty, { size }: PublishedHead) =>
  select<Row>(
    `SELECT s.leaf_index, s.header, s.header_salt, p.bytes AS shown, p.salt AS shown_salt
     FROM sealed_entries s
     LEFT JOIN sealed_parts p
       ON p.leaf_index = s.leaf_index AND p.name = 'shown' AND s.kind IN (:open)
     WHERE s.leaf_index < :size
       AND (s.chain = :own OR (s.chain = :record AND s.seq >= :closeSeq))
     ORDER BY s.chain <> :own, s.seq`,
    { open: OPEN_KINDS, size, own: OWN_CHAIN, record, closeSeq },
  );

function openParts(shown: Buffer | null, salt: Buffer | null): BundleEntry['parts'] {
  return shown && salt ? { shown: { bytes: fromUtf8(shown), salt: salt.toString('hex') } } : {};
}

/**
 * The entries of a warranty's record under a head: the log's own chain whole, then the case from the
 * close on, every header of it, with the parts that name nobody.
 */
export async function bundleEntries(
  warranty: SealedWarranty,
  head: PublishedHead,
): Promise<BundleEntry[]> {
  const rows = await rowsUnder(warranty, head);
  const proofs = await inclusionProofs(
    rows.map((row) => Number(row.leaf_index)),
    head.size,
  );
  return rows.map(({ leaf_index, header, header_salt, shown, shown_salt }) => {
    const index = Number(leaf_index);
    return {
      header: fromUtf8(header),
      salt: header_salt.toString('hex'),
      parts: openParts(shown, shown_salt),
      photos: readHeader(header).photos.map(({ n }) => ({ n, original: null, published: null })),
      proof: writeTlogProof({ index, hashes: proofs.get(index) ?? [], checkpoint: head.note }),
    };
  });
}
