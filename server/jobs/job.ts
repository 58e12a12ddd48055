/** A claimed row of the outbox. `attempts` counts this one. */
export interface Job {
  id: string;
  kind: string;
  payload: unknown;
  attempts: number;
}

/** Does one kind of job. Throws to have it tried again; throws GiveUp when trying again is useless. */
export type Handler = (payload: unknown) => Promise<void>;

/** Ends a job for good: `code` is for programs and for `jobSentence`, never personal data. */
export class GiveUp extends Error {
  readonly code: string;

  constructor(code: string) {
    super(code);
    this.name = 'GiveUp';
    this.code = code;
  }
}
