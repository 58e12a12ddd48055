import type { Doc } from './tagging.ts';

/** A file inside the paper. */
export interface Attachment {
  name: string;
  bytes: Buffer;
  type: string;
  description: string;
}

/**
 * Attaches files as they are, without a filter, so that they can be found in the paper's bytes by a
 * program that reads no PDF.
 */
export function attach(doc: Doc, files: Attachment[], now: Date): void {
  const writer = doc as Doc & { compress: boolean };
  const { compress } = writer;
  writer.compress = false;
  for (const { name, bytes, type, description } of files) {
    doc.file(bytes, {
      name,
      type,
      description,
      relationship: 'Data',
      creationDate: now,
      modifiedDate: now,
    } as PDFKit.Mixins.PDFAttachmentOptions);
  }
  writer.compress = compress;
}
