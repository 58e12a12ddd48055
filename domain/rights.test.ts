import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { NotAllowed } from './errors.ts';
import { demand, grant, may, rights, type Grant, type Verb } from './rights.ts';
import type { Role, Viewer } from './viewer.ts';

// The table that people read; a row's verbs in the code.
const PAGE = readFileSync(new URL('../docs/rights.md', import.meta.url), 'utf8');
const ROWS: [RegExp, Verb[]][] = [
  [/^see open and closed cases$/, ['see cases']],
  [/^take in/, ['take in']],
  [/^add entry/, ['add entry', 'add photos and notes']],
  [/^seal, amend$/, ['seal', 'amend']],
  [/^change visibility/, ['change visibility']],
  [/^close a case, hand back$/, ['close', 'hand back']],
  [/^estimate, invoice/, ['see estimate', 'write estimate', 'refund']],
  [/^authorise an estimate$/, ['record authorisation', 'authorise']],
  [/^issue warranty$/, ['issue warranty']],
  [/^suspend, withdraw/, ['judge warranty']],
  [/^history link$/, ['history link']],
  [/^export archive/, ['export archive', 'owner archive']],
  [/^erase/, ['erase']],
  [/^people, settings/, ['run the shop']],
  [/^verify/, ['verify']],
];

// What a cell says about one of its row's verbs.
function meant(cell: string, verb: Verb): Grant {
  const only = (its: Verb, reach: Grant): Grant => (verb === its ? reach : 'no');
  switch (cell) {
    case '–':
      return 'no';
    case 'yes':
      return verb === 'owner archive' ? 'no' : 'yes';
    case 'own':
    case 'own, shared parts':
      return 'own';
    case "own and others'":
      return 'yes';
    case 'photos and notes':
      return only('add photos and notes', 'yes');
    case 'see':
      return verb === 'see estimate' ? 'yes' : only('write estimate', 'see');
    case 'see own':
      return verb === 'see estimate' ? 'own' : only('write estimate', 'see');
    case 'yes (refund: proprietor)':
      return verb === 'refund' ? 'no' : 'yes';
    case 'record in person':
      return only('record authorisation', 'yes');
    case 'by private link':
      return only('authorise', 'by link');
    case 'propose':
      return 'propose';
    case "owner's archive of own case":
      return only('owner archive', 'own');
    default:
      throw new Error(`a cell nobody understands: ${cell}`);
  }
}

const staff = (role: Role): Viewer => ({
  kind: 'staff',
  personId: 'p',
  role,
  name: 'P',
  number: 1,
  freshAt: new Date(0),
});
const VIEWERS: Viewer[] = [
  staff('proprietor'),
  staff('technician'),
  staff('desk'),
  { kind: 'customer', customerId: 'c', name: 'C' },
  { kind: 'public' },
];

const table = PAGE.split('\n')
  .filter((line) => line.startsWith('| ') && !/^\| (?:verb |-)/.test(line))
  .map((line) =>
    line
      .slice(1, -1)
      .split('|')
      .map((cell) => cell.trim()),
  );

describe('the table of rights', () => {
  it.each(table)('says in code what the page says: %s', (...cells) => {
    const [title = '', ...columns] = cells;
    const verbs = ROWS.find(([pattern]) => pattern.test(title))?.[1] ?? [];
    expect(verbs).not.toEqual([]);
    expect(columns).toHaveLength(VIEWERS.length);
    for (const verb of verbs) {
      const said = VIEWERS.map((_, column) => meant(columns[column] ?? '', verb));
      // "authorise" by the shop's own people is what "record authorisation" is for.
      const expected = verb === 'authorise' ? ['no', 'no', 'no', 'by link', 'no'] : said;
      expect(VIEWERS.map((viewer) => grant(viewer, verb))).toEqual(expected);
    }
  });

  it('has a row on the page for every verb', () => {
    expect(table).toHaveLength(ROWS.length);
    expect(new Set(ROWS.flatMap(([, verbs]) => verbs))).toEqual(new Set(Object.keys(rights)));
  });
});

describe('may', () => {
  const [proprietor, technician, desk, customer, everyone] = VIEWERS as [
    Viewer,
    Viewer,
    Viewer,
    Viewer,
    Viewer,
  ];

  it('lets "own" reach only what is one’s own', () => {
    expect(may(desk, 'seal')).toBe(false);
    expect(may(desk, 'seal', { own: false })).toBe(false);
    expect(may(desk, 'seal', { own: true })).toBe(true);
    expect(may(technician, 'seal', { own: false })).toBe(true);
    expect(may(everyone, 'see cases', { own: true })).toBe(false);
  });

  it('takes seeing, proposing and a private link for less than the verb', () => {
    expect(may(technician, 'write estimate', { own: true })).toBe(false);
    expect(may(desk, 'judge warranty', { own: true })).toBe(false);
    expect(may(customer, 'authorise', { own: true })).toBe(false);
  });

  it('is demanded with a sentence for people', () => {
    expect(() => demand(proprietor, 'erase')).not.toThrow();
    expect(() => demand(desk, 'erase')).toThrow(NotAllowed);
    expect(() => demand(desk, 'erase')).toThrow('Ask the shop owner.');
  });
});
