import { Problem } from '#domain/errors.ts';

/** The bytes that came are not those that were sent: to be sent again as they are. */
export class ArrivedDamaged extends Problem {
  constructor(sentence = 'The photo did not arrive as it was sent. Send it again.') {
    super('arrived-damaged', sentence);
  }
}
