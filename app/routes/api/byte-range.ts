/** Bytes from `start` to `end`, both counted from 0 and both included. */
export interface ByteRange {
  start: number;
  end: number;
}

const SINGLE = /^bytes=(\d*)-(\d*)$/;

/**
 * What part of `length` bytes a request asks for (RFC 9110 14.2): `whole` without a range or with one
 * that is not understood (several ranges, or one for other bytes by If-Range), `outside` when none of
 * it exists.
 */
export function byteRange(
  headers: Headers,
  { length, etag }: { length: number; etag: string },
): ByteRange | 'whole' | 'outside' {
  const [, from, to] = SINGLE.exec(headers.get('Range') ?? '') ?? [];
  const condition = headers.get('If-Range');
  if (from === undefined || to === undefined || from + to === '') return 'whole';
  if (condition !== null && condition !== etag) return 'whole';
  // Without a first byte it is the number of bytes from the end.
  const start = from === '' ? Math.max(0, length - Number(to)) : Number(from);
  const end = from === '' || to === '' ? length - 1 : Math.min(Number(to), length - 1);
  if (from !== '' && to !== '' && Number(to) < start) return 'whole';
  return start > end ? 'outside' : { start, end };
}

/** Whether If-None-Match names this entity (RFC 9110 13.1.2): the reader has it already. */
export function hasAlready(headers: Headers, etag: string): boolean {
  const named = headers.get('If-None-Match')?.split(',') ?? [];
  return named.some((tag) => ['*', etag].includes(tag.trim().replace(/^W\//, '')));
}
