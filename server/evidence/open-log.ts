import { randomUUID } from 'node:crypto';
import { ed25519FromSpki } from '#evidence/key/ed25519-spki.ts';
import { keyLeaf } from '#evidence/key/key-leaf.ts';
import { originOf } from '#evidence/log/origin.ts';
import { encodeVkey } from '#evidence/note/vkey.ts';
import { run, select, transaction, type Transaction } from '#server/db/sql.ts';
import { env } from '#server/env.ts';
import { queueJob } from '#server/jobs/queue-job.ts';
import { appendEntry } from './append-entry.ts';
import { noteDemoKeys, refuseDemoKeysInPublic } from './demo-keys.ts';
import { keyIdsOnDisk, makeKeyFile, readKeyFile, type KeyFile, type KeyUse } from './key-files.ts';
import { lockHead } from './log-state.ts';
import { OWN_CHAIN } from './own-chain.ts';
import { paperCertificate } from './paper-certificate.ts';

const appendOwn = (tx: Transaction, kind: 'log-start' | 'key', shown: object, now: Date) =>
  appendEntry(tx, {
    chain: OWN_CHAIN,
    kind,
    visibility: 'shared',
    occurredAt: null,
    parts: { shown },
    photos: [],
    names: [],
    now,
  });

/** A key left on disk by a start that was cut off is used, so that none lies about unnamed. */
function firstKey(use: KeyUse): KeyFile {
  const [kept] = keyIdsOnDisk(use);
  return kept ? readKeyFile(use, kept) : makeKeyFile(use);
}

async function addKey(tx: Transaction, use: KeyUse, origin: string, now: Date, name: string) {
  const key = firstKey(use);
  const certificate = use === 'paper' ? paperCertificate(key.privateKey, name, now) : null;
  const leaf = keyLeaf({
    use,
    act: 'add',
    spki: key.spki,
    origin,
    ...(certificate ? { cert: certificate } : {}),
    reason: null,
  });
  const { leafIndex } = await appendOwn(tx, 'key', leaf, now);
  await run(
    `INSERT INTO signing_keys (id, \`use\`, alg, spki, vkey, certificate, added_at_leaf)
     VALUES (?, ?, ?, ?, ?, ?, ?)`,
    [key.id, use, leaf.alg, key.spki, leaf.vkey, certificate, leafIndex],
    tx,
  );
}

async function start(tx: Transaction, origin: string, now: Date): Promise<void> {
  const [shop] = await select<{ name: string }>('SELECT name FROM shops', [], tx);
  const log = firstKey('log');
  const vkey = encodeVkey({ name: origin, type: 1, publicKey: ed25519FromSpki(log.spki) });
  await appendOwn(tx, 'log-start', { v: 1, origin, vkey, replaces: null }, now);
  for (const use of ['log', 'credential', 'paper'] as const) {
    await addKey(tx, use, origin, now, shop?.name ?? 'Repair shop');
  }
}

/**
 * Opens the witness log: at the first start it draws the log's name, makes its keys and writes the
 * first leaves; at every start it asks for a checkpoint of what is there. Safe to call from several
 * processes at once.
 * @throws Error with a sentence when demo keys would be used in public, or a key file is not right
 */
export async function openLog({ now = new Date() }: { now?: Date } = {}): Promise<void> {
  refuseDemoKeysInPublic();
  await transaction(async (tx) => {
    await run(
      'INSERT IGNORE INTO log_states (id, origin, size, last_recorded_at) VALUES (1, ?, 0, NULL)',
      [originOf(randomUUID())],
      tx,
    );
    const { origin, size } = await lockHead(tx);
    if (size === 0) {
      if (env().DEMO) noteDemoKeys();
      await start(tx, origin, now);
    }
    await queueJob(tx, { kind: 'sign-head', payload: {} });
  });
}
