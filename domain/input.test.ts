import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { Invalid } from './errors.ts';
import { neededText, optionalText, parseInput, text, ticked } from './input.ts';

describe('text as typed', () => {
  it('is composed, trimmed, and free of control and direction characters', () => {
    const read = parseInput(
      text('The note', 50),
      '  Cafe\u0301\u0000 \u202eabc\r\nnext\ttab\u2028  ',
    );
    expect(read).toBe('Café abc\nnext tab');
  });

  it('counts characters as people do, not code units', () => {
    expect(parseInput(text('The note', 3), '🎻🎻🎻')).toBe('🎻🎻🎻');
    expect(() => parseInput(text('The note', 3), '🎻🎻🎻🎻')).toThrow(
      'The note has 4 characters; 3 is the most. Shorten it.',
    );
  });

  it('is null or refused when empty, as the field says', () => {
    expect(parseInput(optionalText('The serial', 80), '   ')).toBeNull();
    expect(() => parseInput(neededText('The name', 80, 'A name is missing.'), ' ')).toThrow(
      'A name is missing.',
    );
  });

  it('puts one-line fields on one line', () => {
    expect(parseInput(optionalText('The serial', 80), 'a\n b')).toBe('a b');
  });
});

describe('a form', () => {
  it('names each wrong field once, the first wrong one first', () => {
    const schema = z.object({
      owner: z.object({ name: neededText('The name', 5, 'A name is missing.') }),
      serial: text('The serial', 3),
    });
    try {
      parseInput(schema, { owner: { name: '' }, serial: 'x'.repeat(300) });
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(Invalid);
      expect((error as Invalid).fields).toEqual({
        'owner.name': 'A name is missing.',
        serial: 'The serial has 300 characters; 3 is the most. Shorten it.',
      });
      expect((error as Invalid).sentence).toBe('A name is missing.');
    }
  });

  it('reads tick boxes', () => {
    expect([undefined, '', 'on', 'true', true, false].map((v) => parseInput(ticked, v))).toEqual([
      false,
      false,
      true,
      true,
      true,
      false,
    ]);
  });
});
