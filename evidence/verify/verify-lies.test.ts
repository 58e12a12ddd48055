import { describe, expect, test } from 'vitest';
import type { Bundle, BundleEntry } from '#evidence/bundle/bundle-shape.ts';
import { writeBundle } from '#evidence/bundle/write-bundle.ts';
import { toHex } from '#evidence/bytes/hex.ts';
import type { FindingId } from '#evidence/verify/finding.ts';
import { verifyBundle } from '#evidence/verify/verify-bundle.ts';
import type { Outside } from '#evidence/verify/work.ts';
import { entryShown, stand, tellCase, warrant, warrantyBundle } from '#tests/evidence/told-case.ts';
import { CASE, idOf, secretOf, WitnessShop, type Sealed } from '#tests/evidence/witness-shop.ts';

const LOG_KEY = idOf(secretOf('log'));

function expectRefused(bundle: Bundle | object, id: FindingId, outside: Outside = {}) {
  const report = verifyBundle(JSON.stringify(bundle), { logKeyId: LOG_KEY, ...outside });
  expect(report.verdict).toBe('Does not match');
  expect(
    report.findings.filter((line) => line.outcome === 'failed').map((line) => line.id),
  ).toContain(id);
  expect(report.record).toBeNull();
}

function expectOpen(bundle: Bundle | object, id: FindingId, outside: Outside = {}) {
  const report = verifyBundle(JSON.stringify(bundle), { logKeyId: LOG_KEY, ...outside });
  expect(report.findings.filter((line) => line.outcome === 'failed')).toEqual([]);
  expect(report.findings).toContainEqual(
    expect.objectContaining({ id, outcome: 'not-checked', decides: true }),
  );
  expect(report.verdict).toBe('Not fully checked');
}

const verdictOf = (bundle: Bundle, outside: Outside = {}) =>
  verifyBundle(writeBundle(bundle), { logKeyId: LOG_KEY, ...outside }).verdict;
const told = tellCase();
const whole = () => structuredClone(told.shop.bundle(CASE));
const paper = () => structuredClone(warrantyBundle(told));
const entryAt = (bundle: Bundle, at: number) => bundle.entries[at] as BundleEntry;

describe('a sealed thing changed', () => {
  test('the text of a part', () => {
    const bundle = whole();
    entryAt(bundle, 3).parts.shown!.bytes = entryAt(bundle, 3).parts.shown!.bytes.replace(
      '0.4',
      '0.6',
    );
    expectRefused(bundle, 'parts');
  });

  test('the salt of a part', () => {
    const bundle = whole();
    entryAt(bundle, 3).parts.shown!.salt = '00'.repeat(32);
    expectRefused(bundle, 'parts');
  });

  test('a part under another name, and a part nobody sealed', () => {
    const bundle = whole();
    entryAt(bundle, 3).parts.owner = entryAt(bundle, 3).parts.shown!;
    expectRefused(bundle, 'parts');
    const other = whole();
    entryAt(other, 3).parts.money = entryAt(other, 3).parts.shown!;
    expectRefused(other, 'parts');
  });

  test('a header, though it stays canonical', () => {
    const bundle = whole();
    entryAt(bundle, 3).header = entryAt(bundle, 3).header.replace(
      '"2026-04-09T08:',
      '"2026-04-09T07:',
    );
    expectRefused(bundle, 'inclusion');
  });

  test('a header or part that is not canonical', () => {
    const bundle = whole();
    entryAt(bundle, 3).header = ` ${entryAt(bundle, 3).header}`;
    expectRefused(bundle, 'header');
  });

  test('a photo left out of the list, or a salt used twice', () => {
    const bundle = whole();
    entryAt(bundle, 3).photos.pop();
    expectRefused(bundle, 'photos');
    const twice = whole();
    entryAt(twice, 3).photos[0]!.published = entryAt(twice, 3).photos[0]!.original;
    expectRefused(twice, 'salts');
  });

  test('a proof, a checkpoint, or the list of keys', () => {
    const bundle = whole();
    const entry = entryAt(bundle, 4);
    entry.proof = entry.proof.replace('index 4', 'index 5');
    expectRefused(bundle, 'inclusion');
    const signed = whole();
    signed.entries.forEach((item) => {
      item.proof = item.proof.replace(/(— \S+ \S{20})\S/, (_, kept: string) => `${kept}/`);
    });
    expectRefused(signed, 'checkpoint');
    const keys = whole();
    keys.vkeys.push(told.shop.vkeyOf(secretOf('another')));
    expectRefused(keys, 'keys');
  });
});

