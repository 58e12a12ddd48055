import { execFileSync, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buffer } from 'node:stream/consumers';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fromHex } from '#evidence/bytes/hex.ts';
import { qrFragment } from '#evidence/code/qr-fragment.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import { select } from '#server/db/sql.ts';
import { env } from '#server/env.ts';
import { currentKey } from '#server/evidence/current-key.ts';
import { openLog } from '#server/evidence/open-log.ts';
import { continueWarranty } from '#server/warranty/continue-warranty.ts';
import { issueWarranty } from '#server/warranty/issue-warranty.ts';
import { readPaper } from '#server/warranty/read-paper.ts';
import { unsafeWarranty, type Warranty } from '#server/warranty/warranty.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { useStore } from '#tests/setup/store.ts';
import { closedCase } from '#tests/record/closed-case.ts';
import { OWNER_NAME, SERIAL, setUpShop } from '#tests/record/shop.ts';

// The paper read by programs that know nothing of this one: poppler (pdfsig, pdfinfo, pdffonts,
// pdfdetach, pdftotext, pdftoppm), qpdf, zbarimg, openssl, all as Debian ships them.

useDatabase();
useStore();

const NOW = new Date('2026-04-24T15:05:00.000Z');
const folder = mkdtempSync(join(tmpdir(), 'witnessmark-paper-'));
const at = (name: string) => join(folder, name);
let warranty: Warranty;
let pdf: Buffer;

const outputOf = (program: string, ...args: string[]) =>
  execFileSync(program, args, { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] });

