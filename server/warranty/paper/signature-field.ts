import type { Doc } from './tagging.ts';

/** Room for the PKCS#7 signature: about 2.2 kB with one certificate of RSA-3072. */
const SIGNATURE_BYTES = 8192;
// signpdf looks for exactly these stars and writes the byte range over them.
const STARS = '*'.repeat(10);

type Writer = Omit<Doc, 'page' | 'ref'> & {
  _root: { data: Record<string, unknown> };
  ref(data: object): { end(): void };
  page: { dictionary: unknown; annotations: unknown[] };
};

const text = (value: string) => new String(value);

/**
 * Adds an invisible signature field (ISO 32000-1, 12.8) to the page in hand, with room for the
 * signature. It certifies the file and permits no change to it (DocMDP, P 1): one revision, whole.
 */
export function addSignatureField(doc: Doc, { name, now }: { name: string; now: Date }): void {
  const writer = doc as unknown as Writer;
  const signature = writer.ref({
    Type: 'Sig',
    Filter: 'Adobe.PPKLite',
    SubFilter: 'adbe.pkcs7.detached',
    ByteRange: [0, STARS, STARS, STARS],
    Contents: Buffer.alloc(SIGNATURE_BYTES),
    Name: text(name),
    Reason: text('Issued as it is'),
    M: now,
    Reference: [
      {
        Type: 'SigRef',
        TransformMethod: 'DocMDP',
        TransformParams: { Type: 'TransformParams', P: 1, V: '1.2' },
      },
    ],
  });
  signature.end();
  // Invisible and locked: Print (4), Hidden would be 2, Locked (128).
  const field = writer.ref({
    Type: 'Annot',
    Subtype: 'Widget',
    FT: 'Sig',
    T: text('Shop'),
    TU: text('Signature of the shop'),
    Rect: [0, 0, 0, 0],
    F: 132,
    P: writer.page.dictionary,
    V: signature,
  });
  field.end();
  writer.page.annotations.push(field);
  doc.font('sans').initForm();
  const form = writer._root.data.AcroForm as { data: Record<string, unknown> };
  // Readers are not to draw fields anew: that would change what was signed.
  Object.assign(form.data, { Fields: [field], SigFlags: 3, NeedAppearances: undefined });
  writer._root.data.Perms = { DocMDP: signature };
}
