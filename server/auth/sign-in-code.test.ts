import { v7 } from 'uuid';
import { beforeEach, describe, expect, it } from 'vitest';
import { Invalid, TooMany } from '#domain/errors.ts';
import { useDatabase } from '#tests/setup/database.ts';
import { database } from '../db/connection.ts';
import { run, select } from '../db/sql.ts';
import { askForCode, CODE_MS } from './ask-for-code.ts';
import { checkCode, MOST_TRIES } from './check-code.ts';

useDatabase();

const AT = new Date('2026-04-16T09:40:00.000Z');
const EMAIL = 'marguerite@osei.example';
const ip = '192.0.2.7';
let customer: string;

beforeEach(async () => {
  for (const table of ['outbox', 'sign_in_codes', 'rate_counts']) await run(`DELETE FROM ${table}`);
  await run('DELETE FROM customers');
  customer = v7();
  await run('INSERT INTO customers (id, name, email, created_at) VALUES (?, ?, ?, ?)', [
    customer,
    'Marguerite Osei',
    EMAIL,
    AT,
  ]);
});

interface Mail {
  to: string | null;
  data: { code: string };
  notAfter: string;
}

async function mails(): Promise<Mail[]> {
  const rows = await select<{ payload: string }>('SELECT payload FROM outbox ORDER BY id');
  return rows.map(({ payload }) => JSON.parse(payload) as Mail);
}

async function ask(email = EMAIL) {
  const { token } = await askForCode({ email, ip }, { now: AT });
  const code = (await mails()).at(-1)?.data.code ?? '';
  return { token, code, ip };
}

const otherThan = (code: string) => String((Number(code) + 1) % 1_000_000).padStart(6, '0');
const refusal = (work: Promise<unknown>): Promise<Invalid> =>
  work.then(
    () => {
      throw new Error('it was let through');
    },
    (error: unknown) => error as Invalid,
  );

describe('a sign-in code', () => {
  it('is six digits, mailed to the address that is known', async () => {
    const { code } = await ask();
    expect(code).toMatch(/^\d{6}$/);
    expect(await mails()).toMatchObject([{ to: EMAIL, template: 'sign-in-code' }]);
  });

  it('lets its customer in once', async () => {
    const asked = await ask();
    expect(await checkCode(asked, { now: AT })).toBe(customer);
    const { code, sentence } = await refusal(checkCode(asked, { now: AT }));
    expect({ code, sentence }).toEqual({
      code: 'code-over',
      sentence: 'This code has run out. Send a new one.',
    });
  });

  it('may be typed with blanks, as the mail programs copy it', async () => {
    const { code, ...rest } = await ask();
    const typed = ` ${code.slice(0, 3)} ${code.slice(3)}`;
    expect(await checkCode({ ...rest, code: typed }, { now: AT })).toBe(customer);
  });

  it('works for ten minutes and no longer', async () => {
    const asked = await ask();
    const over = new Date(AT.getTime() + CODE_MS);
    expect((await refusal(checkCode(asked, { now: over }))).code).toBe('code-over');
    const last = new Date(over.getTime() - 1);
    expect(await checkCode(asked, { now: last })).toBe(customer);
  });

  it('works only in the browser that asked', async () => {
    const mine = await ask();
    const theirs = await askForCode({ email: 'somebody@else.example', ip }, { now: AT });
    const tried = checkCode({ ...mine, token: theirs.token }, { now: AT });
    expect(await refusal(tried)).toBeInstanceOf(Invalid);
    expect((await refusal(checkCode({ ...mine, token: '' }, { now: AT }))).code).toBe('code-over');
    expect(await checkCode(mine, { now: AT })).toBe(customer);
  });

  it('is over after five wrong tries, even for the right digits', async () => {
    const asked = await ask();
    const wrong = { ...asked, code: otherThan(asked.code) };
    for (let tries = 1; tries < MOST_TRIES; tries += 1) {
      expect((await refusal(checkCode(wrong, { now: AT }))).code).toBe('invalid');
    }
    expect((await refusal(checkCode(wrong, { now: AT }))).code).toBe('code-over');
    expect((await refusal(checkCode(asked, { now: AT }))).sentence).toBe(
      'This code was typed wrong five times and works no more. Send a new one.',
    );
  });

  it('counts tries that come at the same time one by one', async () => {
    const asked = await ask();
    const wrong = { ...asked, code: otherThan(asked.code) };
    const tries = Array.from({ length: 12 }, () => refusal(checkCode(wrong, { now: AT })));
    const codes = (await Promise.all(tries)).map(({ code }) => code);
    expect(codes.filter((code) => code === 'invalid')).toHaveLength(MOST_TRIES - 1);
    const [row] = await select<{ tries: number }>('SELECT tries FROM sign_in_codes');
    expect(row?.tries).toBe(MOST_TRIES);
  });

  it('lets one in when it is used twice at the same time', async () => {
    const asked = await ask();
    const both = await Promise.allSettled([
      checkCode(asked, { now: AT }),
      checkCode(asked, { now: AT }),
    ]);
    expect(both.filter(({ status }) => status === 'fulfilled')).toHaveLength(1);
  });

  it('does not take a try for what is no code', async () => {
    const asked = await ask();
    for (const code of ['', '12345', '1234567', 'abcdef', '１２３４５６']) {
      expect((await refusal(checkCode({ ...asked, code }, { now: AT }))).fields.code).toContain(
        'six digits',
      );
    }
    const [row] = await select<{ tries: number }>('SELECT tries FROM sign_in_codes');
    expect(row?.tries).toBe(0);
  });

  it('stands in no table in the clear once its mail has gone', async () => {
    const { code } = await ask();
    const [row] = await select<{ code_hmac: Buffer }>('SELECT code_hmac FROM sign_in_codes');
    expect(row?.code_hmac).toHaveLength(32);
    expect(row?.code_hmac.toString('latin1')).not.toContain(code);
  });
});

