import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { defaultFormats } from 'jimp';
import { afterAll, describe, expect, it } from 'vitest';
import { drawPaper } from '#server/warranty/paper/draw-paper.ts';
import type { PaperFacts } from '#server/warranty/paper/paper-facts.ts';

// Where poppler's pdftotext finds each word of a paper whose texts are as long as forms let them be.

const folder = mkdtempSync(join(tmpdir(), 'witnessmark-overflow-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

interface Word {
  page: number;
  text: string;
  left: number;
  right: number;
  top: number;
  bottom: number;
}

function wordsOf(pdf: Buffer): Word[] {
  const file = join(folder, 'paper.pdf');
  writeFileSync(file, pdf);
  const html = execFileSync('pdftotext', ['-bbox', file, '-'], { encoding: 'utf8' });
  return html.split('<page ').flatMap((page, number) =>
    [...page.matchAll(/<word xMin="(\S+)" yMin="(\S+)" xMax="(\S+)" yMax="(\S+)">([^<]*)</g)].map(
      ([, left, top, right, bottom, text]) => ({
        page: number,
        text: text ?? '',
        left: Number(left),
        right: Number(right),
        top: Number(top),
        bottom: Number(bottom),
      }),
    ),
  );
}

const jpeg = await (async () => {
  const format = defaultFormats
    .map((make) => make() as unknown as { mime: string; encode(image: object): Promise<Buffer> })
    .find(({ mime }) => mime === 'image/jpeg');
  return format!.encode({ data: Buffer.alloc(300 * 200 * 4, 120), width: 300, height: 200 });
})();

const picture = (caption: string) => ({ jpeg, day: '31 September', caption });
const usual: PaperFacts = {
  shop: {
    name: 'Harrow Lane Repairs',
    place: 'Saltmere',
    address: '9 Harrow Lane, Saltmere',
    telephone: '0000\u00a0000\u00a0000',
    conditions: 'It does not cover knocks, heavier strings than were fitted, or work by others.',
  },
  code: 'K7QM-3RXT-V2A',
  caseNumber: '2026-031',
  instrument: 'parlour guitar by Perrin Kell',
  serial: 'PK-77419',
  owner: 'Leopoldine Carrow',
  repaired: 'between 9 and 24 April 2026',
  pair: { before: picture('Bridge lifted'), after: picture('Bridge seated') },
  work: [{ text: 'Bridge reglued', name: 'Bram Ottway' }],
  term: '2 years',
  starts: '24 April 2026',
  lastDay: '24 April 2028',
  signed: 'Sunniva Reed, front desk, 24 April 2026, 16:05',
  counts: '14 entries, 31 photos',
  logKeyId: '5c1e90b733fa08d2a94477e01b6fd35c',
  sealValue: '41d077e2c8a1530f7be490c30d51c86ab6093e5ad8127fc4913c60eb2d75f80a',
  address: 'shop.example/verify',
  qr: 'https://shop.example/verify/K7QM3RXTV2A#1.QdB34sihUw975JDDDVHIag.XB6QtzP6CNKpRHfgG2_TXA',
  stamp: 'the shop’s clock; outside time-stamp to follow',
};

const long = (length: number) =>
  'Quartersawn spruce cleats under the crack in the top '.repeat(20).slice(0, length).trim();
const longName = 'Maximiliana Theodora Featherstonehaugh-Ravenscroft of Little Saltmere';
const variants: [name: string, facts: PaperFacts][] = [
  ['usual', usual],
  ['without pictures, with one line', { ...usual, pair: null }],
  [
    'twenty lines at their longest, long names and captions',
    {
      ...usual,
      owner: `${longName} and ${longName}`,
      instrument: `${long(58)} by ${long(118)}`,
      work: Array.from({ length: 20 }, (_, n) => ({
        text: `${n + 1} ${long(157)}`,
        name: longName,
      })),
      pair: { before: picture(long(160)), after: picture(long(160)) },
    },
  ],
  [
    'terms longer than a page',
    { ...usual, shop: { ...usual.shop, name: long(118), conditions: long(900).repeat(4) } },
  ],
  ['names in other scripts', { ...usual, owner: 'Žofia Łękawska, Ιφιγένεια Παππά, Любовь Орлова' }],
];

// The border's inner line and the line above the seal, in points from the page's top left.
const FRAME = { left: 50, right: 545, top: 40, bottom: 805 };
const SEAL_TOP = 882 * 0.75;

describe('a paper', () => {
  it.each(variants)('keeps to its frame: %s', async (_name, facts) => {
    const words = wordsOf(await drawPaper(facts, [], new Date('2026-04-24T15:05:00.000Z')));
    expect(words.length).toBeGreaterThan(150);
    for (const word of words) {
      const inside =
        word.left >= FRAME.left &&
        word.right <= FRAME.right &&
        word.top >= FRAME.top &&
        word.bottom <= FRAME.bottom;
      expect(inside, `${word.text} on page ${word.page}`).toBe(true);
    }
    // What stands above the seal ends above its line, and the first page stays one side.
    const first = words.filter(({ page }) => page === 1);
    const claim = first.findLast(({ text }) => text === '2.');
    expect(claim!.bottom).toBeLessThan(SEAL_TOP);
    expect(first.some(({ text }) => text === 'Sealed')).toBe(true);
    const text = words.map((word) => word.text).join(' ');
    expect(text).toContain('Your rights by law');
  });

  it('says in other scripts what it was given', async () => {
    const [, facts] = variants.at(-1)!;
    const words = wordsOf(await drawPaper(facts, [], new Date('2026-04-24T15:05:00.000Z')));
    const text = words.map((word) => word.text).join(' ');
    expect(text).toContain('Žofia Łękawska, Ιφιγένεια Παππά, Любовь Орлова');
  });
});
