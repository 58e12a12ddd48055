/** A picture of the pair on the first page. */
export interface PaperPicture {
  jpeg: Buffer;
  /** "31 March" */
  day: string;
  caption: string;
}

/** Everything a warranty's paper says, as text; nothing on it is looked up while it is drawn. */
export interface PaperFacts {
  shop: { name: string; place: string; address: string; telephone: string; conditions: string };
  /** In groups, 4-4-3. */
  code: string;
  caseNumber: string;
  /** "parlour guitar by Aldous Pike" */
  instrument: string;
  serial: string | null;
  owner: string;
  /** "between 9 April 2026 and 24 April 2026" */
  repaired: string;
  pair: { before: PaperPicture; after: PaperPicture } | null;
  work: { text: string; name: string }[];
  /** "2 years" */
  term: string;
  starts: string;
  lastDay: string;
  /** "Ines Lund, shop owner, 24 April 2026, 16:05" */
  signed: string;
  /** "14 entries, 31 photos" */
  counts: string;
  /** 32 hex. */
  logKeyId: string;
  /** 64 hex. */
  sealValue: string;
  /** "wrenfield.example/verify" */
  address: string;
  /** What the QR code holds. */
  qr: string;
  /** "time-stamp to follow" */
  stamp: string;
}

/** Digits in groups of eight, as they are read aloud. */
export function grouped(hex: string): string {
  return hex.match(/.{1,8}/g)?.join(' ') ?? '';
}
