/**
 * How a line of a report came about: `checked` here; `failed` here; `not-checked` for something
 * missing, unknown or not from outside; `shop-word` for what only the shop says.
 */
export type Outcome = 'checked' | 'failed' | 'not-checked' | 'shop-word';

/** What a line is about; the sentences are in `sentence.ts`. */
export type FindingId =
  | 'bundle'
  | 'unknown-member'
  | 'checkpoint'
  | 'inclusion'
  | 'header'
  | 'unknown-kind'
  | 'own-chain'
  | 'case-chain'
  | 'lost'
  | 'parts'
  | 'unknown-part'
  | 'photos'
  | 'salts'
  | 'order'
  | 'names'
  | 'keys'
  | 'growth'
  | 'stamps'
  | 'bracket'
  | 'warranty'
  | 'standing'
  | 'whose-key'
  | 'paper-seal'
  | 'code'
  | 'later-entries'
  | 'kept-back';

/** What a sentence is filled with. */
export type FindingData = { [name: string]: string | number | null };

/** One line of a report; `decides` when the verdict depends on it. */
export type Finding = {
  id: FindingId;
  outcome: Outcome;
  decides: boolean;
  data: FindingData;
};

/** Collects findings while a record is checked. */
export class Findings {
  readonly list: Finding[] = [];

  checked(id: FindingId, data: FindingData = {}): void {
    this.list.push({ id, outcome: 'checked', decides: true, data });
  }

  failed(id: FindingId, data: FindingData = {}): void {
    this.list.push({ id, outcome: 'failed', decides: true, data });
  }

  /** Something missing or unknown that keeps the verdict from being Intact. */
  notChecked(id: FindingId, data: FindingData = {}): void {
    this.list.push({ id, outcome: 'not-checked', decides: true, data });
  }

  /** A line that informs and changes no verdict. */
  line(id: FindingId, outcome: Outcome, data: FindingData = {}): void {
    this.list.push({ id, outcome, decides: false, data });
  }

  /** Whether anything failed so far, or about one thing only. */
  anyFailed(id?: FindingId): boolean {
    return this.list.some((f) => f.outcome === 'failed' && (id === undefined || f.id === id));
  }
}
