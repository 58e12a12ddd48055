import { describe, expect, it } from 'vitest';
import { findBundle } from './find-bundle.ts';

const record = '{\n "format": "witnessmark-bundle/1",\n "origin": "Ünlaut"\n}\n';
const bytes = (text: string) => new Uint8Array(Buffer.from(text, 'utf8'));

describe('finding the record in a dropped file', () => {
  it('takes the file itself when it is one', () => {
    expect(findBundle(bytes(record))).toBe(record);
  });

  it('takes the attachment out of a paper, whatever its other bytes are', () => {
    const noise = Uint8Array.from({ length: 4000 }, (_, i) => (i * 37) % 256);
    const object = bytes(
      `7 0 obj\n<<\n/Type /EmbeddedFile\n>>\nstream\n${record}\nendstream\nendobj`,
    );
    const file = Buffer.concat([bytes('%PDF-1.7\n'), noise, object, noise]);
    expect(findBundle(file)).toBe(record.trim());
    expect(JSON.parse(findBundle(file)!)).toMatchObject({ origin: 'Ünlaut' });
  });

  it('finds none in another file, or in one that was cut', () => {
    expect(findBundle(bytes('%PDF-1.7 no record here'))).toBeNull();
    expect(findBundle(bytes('%PDF stream\n{"format":"witnessmark-bundle/1"'))).toBeNull();
    expect(findBundle(new Uint8Array())).toBeNull();
  });
});