describe('something left out', () => {
  test('an entry in the middle, the first, or one of the log itself', () => {
    for (const [at, id] of [
      [4, 'case-chain'],
      [3, 'case-chain'],
      [1, 'own-chain'],
      [0, 'own-chain'],
    ] as const) {
      const bundle = whole();
      bundle.entries.splice(at, 1);
      expectRefused(bundle, id);
    }
  });

  test('the last entries: a signed standing under the same head denies it', () => {
    const bundle = paper();
    bundle.entries.pop();
    expectRefused(bundle, 'warranty');
    const { shop, warranty } = told;
    const cut = {
      ...shop.bundle(CASE),
      standing: stand(shop, warranty),
      credential: told.credential,
    };
    expect(verdictOf(cut)).toBe('Intact');
    const later = tellCase();
    later.shop.append('claim', CASE, {
      names: [later.warranty],
      parts: { shown: { v: 1, text: 'Lifted again.' } },
    });
    const hidden = warrantyBundle(later);
    hidden.entries.pop();
    expectRefused(hidden, 'standing');
  });

  test('the last entries, with no standing: found by their slots', () => {
    const bundle = whole();
    bundle.entries.pop();
    expect(verdictOf(bundle)).toBe('Intact');
    expectOpen(bundle, 'later-entries', { publicEntries: told.shop.publicEntries() });
  });

  test("a revocation: the log's own chain is shorter than the standing names", () => {
    const later = tellCase();
    const add = later.shop.chainOf(new Uint8Array(16))[2]!;
    later.shop.endKey('revoke', 'credential', later.shop.credentialSecret, [add]);
    const bundle = warrantyBundle(later);
    bundle.entries.splice(3, 1);
    expectRefused(bundle, 'standing');
  });

  test('what came before a record that begins at no close', () => {
    expectRefused(told.shop.bundle(CASE, 1), 'case-chain');
  });

  test('everything but the log itself', () => {
    const bundle = whole();
    bundle.entries.splice(3);
    expectRefused(bundle, 'case-chain');
  });
});

describe('two stories', () => {
  test('a slot taken twice', () => {
    const liar = tellCase();
    const first = liar.shop.log.find(({ header }) => header.case === toHex(CASE))!;
    const kept = liar.shop.bundle(CASE);
    // A second entry for seq 0 of the same case, appended without the chain noticing.
    const chainOf = liar.shop.chainOf.bind(liar.shop);
    liar.shop.chainOf = () => [];
    liar.shop.append('entry', CASE, { parts: { shown: entryShown({ text: 'Another story.' }) } });
    liar.shop.chainOf = chainOf;
    const honest = liar.shop.log
      .slice(0, -1)
      .filter(({ header }) => header.case === first.header.case);
    const [note, size] = [liar.shop.checkpoint(), liar.shop.log.length];
    const bundle = {
      ...kept,
      entries: [...liar.shop.log.filter(({ header }) => /^0+$/.test(header.case)), ...honest].map(
        (sealed) => liar.shop.item(sealed, note, size),
      ),
    };
    expect(verdictOf(bundle)).toBe('Intact');
    expectRefused(bundle, 'later-entries', { publicEntries: liar.shop.publicEntries() });
  });

  test('public entries that are not those of the head', () => {
    const entries = told.shop.publicEntries();
    entries[40]! ^= 1;
    expectRefused(paper(), 'later-entries', { publicEntries: entries });
  });

  test('two heads of one size', () => {
    const shop = new WitnessShop('another day');
    const bundle = whole();
    for (let n = shop.log.length; n < told.shop.log.length; n += 1) {
      shop.append('entry', new Uint8Array(16).fill(7), { parts: { shown: entryShown({}) } });
    }
    bundle.stamps = [{ checkpoint: shop.checkpoint(), reply: 'AAAA' }];
    expectRefused(bundle, 'checkpoint');
  });

  test('entries of two cases in one record', () => {
    const bundle = whole();
    const other = told.shop.bundle(new Uint8Array(16).fill(9));
    bundle.entries.push(other.entries.at(-1)!);
    expectRefused(bundle, 'case-chain');
  });
});

