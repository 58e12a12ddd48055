import { v7 } from 'uuid';
import { Invalid } from '#domain/errors.ts';
import type { NewInstrument } from '#domain/intake.ts';
import { readAmount } from '#domain/money.ts';
import { Instrument } from '#server/db/models/instrument.ts';
import { select, type Transaction } from '#server/db/sql.ts';

/** The instrument of a new case, and why the case may not go on yet, if so. */
export interface KeptInstrument {
  id: string;
  kind: string;
  maker: string;
  /** In words, or null. */
  onHold: string | null;
}

/** Shown on the case; says nothing of the other person, their cases, or even whether there were any. */
export const ASKS_FOR_PROOF =
  'Asks for proof: this serial is on record with another person. Record papers, or have the owner of record confirm.';

type Choice = { id: string } | NewInstrument;

const known = (choice: Choice): choice is { id: string } => Boolean(choice.id);

async function ofOwner(tx: Transaction, ownerId: string, id: string): Promise<KeptInstrument> {
  const [row] = await select<Omit<KeptInstrument, 'onHold'>>(
    'SELECT id, kind, maker FROM instruments WHERE id = ? AND owner_id = ?',
    [id, ownerId],
    tx,
  );
  if (row) return { ...row, onHold: null };
  throw new Invalid({
    instrument: 'This instrument is not on record with this owner. Choose again, or describe it.',
  });
}

function declared(value: string | null, currency: string) {
  if (value === null) return { declaredMinor: null, declaredCurrency: null };
  const read = readAmount(value, currency);
  if ('sentence' in read) throw new Invalid({ 'instrument.declaredValue': read.sentence });
  return { declaredMinor: read.minor.toString(), declaredCurrency: currency };
}

/**
 * The instrument that was chosen, or found by maker and serial with the same owner, or a new one. A
 * serial that is on record with another person makes a new instrument, apart from the old one, and the
 * case waits for proof.
 */
export async function keepInstrument(
  tx: Transaction,
  choice: Choice,
  { ownerId, currency, now }: { ownerId: string; currency: string; now: Date },
): Promise<KeptInstrument> {
  if (known(choice)) return ofOwner(tx, ownerId, choice.id);
  const { id: _none, declaredValue, ...words } = choice;
  const value = declared(declaredValue, currency);
  const same =
    words.serial === null
      ? []
      : await select<{ id: string; kind: string; maker: string; ownerId: string }>(
          `SELECT id, kind, maker, owner_id AS ownerId FROM instruments
           WHERE serial = ? AND maker = ?`,
          [words.serial, words.maker],
          tx,
        );
  const own = same.find((row) => row.ownerId === ownerId);
  if (own) return { id: own.id, kind: own.kind, maker: own.maker, onHold: null };
  const id = v7();
  await Instrument.create({ id, ownerId, ...words, ...value, createdAt: now }, { transaction: tx });
  const onHold = same.length > 0 ? ASKS_FOR_PROOF : null;
  return { id, kind: words.kind, maker: words.maker, onHold };
}