beforeAll(async () => {
  const shop = await setUpShop();
  await openLog({ now: new Date('2026-03-01T08:00:00.000Z') });
  const repair = await closedCase(shop, { now: NOW });
  const names = ['Bridge reglued', 'Crack glued', 'Frets levelled', 'Nut made', 'Set up', 'Strung'];
  const work = [...names, 'Cleaned', 'Polished'].map((text) => ({
    text,
    personId: shop.technician.personId,
  }));
  const { warrantyId } = await issueWarranty(
    shop.desk,
    { caseNumber: repair.number, months: 24, work },
    { now: NOW },
  );
  await continueWarranty(warrantyId, { now: NOW });
  warranty = await unsafeWarranty(warrantyId);
  const [paper] = await select<{ id: string }>('SELECT id FROM papers');
  const found = await readPaper(shop.desk, { paperId: paper!.id });
  pdf = await buffer(await found.open());
  writeFileSync(at('paper.pdf'), pdf);
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** pdfsig ends with 0 whatever it finds, so its lines are read. */
function pdfsig(file: Buffer): string {
  writeFileSync(at('signed.pdf'), file);
  return outputOf('pdfsig', at('signed.pdf'));
}

describe('the paper as a PDF reader sees it', () => {
  it('is signed whole, once, and says when a byte is changed or added', () => {
    const lines = pdfsig(pdf);
    expect(lines).toContain('Signature is Valid.');
    expect(lines).toContain('Total document signed');
    expect(lines).toContain('Signer Certificate Common Name: Harrow Lane Repairs');
    expect(lines.match(/^Signature #/gm)).toHaveLength(1);
    // One revision: the cross-reference table is written once.
    expect(pdf.toString('latin1').match(/startxref/g)).toHaveLength(1);
    const places = [20, 40_000, pdf.indexOf('witnessmark-bundle/1'), pdf.length - 20];
    for (const place of places) {
      const other = Buffer.from(pdf);
      other[place]! ^= 0x01;
      expect(pdfsig(other), `byte ${place}`).not.toContain('Signature is Valid.');
    }
    const changed = Buffer.from(pdf);
    changed[pdf.indexOf('witnessmark-bundle/1')]! ^= 0x01;
    expect(pdfsig(changed)).toContain('Digest Mismatch.');
    expect(pdfsig(Buffer.concat([pdf, Buffer.from('\n%%EOF\n')]))).toContain(
      'Not total document signed',
    );
  });

  it('is well formed, tagged, in a language, with its fonts inside', () => {
    expect(outputOf('qpdf', '--check', at('paper.pdf'))).toContain(
      'No syntax or stream encoding errors found',
    );
    const info = outputOf('pdfinfo', at('paper.pdf'));
    expect(info).toMatch(/^Tagged:\s+yes$/m);
    expect(info).toMatch(/^Pages:\s+2$/m);
    expect(info).toMatch(/^Page size:\s+595\.28 x 841\.89 pts \(A4\)$/m);
    expect(pdf.toString('latin1')).toContain('/Lang (en-GB)');
    const fonts = outputOf('pdffonts', at('paper.pdf')).trim().split('\n').slice(2);
    expect(fonts.length).toBeGreaterThanOrEqual(5);
    // Columns: embedded, subset, maps to Unicode.
    for (const font of fonts) expect(font).toMatch(/\s+yes yes yes\s/);
  });

  it('reads in order, with everything a written warranty needs', () => {
    const structure = outputOf('pdfinfo', '-struct-text', at('paper.pdf'));
    const order = [
      'Warranty summary',
      'Covered work',
      'Terms',
      'Sealed and intact',
      'Terms in full',
    ];
    const found = order.map((text) => structure.indexOf(`"${text}`));
    expect(found).toEqual([...found].sort((a, b) => a - b));
    expect(Math.min(...found)).toBeGreaterThan(0);
    const text = outputOf('pdftotext', '-layout', at('paper.pdf'), '-').replace(/\s+/g, ' ');
    for (const needed of [
      `${warranty.code.slice(0, 4)}-${warranty.code.slice(4, 8)}-${warranty.code.slice(8)}`,
      OWNER_NAME,
      SERIAL,
      'Bram Ottway',
      'Limited warranty',
      'and 2 more, listed in the file',
      'Who is covered',
      'What we will do',
      'Start and length',
      'How to claim',
      'What is not covered',
      'Your rights by law',
      'ends at the end of 24 April 2028',
      '9 Harrow Lane, Saltmere',
      'time-stamp to follow',
    ]) {
      expect(text).toContain(needed);
    }
  });

  it('prints the seal value and key, and a QR code that says them again', async () => {
    const seal = warranty.seal!.toString('hex');
    const { id } = await currentKey('log');
    const digits = outputOf('pdftotext', '-f', '1', '-l', '1', at('paper.pdf'), '-').replace(
      /[^0-9a-f]/g,
      '',
    );
    expect(digits).toContain(seal);
    expect(digits).toContain(id);
    // At 150 dots an inch, and as a grey copy.
    outputOf(
      'pdftoppm',
      '-r',
      '150',
      '-gray',
      '-f',
      '1',
      '-l',
      '1',
      '-png',
      at('paper.pdf'),
      at('page'),
    );
    const qr = outputOf('zbarimg', '-q', '--raw', at('page-1.png')).trim();
    expect(qr).toBe(`${env().PUBLIC_URL}/verify/${warranty.code}${qrFragment(fromHex(seal), id)}`);
  });

  it('carries its record, credential and checkpoint, the record without a filter', async () => {
    const list = outputOf('pdfdetach', '-list', at('paper.pdf'));
    for (const name of ['bundle.witnessmark.json', 'credential.jws', 'checkpoint']) {
      expect(list).toContain(name);
    }
    outputOf('pdfdetach', '-saveall', '-o', folder, at('paper.pdf'));
    const bundle = readFileSync(at('bundle.witnessmark.json'));
    expect(pdf.indexOf(bundle)).toBeGreaterThan(0);
    const { id } = await currentKey('log');
    const report = verifyBundle(bundle.toString('utf8'), {
      logKeyId: id,
      logKeyFrom: 'remembered',
    });
    expect([report.verdict, report.standing.word]).toEqual(['Intact', 'in force']);
    expect(report.record?.sealValue).toBe(warranty.seal!.toString('hex'));
    expect(readFileSync(at('credential.jws'), 'ascii')).toBe(warranty.jws);
  });

  it('has a credential that openssl verifies with the key of the log', async () => {
    outputOf('pdfdetach', '-saveall', '-o', folder, at('paper.pdf'));
    const [header, payload, signature] = readFileSync(at('credential.jws'), 'ascii').split('.');
    const { spki } = await currentKey('credential');
    writeFileSync(at('key.der'), spki);
    writeFileSync(at('signature'), Buffer.from(signature!, 'base64url'));
    const verify = (signed: string) => {
      writeFileSync(at('signed'), signed);
      return spawnSync(
        'openssl',
        [
          'pkeyutl',
          '-verify',
          '-pubin',
          '-keyform',
          'DER',
          '-inkey',
          at('key.der'),
          '-rawin',
        ].concat(['-in', at('signed'), '-sigfile', at('signature')]),
        { encoding: 'utf8' },
      );
    };
    const good = verify(`${header}.${payload}`);
    expect([good.status, good.stdout]).toEqual([0, 'Signature Verified Successfully\n']);
    expect(verify(`${header}.${payload!.replace(/.$/, 'A')}x`).status).not.toBe(0);
  });

  it('is sealed byte for byte: sha256sum gives what the log holds', async () => {
    const [sum] = outputOf('sha256sum', at('paper.pdf')).split(' ');
    expect(sum).toBe(createHash('sha256').update(pdf).digest('hex'));
    const [row] = await select<{ sha256: Buffer; length: number }>(
      'SELECT sha256, length FROM papers',
    );
    expect([row!.sha256.toString('hex'), row!.length]).toEqual([sum, pdf.length]);
  });
});