describe('rules of kinds', () => {
  const broken = (tell: (shop: WitnessShop, sealed: ReturnType<typeof tellCase>) => unknown) => {
    const sealed = tellCase();
    tell(sealed.shop, sealed);
    return sealed.shop.bundle(CASE);
  };
  const text = { parts: { shown: { v: 1, text: '' } } };

  test.each([
    [
      'an amendment of an amendment',
      (s: WitnessShop, t: { amended: Sealed }) =>
        s.append('amendment', CASE, { names: [t.amended], parts: { shown: entryShown({}) } }),
    ],
    [
      'an amendment of nothing',
      (s: WitnessShop) => s.append('amendment', CASE, { parts: { shown: entryShown({}) } }),
    ],
    [
      'an entry that names one',
      (s: WitnessShop, t: { takenIn: Sealed }) =>
        s.append('entry', CASE, { names: [t.takenIn], ...text }),
    ],
    [
      'a close that lists too few',
      (s: WitnessShop, t: { takenIn: Sealed }) =>
        s.append('close', CASE, {
          names: [t.takenIn],
          parts: { shown: { v: 1, text: '', entries: 1, photos: 2 } },
        }),
    ],
    [
      'a close that counts wrongly',
      (s: WitnessShop) =>
        s.append('close', CASE, {
          names: s.chainOf(CASE),
          parts: { shown: { v: 1, text: '', entries: 6, photos: 3 } },
        }),
    ],
    [
      'a hand-back without a close before it',
      (s: WitnessShop, t: { closed: Sealed }) =>
        s.append('handed-back', CASE, { names: [t.closed], ...text }),
    ],
    [
      'a claim on something else',
      (s: WitnessShop, t: { closed: Sealed }) =>
        s.append('claim', CASE, { names: [t.closed], ...text }),
    ],
    [
      'a replacement of one warranty only',
      (s: WitnessShop, t: { warranty: Sealed }) =>
        s.append('standing', CASE, {
          names: [t.warranty],
          parts: { shown: { v: 1, act: 'replace', reason: null } },
        }),
    ],
    [
      'an erasure of nothing',
      (s: WitnessShop) =>
        s.append('erased', CASE, {
          parts: { shown: { v: 1, parts: ['owner'], photos: [], reason: null } },
        }),
    ],
    [
      'names out of order',
      (s: WitnessShop, t: { takenIn: Sealed; bench: Sealed }) =>
        s.append('visibility', CASE, {
          names: [t.bench, t.takenIn],
          parts: { shown: { v: 1, to: 'bench', n: null } },
        }),
    ],
  ] as [string, (shop: WitnessShop, sealed: ReturnType<typeof tellCase>) => unknown][])(
    '%s',
    (_, tell) => {
      expectRefused(broken(tell), 'names');
    },
  );

  test('a name from another case', () => {
    const bundle = broken((shop) => {
      const other = shop.log.find(({ header }) => header.case === '09'.repeat(16))!;
      shop.append('amendment', CASE, { names: [other], parts: { shown: entryShown({}) } });
    });
    expectRefused(bundle, 'names');
  });

  test('photos: a number used twice, words about a bench photo, a copy of nothing', () => {
    const again = broken((shop, { takenIn }) =>
      shop.append('amendment', CASE, { names: [takenIn], photos: [{ n: 4 }] }),
    );
    expectRefused(again, 'photos');
    const words = [{ n: 9, caption: '', taken: null, pins: [] }];
    const photos = [{ n: 9, visibility: 'bench' as const }];
    const told9 = broken((shop) =>
      shop.append('entry', CASE, { photos, parts: { shown: entryShown({ photos: words }) } }),
    );
    expectRefused(told9, 'photos');
    const copy = broken((shop) =>
      shop.append('entry', CASE, {
        photos,
        parts: { shown: entryShown({ copies: [{ n: 9, of: 1 }] }) },
      }),
    );
    expectRefused(copy, 'photos');
  });

  test('time that goes back, unless a clock entry says so', () => {
    const back = broken((shop) => shop.append('entry', CASE, { ...text, minutes: -30 }));
    expectRefused(back, 'order');
    const said = broken((shop) => {
      const [old, set] = [shop.time, shop.time - 30 * 60_000].map((time) =>
        new Date(time).toISOString(),
      );
      const shown = { v: 1, old, new: set, reason: 'The clock ran half an hour fast.' };
      shop.append('clock', new Uint8Array(16), { parts: { shown }, minutes: -30 });
      shop.append('entry', CASE, text);
    });
    expect(verdictOf(said)).toBe('Intact');
  });
});

