import type { SourceFile } from './source-files.ts';

/** What files of one place may import; everything else is a complaint. */
interface Rule {
  place: RegExp;
  /** Folders of the project. */
  folders: RegExp;
  /** Packages; every package when left out. */
  packages?: RegExp;
}

// Packages that run in the browser and in Node alike and touch neither network nor machine.
const pure = /^(?:zod|canonicalize|currency-codes|jose|temporal-polyfill|thumbhash|@noble\/)/;
const inBrowser = /^(?!node:|sequelize|mariadb|@aws-sdk|nodemailer|pino|express)/;

// The first rule that fits a file is the one for it.
const rules: Rule[] = [
  { place: /\.test\.tsx?$|^tests\//, folders: /./ },
  { place: /^domain\//, folders: /^domain\//, packages: pure },
  { place: /^evidence\//, folders: /^(?:evidence|domain)\//, packages: pure },
  { place: /^server\//, folders: /^(?:server|domain|evidence)\// },
  {
    place: /^app\/(?:ui|lib)\//,
    folders: /^(?:app\/(?:ui|lib|fonts)|domain|evidence)\//,
    packages: inBrowser,
  },
  { place: /^app\//, folders: /^(?:app|server|domain|evidence)\// },
  { place: /^local\//, folders: /^(?:local|scripts|server|seeds)\// },
  { place: /^scripts\//, folders: /^(?:scripts|server|seeds|local|domain|evidence)\// },
  { place: /^seeds\//, folders: /^(?:seeds|server|domain|evidence|local)\// },
];

const zone = (path: string) => /^app\/routes\/([^/]+)\//.exec(path)?.[1];
const isTest = (path: string) => /\.test\.tsx?$|^tests\//.test(path);

/** The reasons why imports of this file are not allowed, one sentence each; none when all are. */
export function complaintsAbout({ path, imports }: SourceFile): string[] {
  return imports
    .map(({ written, target }) => {
      const reason = objection(path, written, target);
      return reason && `${path} imports ${written}: ${reason}`;
    })
    .filter((complaint) => complaint !== undefined);
}

function objection(path: string, written: string, target: string): string | undefined {
  // Types that the framework makes for a route have no extension and no file here.
  if (/^\.\/\+types\//.test(written)) return undefined;
  const rule = rules.find(({ place }) => place.test(path));
  if (!rule) return 'there is no rule for this folder';
  if (written.startsWith('#') || written.startsWith('.')) {
    if (!/\.(?:tsx?|mjs|js|css|json|svg|woff2|webp)(?:\?[\w-]+)?$/.test(written))
      return 'the extension is missing';
    if (target.startsWith('tests/') && !isTest(path)) return 'only tests import from tests';
    if (!rule.folders.test(target)) return 'this folder must not import from there';
    if (isTest(path)) return undefined;
    return betweenRoutes(path, target);
  }
  if (written === 'sequelize' && !path.startsWith('server/db/') && !isTest(path))
    return 'only server/db names Sequelize';
  return rule.packages && !rule.packages.test(written) ? 'this package is not for here' : undefined;
}

function betweenRoutes(path: string, target: string): string | undefined {
  const [from, to] = [zone(path), zone(target)];
  if (from && to && from !== to) return 'one zone of routes does not import from another';
  if (from && target.startsWith('server/db/')) return 'routes go through operations';
  if (/^app\/(?!routes)/.test(path) && to && !path.endsWith('app/routes.ts'))
    return 'only routes import from routes';
  return undefined;
}
