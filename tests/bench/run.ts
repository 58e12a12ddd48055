import { chromium } from 'playwright-core';
import { serveFloor } from './build-floor.ts';
import { install } from './installation.ts';
import { startTimes } from './start-times.ts';
import { weighPage, type Weight } from './weigh-page.ts';

/** One line of the table. `limit`: what the figure is held against, in the same unit. */
interface Figure {
  what: string;
  value: number;
  unit: string;
  limit?: number;
}

const browserFlags = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

async function measurePages(): Promise<Figure[]> {
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: browserFlags,
  });
  const floor = await serveFloor();
  const site = await install();
  try {
    const { closeDatabase } = await import('#server/db/connection.ts');
    const { openDemoShop } = await import('#seeds/demo-shop.ts');
    const { openLog } = await import('#server/evidence/open-log.ts');
    const { startSession } = await import('#server/auth/start-session.ts');
    const { caseOfPhotos } = await import('./case-of-photos.ts');
    const { countStatements } = await import('./count-statements.ts');
    const at = new Date(Date.now() - 10 * 3_600_000);
    const cast = await openDemoShop(at);
    await openLog({ now: at });
    const few = await caseOfPhotos(cast, { count: 3, at, email: 'few@ashgrove.example' });
    const later = new Date(at.getTime() + 3_600_000);
    const many = await caseOfPhotos(cast, { count: 60, at: later, email: 'many@ashgrove.example' });
    await site.serve();
    const open = async ({ number, customerId }: typeof many) => {
      const cookie = await startSession(new Request(site.url), { customerId });
      const header = cookie.split(';')[0] ?? '';
      return { url: `${site.url}/portal/cases/${number}/timeline`, header };
    };
    const fewPage = await open(few);
    const manyPage = await open(many);
    const [name = '', value = ''] = manyPage.header.split(/=(.*)/s);
    const context = await browser.newContext({ viewport: { width: 390, height: 844 } });
    await context.addCookies([{ name, value, url: site.url }]);
    const ours = await weighPage(context, manyPage.url);
    const least = await weighPage(await browser.newContext(), floor.url);
    const get = ({ url, header }: typeof fewPage) => fetch(url, { headers: { Cookie: header } });
    const ofThree = await countStatements(() => get(fewPage));
    const ofSixty = await countStatements(() => get(manyPage));
    await closeDatabase();
    return [...weightFigures(ours, least), ...statementFigures(ofThree, ofSixty)];
  } finally {
    await browser.close();
    await floor.stop();
    await site.stop();
  }
}

const PAGE = 'portal case, 60 photos';

function weightFigures(ours: Weight, floor: Weight): Figure[] {
  return [
    { what: 'empty page: JavaScript, brotli', value: floor.js, unit: 'bytes' },
    { what: `${PAGE}: JavaScript, brotli`, value: ours.js, unit: 'bytes' },
    { what: `${PAGE}: above the floor`, value: ours.js - floor.js, unit: 'bytes', limit: 20_000 },
    {
      what: `${PAGE}: HTML + CSS, brotli`,
      value: ours.html + ours.css,
      unit: 'bytes',
      limit: 40_000,
    },
    { what: `${PAGE}: fonts`, value: ours.fonts, unit: 'bytes' },
    { what: `${PAGE}: pictures before scrolling`, value: ours.pictures, unit: 'bytes' },
    { what: `${PAGE}: requests`, value: ours.requests, unit: '' },
  ];
}

function statementFigures(ofThree: number, ofSixty: number): Figure[] {
  return [
    { what: 'portal case, 3 photos: statements', value: ofThree, unit: '' },
    { what: `${PAGE}: statements`, value: ofSixty, unit: '', limit: ofThree },
  ];
}

async function measureStart(): Promise<Figure[]> {
  const { cold, warm } = await startTimes();
  return [
    { what: 'npm start, cold (packages, build, demo)', value: cold, unit: 's' },
    { what: 'npm start, warm', value: warm, unit: 's' },
  ];
}

function line({ what, value, unit, limit }: Figure): string {
  const figure = Number.isInteger(value) ? String(value) : value.toFixed(1);
  const held = limit === undefined ? '' : `   at most ${limit}${value > limit ? ', OVER' : ''}`;
  return `${what.padEnd(46)} ${figure.padStart(9)} ${unit.padEnd(5)}${held}`;
}

const figures = [...(await measurePages()), ...(await measureStart())];
console.log(
  process.argv.includes('--json') ? JSON.stringify(figures, null, 2) : figures.map(line).join('\n'),
);
process.exit(0);