describe('the warranty', () => {
  test('a credential that is another than the log holds', () => {
    const bundle = paper();
    bundle.credential = warrant(tellCase().shop, told.closed, { name: 'x' }).credential;
    expectRefused(bundle, 'warranty');
  });

  test('a member nobody knows keeps it from being fully checked, a refused one does not match', () => {
    const unknown = tellCase();
    const sealed = { ...unknown, ...warrant(unknown.shop, unknown.closed, { evidence: [] }) };
    expectOpen(warrantyBundle(sealed), 'unknown-member');
    const refused = tellCase();
    const dated = { ...refused, ...warrant(refused.shop, refused.closed, { exp: 1 }) };
    expectRefused(warrantyBundle(dated), 'warranty');
  });

  test.each([
    ['withdrawn', ['withdraw']],
    ['withdrawn', ['withdraw', 'resume']],
    ['suspended', ['suspend']],
    ['in force', ['suspend', 'resume', 'transfer']],
  ] as const)('%s after %s', (word, acts) => {
    const sealed = tellCase();
    for (const act of acts) {
      const shown = { v: 1, act, reason: null };
      sealed.shop.append('standing', CASE, { names: [sealed.warranty], parts: { shown } });
    }
    const bundle = warrantyBundle(sealed);
    const honest = { ...bundle, standing: stand(sealed.shop, sealed.warranty, { standing: word }) };
    const report = verifyBundle(JSON.stringify(honest), { logKeyId: LOG_KEY });
    expect([report.verdict, report.standing.word]).toEqual(['Intact', word]);
    const other = word === 'in force' ? 'suspended' : 'in force';
    expectRefused(
      { ...bundle, standing: stand(sealed.shop, sealed.warranty, { standing: other }) },
      'standing',
    );
  });

  test('past its term it reads ended, whatever the shop would like', () => {
    const [ended, late] = ['ended' as const, '2028-05-02T00:00:00.000Z'];
    const { shop, warranty } = told;
    const bundle = { ...paper(), standing: stand(shop, warranty, { standing: ended, at: late }) };
    expect(verifyBundle(JSON.stringify(bundle)).standing.word).toBe('ended');
    expectRefused({ ...bundle, standing: stand(shop, warranty, { at: late }) }, 'standing');
  });

  test('an act that is kept back leaves the standing open', () => {
    const sealed = tellCase();
    const parts = { shown: { v: 1, act: 'withdraw', reason: null } };
    sealed.shop.append('standing', CASE, { names: [sealed.warranty], parts });
    const bundle = warrantyBundle(sealed);
    entryAt(bundle, bundle.entries.length - 1).parts = {};
    expectOpen(bundle, 'standing');
  });

  test('a standing older than the head says nothing, about another warranty it does not match', () => {
    const sealed = tellCase();
    const older = stand(sealed.shop, sealed.warranty);
    sealed.shop.append('entry', new Uint8Array(16).fill(9), { parts: { shown: entryShown({}) } });
    const bundle = { ...warrantyBundle(sealed), standing: older };
    expect(verifyBundle(JSON.stringify(bundle)).standing.word).toBe('not stated here');
    expect(verdictOf(bundle)).toBe('Intact');
    const seal = '11'.repeat(32);
    expectRefused(
      { ...bundle, standing: stand(sealed.shop, sealed.warranty, { seal }) },
      'standing',
    );
  });

  test('a standing that denies a later entry', () => {
    const sealed = tellCase();
    const { seq, C } = { seq: 4, C: toHex(sealed.handedBack.commitment) };
    const standing = stand(sealed.shop, sealed.warranty, { seq, C });
    expectRefused({ ...warrantyBundle(sealed), standing }, 'standing');
  });

  test('the paper: another seal value, another code', () => {
    expectRefused(paper(), 'paper-seal', { seal16: new Uint8Array(16) });
    expectRefused(paper(), 'code', { code: '11111111116' });
  });
});

