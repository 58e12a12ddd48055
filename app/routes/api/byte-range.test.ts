import { describe, expect, it } from 'vitest';
import { byteRange, hasAlready } from './byte-range.ts';

const etag = '"abc"';
const range = (value: string, more = {}) =>
  byteRange(new Headers({ Range: value, ...more }), { length: 10_000, etag });

// The examples of RFC 9110 14.1.2, for a representation of 10000 bytes.
describe('the part of a file that is asked for', () => {
  it.each([
    ['bytes=0-499', { start: 0, end: 499 }],
    ['bytes=500-999', { start: 500, end: 999 }],
    ['bytes=-500', { start: 9500, end: 9999 }],
    ['bytes=9500-', { start: 9500, end: 9999 }],
    ['bytes=9500-20000', { start: 9500, end: 9999 }],
    ['bytes=-20000', { start: 0, end: 9999 }],
    ['bytes=0-0', { start: 0, end: 0 }],
    ['bytes=0-0,-1', 'whole'],
    ['bytes=-', 'whole'],
    ['bytes=5-2', 'whole'],
    ['lines=1-2', 'whole'],
    ['bytes=10000-', 'outside'],
    ['bytes=10000-10001', 'outside'],
    ['bytes=-0', 'outside'],
  ])('%s', (value, part) => {
    expect(range(value)).toEqual(part);
  });

  it('is all of it without a range, and when If-Range names other bytes', () => {
    expect(byteRange(new Headers(), { length: 10, etag })).toBe('whole');
    expect(range('bytes=0-9', { 'If-Range': '"other"' })).toBe('whole');
    expect(range('bytes=0-9', { 'If-Range': etag })).toEqual({ start: 0, end: 9 });
  });
});

describe('what a reader has already', () => {
  it.each([
    ['"abc"', true],
    ['W/"abc"', true],
    ['"x", "abc"', true],
    ['*', true],
    ['"abcd"', false],
    ['abc', false],
  ])('If-None-Match: %s', (value, has) => {
    expect(hasAlready(new Headers({ 'If-None-Match': value }), etag)).toBe(has);
  });

  it('is nothing without the header', () => {
    expect(hasAlready(new Headers(), etag)).toBe(false);
  });
});