describe('an address nobody knows', () => {
  async function statementsOf(work: () => Promise<unknown>): Promise<string[]> {
    const seen: string[] = [];
    const { options } = database() as unknown as { options: { logging: unknown } };
    options.logging = (sql: string) => seen.push(sql.replace(/\([0-9a-f-]{36}\)|default/g, ''));
    await work().finally(() => {
      options.logging = false;
    });
    return seen;
  }

  it('gets the same answer and costs the same statements', async () => {
    await ask('warm-up@else.example');
    let known: unknown;
    let unknown: unknown;
    const forKnown = await statementsOf(async () => {
      known = await askForCode({ email: EMAIL, ip }, { now: AT });
    });
    const forUnknown = await statementsOf(async () => {
      unknown = await askForCode({ email: 'nobody@else.example', ip }, { now: AT });
    });
    expect(forKnown.length).toBeGreaterThan(4);
    expect(forUnknown).toEqual(forKnown);
    expect(Object.keys(unknown as object)).toEqual(Object.keys(known as object));
  });

  it('gets no mail, and no code lets it in', async () => {
    const asked = await ask('nobody@else.example');
    expect((await mails()).map(({ to }) => to)).toEqual([null]);
    const { fields } = await refusal(checkCode(asked, { now: AT }));
    expect(fields.code).toBe('This code is not right. Check the digits in the newest mail.');
  });

  it('is not one that the database takes for another', async () => {
    await run('UPDATE customers SET email = ?', ['márguerite@osei.example']);
    await ask();
    await run('UPDATE customers SET email = ?', ['Marguerite@Osei.example']);
    await ask();
    expect((await mails()).map(({ to }) => to)).toEqual([null, 'Marguerite@Osei.example']);
  });

  it('is not an erased customer’s', async () => {
    await run('UPDATE customers SET erased_at = ?', [AT]);
    await ask();
    expect((await mails()).map(({ to }) => to)).toEqual([null]);
  });
});

describe('asking', () => {
  it.each([
    'ok@b.test\r\nBcc: evil@b.test',
    'ok@b.test\nBcc: evil@b.test',
    'ok@b.test, evil@b.test',
    'ok@b.test;evil@b.test',
    '"a b"@b.test <evil@b.test>',
    'no-address',
    '',
  ])('refuses %j in words, before anything is written', async (email) => {
    const { fields } = await refusal(askForCode({ email, ip }, { now: AT }));
    expect(fields.email).toContain('This is not an e-mail address.');
    expect(await select('SELECT id FROM sign_in_codes')).toEqual([]);
    expect(await mails()).toEqual([]);
  });

  it('is refused the sixth time in a quarter of an hour, whoever’s address it is', async () => {
    for (const email of [EMAIL, 'nobody@else.example']) {
      for (let time = 0; time < 5; time += 1) await ask(email);
      const problem = await refusal(askForCode({ email, ip }, { now: AT }));
      expect(problem).toBeInstanceOf(TooMany);
      expect(problem.sentence).toBe(
        'Too many codes were asked for. Wait 15 minutes and try again.',
      );
    }
  });

  it('is refused from one place that asks for many addresses', async () => {
    const from = { ip: '192.0.2.99' };
    const answers = [];
    for (let n = 0; n < 31; n += 1) {
      const email = `someone${n}@else.example`;
      answers.push(
        await askForCode({ email, ...from }, { now: AT }).catch((error: unknown) => error),
      );
    }
    expect(answers.filter((answer) => answer instanceof TooMany)).toHaveLength(1);
    expect(answers.at(-1)).toBeInstanceOf(TooMany);
  });

  it('leaves no address in the counts', async () => {
    await ask();
    const rows = await select<{ id_hash: Buffer }>('SELECT id_hash FROM rate_counts');
    expect(rows).toHaveLength(2);
    for (const { id_hash: id } of rows) expect(id.toString('latin1')).not.toContain('osei');
  });
});
