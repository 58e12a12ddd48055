/**
 * What the evidence refuses, one class per reason. `code` is stable: callers branch on it and never
 * on the message. The message is a sentence in plain words: what is wrong and, where somebody can
 * mend it, what to do.
 */
export abstract class EvidenceError extends Error {
  abstract readonly code: string;

  constructor(message: string, options?: ErrorOptions) {
    super(message, options);
    this.name = new.target.name;
  }
}

/** Hex, base64, base64url, UTF-8, an instant or a number that is not in its one allowed form. */
export class EncodingError extends EvidenceError {
  readonly code = 'encoding';
}

/** Bytes that are not sealed JSON, or a value that cannot become sealed JSON. */
export class SealedJsonError extends EvidenceError {
  readonly code = 'sealed-json';
}

/** Something larger, deeper or more numerous than the format allows. */
export class LimitError extends EvidenceError {
  readonly code = 'limit';
}

/**
 * A `v`, kind, part name, entry length or first byte this program does not know. It may have been
 * made by a newer one, so a verifier says "not fully checked", never "does not match".
 */
export class UnknownFormError extends EvidenceError {
  readonly code = 'unknown-form';
}

/** A value of a known form whose members are not what that form prescribes. */
export class ShapeError extends EvidenceError {
  readonly code = 'shape';

  /** @param path where in the value, for example `photos.0.n`; empty for the value itself */
  constructor(
    message: string,
    readonly path = '',
  ) {
    super(message);
  }
}

/** A signature, or the frame around it, that does not hold. */
export class SignatureError extends EvidenceError {
  readonly code = 'signature';
}

/** A signed note or checkpoint that is malformed or not signed by a key that was given. */
export class NoteError extends EvidenceError {
  readonly code = 'note';
}

/** A proof text that is malformed, or a question no proof can answer. */
export class ProofError extends EvidenceError {
  readonly code = 'proof';
}

/** A key or certificate that is not of the kind and form required. */
export class KeyError extends EvidenceError {
  readonly code = 'key';
}

/** A warranty code or QR text that was typed or scanned wrongly. */
export class CodeError extends EvidenceError {
  readonly code = 'code';
}
