import type { Bundle } from '#evidence/bundle/bundle-shape.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import type { EntryShown } from '#evidence/chain/entry-shown.ts';
import { credentialHash } from '#evidence/credential/credential-hash.ts';
import { credentialPayload } from '#evidence/credential/credential-payload.ts';
import { signCredential } from '#evidence/credential/sign-credential.ts';
import { signStanding } from '#evidence/standing/sign-standing.ts';
import type { Standing } from '#evidence/standing/standing-shape.ts';
import { CASE, idOf, WitnessShop, type Sealed } from '#tests/evidence/witness-shop.ts';

export const CODE = '00000000000';

/** What an entry shows in form 2, with what a test does not care about filled in. */
export function entryShown(wish: Partial<EntryShown>): EntryShown {
  return {
    v: 2,
    phase: 'during',
    title: 'Bridge',
    text: '',
    occurred: null,
    used: [],
    climate: null,
    rest: null,
    by: 'technician 1',
    photos: [],
    copies: [],
    ...wish,
  };
}

const words = (n: number) => ({ n, caption: '', taken: null, pins: [] });

/** A whole case told from taking in to warranty and paper, in a log that holds another case too. */
export function tellCase(shop = new WitnessShop()) {
  const seal = shop.append.bind(shop);
  const takenIn = seal('entry', CASE, {
    occurredAt: '2026-04-09T08:10:00.000Z',
    parts: {
      shown: entryShown({
        phase: 'before',
        title: 'Taken in at the counter',
        text: 'Bridge lifted at the bass side, 0.4 mm.',
        photos: [{ n: 1, caption: 'Bass side', taken: '2026-04-09 10:12', pins: [] }],
      }),
      owner: { v: 1, name: 'Marguerite Osei', text: null },
      staff: { v: 1, names: { 'technician 1': 'Tomasz Rell' } },
    },
    photos: [{ n: 1 }, { n: 2, visibility: 'bench' }],
  });
  const bench = seal('entry', CASE, {
    visibility: 'bench',
    parts: { bench: { v: 1, text: 'Hide glue at 62 °C.', minutes: 40 } },
    photos: [{ n: 3, visibility: 'bench' }],
  });
  seal('entry', new Uint8Array(16).fill(9), { parts: { shown: entryShown({}) } });
  const amended = seal('amendment', CASE, {
    names: [takenIn],
    parts: {
      shown: entryShown({
        phase: 'before',
        text: 'Bridge lifted at the bass side, 0.6 mm.',
        photos: [words(1), words(4)],
        copies: [{ n: 4, of: 1 }],
      }),
    },
    photos: [{ n: 4 }],
  });
  const closed = seal('close', CASE, {
    names: [takenIn, bench, amended],
    parts: { shown: { v: 1, text: 'Bridge glued, crack cleated.', entries: 3, photos: 4 } },
  });
  const handedBack = seal('handed-back', CASE, {
    names: [closed],
    parts: { shown: { v: 1, text: 'Handed back at the counter.' } },
  });
  const warranty = warrant(shop, closed);
  return { shop, takenIn, bench, amended, closed, handedBack, ...warranty };
}

export function warrant(shop: WitnessShop, closed: Sealed, change: object = {}) {
  const payload = credentialPayload({
    id: '9b6c1e2a-50d4-4c1f-8a77-2f3e4d5c6b7a',
    origin: shop.origin,
    issuerName: 'Wrenfield Instrument Repair',
    validFrom: '2026-05-02T00:00:00.000Z',
    validUntil: '2028-05-01T23:59:59.999Z',
    instrument: 'Parlour guitar, Aldous Pike, 0417',
    work: 'Bridge reglued, top crack cleated',
    term: '24 months',
    code: CODE,
  });
  const signer = { keyId: idOf(shop.credentialSecret), secretKey: shop.credentialSecret };
  const credential = signCredential({ ...payload, ...change }, signer);
  const warranty = shop.append('warranty', CASE, {
    names: [closed],
    parts: { shown: { v: 1, jws: toHex(credentialHash(credential)) } },
  });
  return { credential, warranty };
}

/** The standing an honest shop signs over its newest head, but for what is changed. */
export function stand(shop: WitnessShop, warranty: Sealed, change: Partial<Standing> = {}): string {
  const [last, own] = [shop.chainOf(CASE).at(-1)!, shop.chainOf(new Uint8Array(16)).at(-1)!];
  const standing: Standing = {
    seal: toHex(warranty.leafHash),
    standing: 'in force',
    at: '2026-06-01T12:00:00.000Z',
    case: last.header.case,
    seq: last.header.seq,
    C: toHex(last.commitment),
    ownSeq: own.header.seq,
    ownC: toHex(own.commitment),
    checkpoint: shop.checkpoint(),
    ...change,
  };
  const signer = { keyId: idOf(shop.credentialSecret), secretKey: shop.credentialSecret };
  return signStanding(standing, signer);
}

/** The warranty's record, from the close it names, as it is handed out. */
export function warrantyBundle(told: ReturnType<typeof tellCase>): Bundle {
  const { shop, credential, warranty, closed } = told;
  const bundle = shop.bundle(CASE, closed.header.seq);
  return { ...bundle, credential, standing: stand(shop, warranty) };
}
