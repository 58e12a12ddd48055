import { describe, expect, it } from 'vitest';
import { isTypeOf, sniffPhoto } from './photo-file.ts';

const bytes = (text: string) => Uint8Array.from(text, (letter) => letter.charCodeAt(0));

describe('the kind of a photo by its first bytes', () => {
  it.each([
    ['\xff\xd8\xff\xe0\0\x10JFIF', 'image/jpeg'],
    ['\x89PNG\r\n\x1a\n\0\0\0\rIHDR', 'image/png'],
    ['RIFF\x10\0\0\0WEBPVP8 ', 'image/webp'],
    ['\0\0\0\x18ftypheic\0\0\0\0mif1heic', 'image/heic'],
    ['\0\0\0\x18ftypmif1\0\0\0\0mif1heic', 'image/heic'],
  ])('%j', (head, type) => {
    expect(sniffPhoto(bytes(head))).toBe(type);
  });

  it.each([
    '',
    'Just some words in a file named .jpg',
    'GIF89a',
    '%PDF-1.7',
    '\xff\xd8',
    '\x89PNG\n\x1a\n',
    'RIFF\x10\0\0\0WAVEfmt ',
    '\0\0\0\x18ftypavif',
    '\0\0\0\x18ftypisom',
    '<svg xmlns="http://www.w3.org/2000/svg">',
  ])('%j is none', (head) => {
    expect(sniffPhoto(bytes(head))).toBeNull();
  });
});

describe('what a sender calls a file', () => {
  it('is compared without case and parameters, and HEIF is HEIC', () => {
    expect(isTypeOf('image/JPEG; x=1', 'image/jpeg')).toBe(true);
    expect(isTypeOf('image/heif', 'image/heic')).toBe(true);
    expect(isTypeOf('image/png', 'image/jpeg')).toBe(false);
    expect(isTypeOf('image/heif', 'image/png')).toBe(false);
    expect(isTypeOf('', 'image/jpeg')).toBe(false);
  });
});
