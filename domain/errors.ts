/**
 * What can go wrong by a person's doing or an outside service's, each with a sentence that says what
 * is wrong and then what to do. Operations throw these; routes turn them into answers in one place.
 */
export class Problem extends Error {
  /** Stable, for programs. */
  readonly code: string;
  /** Sentences by the name of the field they belong to. */
  readonly fields: Record<string, string>;

  constructor(code: string, sentence: string, fields: Record<string, string> = {}) {
    super(sentence);
    this.name = new.target.name;
    this.code = code;
    this.fields = fields;
  }

  /** For people: what is wrong, then what to do. */
  get sentence(): string {
    return this.message;
  }
}

/** It does not exist, or not for this viewer: the two are never told apart. */
export class NotFound extends Problem {
  constructor(sentence = 'There is nothing here under this address. Check the number.') {
    super('not-found', sentence);
  }
}

/** The viewer's role has no right to the act. */
export class NotAllowed extends Problem {
  constructor(sentence = 'Your role does not include this. Ask the shop owner.') {
    super('not-allowed', sentence);
  }
}

/** The input cannot be used. `fields` says why per field; without fields the sentence stands alone. */
export class Invalid extends Problem {
  constructor(fields: Record<string, string>, sentence?: string, code = 'invalid') {
    const first = Object.values(fields)[0];
    super(code, sentence ?? first ?? 'This cannot be read. Check the form.', fields);
  }
}

/** The input is right, but what is already there forbids it. */
export class Conflict extends Problem {
  constructor(sentence: string) {
    super('conflict', sentence);
  }
}

/** Asked too often; `retryAfter` is in seconds. */
export class TooMany extends Problem {
  readonly retryAfter: number;

  constructor(sentence: string, retryAfter: number) {
    super('too-many', sentence);
    this.retryAfter = retryAfter;
  }
}

/** More bytes or pixels than the shop takes. */
export class TooLarge extends Problem {
  constructor(sentence: string) {
    super('too-large', sentence);
  }
}

/** A kind of file the shop cannot read. */
export class Unsupported extends Problem {
  constructor(sentence: string) {
    super('unsupported', sentence);
  }
}

/** The services the shop relies on, as people know them. */
export type Service = 'database' | 'store' | 'mail' | 'identity';

const GONE: Record<Service, string> = {
  database: 'The shop’s database does not answer. Wait a minute and try again.',
  store: 'The shop’s photo store does not answer. Wait a minute and try again.',
  mail: 'The shop’s mail does not go out at the moment. It is kept and sent later.',
  identity: 'The shop’s sign-in service does not answer. Wait a minute and try again.',
};

/** An outside service is slow, refuses or is gone. */
export class Unavailable extends Problem {
  readonly service: Service;

  constructor(service: Service, sentence = GONE[service]) {
    super(`${service}-unavailable`, sentence);
    this.service = service;
  }
}
