import { ShapeError } from '#evidence/errors.ts';

const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;
const ORIGIN =
  /^witnessmark\/([0-9a-f]{8})([0-9a-f]{4})(4[0-9a-f]{3})([89ab][0-9a-f]{3})([0-9a-f]{12})$/;

/**
 * The origin of a log: `witnessmark/` and the 32 hex of a random UUID, with no name in it.
 * @param uuid version 4, lower case
 * @throws ShapeError for any other text
 */
export function originOf(uuid: string): string {
  if (!UUID.test(uuid)) throw new ShapeError('A log is named by a random UUID of version 4.');
  return `witnessmark/${uuid.replaceAll('-', '')}`;
}

/**
 * The UUID a log's origin was made from.
 * @throws ShapeError when the text is not an origin of ours
 */
export function uuidOfOrigin(origin: string): string {
  const match = ORIGIN.exec(origin);
  if (!match) throw new ShapeError('This is not the origin of a witness log.', 'origin');
  return match.slice(1).join('-');
}

/** Whether a text is the origin of a log of ours. */
export function isOrigin(text: string): boolean {
  return ORIGIN.test(text);
}
