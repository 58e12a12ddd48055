import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';
import { fromHex, toHex } from '#evidence/bytes/hex.ts';
import { sha256 } from '#evidence/bytes/sha256.ts';
import { fromUtf8 } from '#evidence/bytes/utf8.ts';
import { toUtf8 } from '#evidence/bytes/utf8.ts';
import { canonicalText } from '#evidence/json/canonical-text.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { checkValues } from '#tests/outside/check-values.ts';

test.each(
  checkValues<{ message_hex?: string; message?: string }, { sha256: string }>(
    'sha256',
    'crypto.sha256',
  ),
)('$id ($source)', ({ inputs, expected }) => {
  const message =
    inputs.message_hex === undefined ? toUtf8('a'.repeat(1_000_000)) : fromHex(inputs.message_hex);
  expect(toHex(sha256(message))).toBe(expected.sha256);
  expect(createHash('sha256').update(message).digest('hex')).toBe(expected.sha256);
});

test.each(
  checkValues<{ json_text: string }, { canonical_utf8_hex: string; sha256: string }>(
    'jcs',
    'crypto.jcs',
  ),
)('$id ($source)', ({ inputs, expected }) => {
  const canonical = toUtf8(canonicalText(JSON.parse(inputs.json_text) as JsonValue));
  expect(fromUtf8(canonical)).toBe(fromUtf8(fromHex(expected.canonical_utf8_hex)));
  expect(toHex(sha256(canonical))).toBe(expected.sha256);
});

test.each(checkValues<{ ieee754_hex: string }, { text: string }>('jcs', 'crypto.jcs_number'))(
  '$id ($source)',
  ({ inputs, expected }) => {
    const bytes = fromHex(inputs.ieee754_hex, 8);
    const number = new DataView(bytes.buffer, bytes.byteOffset).getFloat64(0);
    expect(canonicalText(number)).toBe(expected.text);
  },
);
