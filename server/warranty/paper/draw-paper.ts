import PDFDocument from 'pdfkit';
import { attach, type Attachment } from './attach.ts';
import type { PaperFacts } from './paper-facts.ts';
import { PAGE } from './sheet.ts';
import { addSignatureField } from './signature-field.ts';
import { drawSummary } from './summary-page.ts';
import { group } from './tagging.ts';
import { drawTerms } from './terms-page.ts';
import { registerFonts } from './type.ts';

/**
 * Draws a warranty's paper: a tagged A4 PDF with embedded fonts, its attachments, and a field for the
 * signature. Looks nothing up; `now` is the time it says it was made at.
 */
export async function drawPaper(
  facts: PaperFacts,
  attachments: Attachment[],
  now: Date,
): Promise<Buffer> {
  const doc = new PDFDocument({
    size: [PAGE.width, PAGE.height],
    margin: 0,
    pdfVersion: '1.7',
    tagged: true,
    lang: 'en-GB',
    displayTitle: true,
    info: {
      Title: `Warranty ${facts.code}`,
      Author: facts.shop.name,
      Subject: `Warranty on the repair of the ${facts.instrument}`,
      CreationDate: now,
      ModDate: now,
    },
  });
  const chunks: Buffer[] = [];
  doc.on('data', (chunk: Buffer) => chunks.push(chunk));
  const ended = new Promise<void>((resolve, reject) => {
    doc.on('end', resolve).on('error', reject);
  });
  registerFonts(doc);
  const root = doc.struct('Document');
  doc.addStructure(root);
  addSignatureField(doc, { name: facts.shop.name, now });
  drawSummary(doc, group(doc, root, 'Sect'), facts);
  drawTerms(doc, root, facts);
  root.end();
  attach(doc, attachments, now);
  doc.end();
  await ended;
  return Buffer.concat(chunks);
}
