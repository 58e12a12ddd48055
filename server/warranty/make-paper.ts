import { createHash } from 'node:crypto';
import { v7 } from 'uuid';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { run, transaction } from '#server/db/sql.ts';
import { currentKey } from '#server/evidence/current-key.ts';
import { readKeyFile } from '#server/evidence/key-files.ts';
import { signHead } from '#server/evidence/sign-head.ts';
import { keepPaper } from './keep-paper.ts';
import type { Attachment } from './paper/attach.ts';
import { drawPaper } from './paper/draw-paper.ts';
import { gatherFacts } from './paper/gather-facts.ts';
import { signPaper } from './paper/sign-paper.ts';
import type { SealedWarranty } from './sealed-warranty.ts';
import { warrantyBundle } from './warranty-bundle.ts';

async function attachments(warranty: SealedWarranty, now: Date): Promise<Attachment[]> {
  // The checkpoint comes first: the record in the paper is under a head that covers the warranty.
  const head = await signHead({ now });
  const bundle = await warrantyBundle(warranty, head, { withCredential: true, now });
  return [
    {
      name: 'bundle.witnessmark.json',
      bytes: Buffer.from(toUtf8(bundle)),
      type: 'application/json',
      description: 'The record of this warranty, to be checked without the shop',
    },
    {
      name: 'credential.jws',
      bytes: Buffer.from(warranty.jws, 'ascii'),
      type: 'application/vc+jwt',
      description: 'What the shop signed, for machines',
    },
    {
      name: 'checkpoint',
      bytes: Buffer.from(toUtf8(head.note)),
      type: 'text/plain',
      description: 'The signed head of the witness log when this paper was made',
    },
  ];
}

/**
 * Third step: a checkpoint over the warranty, then the paper with its attachments, signed, durable in
 * the store, and its row.
 * @throws Unavailable while the store is silent; the step is then done again
 */
export async function makePaper(warranty: SealedWarranty, now: Date): Promise<void> {
  const files = await attachments(warranty, now);
  const key = await currentKey('paper');
  if (!key.certificate) throw new Error('The paper key has no certificate.');
  const { privateKey } = readKeyFile('paper', key.id);
  const drawn = await drawPaper(await gatherFacts(warranty), files, now);
  const { certificate } = key;
  const pdf = await signPaper(drawn, { privateKey, certificate, now });
  const objectKey = await keepPaper(pdf);
  await transaction(async (tx) => {
    await run(
      `INSERT INTO papers (id, warranty_id, object_key, length, sha256, made_at)
       VALUES (?, ?, ?, ?, ?, ?)`,
      [v7(), warranty.id, objectKey, pdf.length, createHash('sha256').update(pdf).digest(), now],
      tx,
    );
    await run(
      "UPDATE warranties SET step = 'paper' WHERE id = ? AND step = 'sealed'",
      [warranty.id],
      tx,
    );
  });
}