describe('what is not known is never Intact', () => {
  test('no key from outside; a key from outside that is not of the record', () => {
    expectOpen(whole(), 'whose-key', { logKeyId: undefined });
    expectRefused(whole(), 'whose-key', { logKeyId: idOf(secretOf('another')) });
    // The credential key is a key of this log, and still no log key.
    expectRefused(whole(), 'whose-key', { logKeyId: idOf(secretOf('credential')) });
  });

  test('members the bundle form does not name, at every depth', () => {
    expectOpen({ ...whole(), extra: 1 }, 'unknown-member');
    const bundle = whole();
    Object.assign(entryAt(bundle, 3).photos[0]!, { perceptual: '00' });
    expectOpen(bundle, 'unknown-member');
  });

  test('time-stamps, which are not read here', () => {
    const stamped = tellCase();
    const size = stamped.shop.log.length - 1;
    stamped.shop.append('claim', CASE, {
      names: [stamped.warranty],
      parts: { shown: { v: 1, text: '' } },
    });
    const bundle = {
      ...stamped.shop.bundle(CASE),
      stamps: [{ checkpoint: stamped.shop.checkpoint(size), reply: 'AAAA' }],
      consistency: [stamped.shop.growth(size)],
    };
    expectOpen(bundle, 'stamps');
    expectOpen({ ...bundle, consistency: [] }, 'growth');
    const damaged = stamped.shop.growth(size).replace(/\n./, '\nA');
    expectRefused({ ...bundle, consistency: [damaged] }, 'growth');
  });

  test('an entry whose after names a stamp that is not there', () => {
    const stamped = tellCase();
    const after = { size: 5, root: toHex(stamped.shop.root(5)), stamp: '11'.repeat(32) };
    stamped.shop.append('claim', CASE, {
      names: [stamped.warranty],
      parts: { shown: { v: 1, text: '' } },
      after,
    });
    const bundle = stamped.shop.bundle(CASE);
    expectOpen({ ...bundle, consistency: [stamped.shop.growth(5)] }, 'stamps');
    expectOpen(bundle, 'growth');
  });

  test('lost contents, where a lost entry says so; without one it does not match', () => {
    const sealed = tellCase();
    const bundle = sealed.shop.bundle(CASE);
    bundle.entries[4] = sealed.shop.lost(sealed.bench);
    expectRefused(bundle, 'lost');
    const { index: from } = sealed.bench;
    const shown = { v: 1, from, to: from, reason: 'A disk failed.' };
    sealed.shop.append('lost', new Uint8Array(16), { parts: { shown } });
    const said = sealed.shop.bundle(CASE);
    said.entries[5] = sealed.shop.lost(sealed.bench);
    expectOpen(said, 'lost');
    said.entries[5] = sealed.shop.lost(sealed.amended);
    expectRefused(said, 'inclusion');
  });

  test('a warranty record without its credential', () => {
    expectOpen({ ...paper(), credential: null, standing: null }, 'warranty');
  });

  test('a file that is no record, a newer form, a damaged file', () => {
    expect(verifyBundle('{}').verdict).toBe('Not known');
    expect(verifyBundle('a shopping list').verdict).toBe('Not known');
    const newer = JSON.stringify({ ...whole(), format: 'witnessmark-bundle/2' });
    expect(verifyBundle(newer).verdict).toBe('Not fully checked');
    const text = JSON.stringify(whole());
    expect(verifyBundle(text.slice(0, -9)).verdict).toBe('Does not match');
    expect(verifyBundle(text.replace('{', '{"origin":"x",')).verdict).toBe('Does not match');
  });
});
