import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { complaintsAbout } from './setup/import-rules.ts';
import { readSource, sourceFiles } from './setup/source-files.ts';

const files = sourceFiles();
const longest = 400;

describe('imports', () => {
  it('go only the allowed way', () => {
    expect(files.length).toBeGreaterThan(50);
    expect(files.flatMap(complaintsAbout)).toEqual([]);
  });

  // The rules themselves, on files that break them.
  it.each([
    ['domain/rest.ts', "import { readFileSync } from 'node:fs';"],
    ['domain/rest.ts', "import { env } from '#server/env.ts';"],
    ['domain/rest.ts', "import { useState } from 'react';"],
    ['domain/rest.ts', "import type { Leaf } from '#evidence/leaf.ts';"],
    ['evidence/leaf.ts', "import { createHash } from 'node:crypto';"],
    ['evidence/leaf.ts', "export { env } from '#server/env.ts';"],
    ['server/cases/open-case.ts', "import { Tag } from '#app/ui/tag.tsx';"],
    ['server/cases/open-case.ts', "const mail = await import('#local/mail.ts');"],
    ['server/cases/open-case.ts', "import { Op } from 'sequelize';"],
    ['server/cases/open-case.ts', "import { owners } from '../../seeds/demo-owners.ts';"],
    ['app/ui/tag.tsx', "import { env } from '#server/env.ts';"],
    ['app/ui/tag.tsx', "import { loader } from '#app/routes/bench/rack.tsx';"],
    ['app/lib/queue.ts', "import { mkdir } from 'node:fs/promises';"],
    ['app/routes/bench/rack.tsx', "import { Now } from '#app/routes/portal/now.tsx';"],
    ['app/routes/bench/rack.tsx', "import { Now } from '../portal/now.tsx';"],
    ['app/routes/bench/rack.tsx', "import { database } from '#server/db/connection.ts';"],
    ['app/routes/bench/rack.tsx', "import { startMail } from '#local/mail.ts';"],
    ['local/run.ts', "import { useDatabase } from '#tests/setup/database.ts';"],
    ['local/run.ts', "import { Tag } from '#app/ui/tag.tsx';"],
    ['server/env.ts', "import { log } from './log';"],
  ])('a wrong import in %s is seen: %s', (path, text) => {
    expect(complaintsAbout(readSource(path, text))).toHaveLength(1);
  });

  it.each([
    ['domain/rest.ts', "import { z } from 'zod';"],
    ['evidence/leaf.ts', "import { sha256 } from '@noble/hashes/sha2.js';"],
    ['server/db/sql.ts', "import { QueryTypes } from 'sequelize';"],
    ['app/routes/bench/rack.tsx', "import type { Route } from './+types/rack';"],
    ['app/routes/bench/rack.tsx', "import { listCases } from '#server/cases/list-cases.ts';"],
    ['app/ui/tag.tsx', "import { caseState } from '#domain/case-state.ts';"],
    ['tests/access.test.ts', "import { startMail } from '#local/mail.ts';"],
  ])('a right import in %s is let through: %s', (path, text) => {
    expect(complaintsAbout(readSource(path, text))).toEqual([]);
  });
});

it('the portal changes nothing: no route in it exports an action', () => {
  const portal = files.filter(({ path }) => path.startsWith('app/routes/portal/'));
  expect(portal.length).toBeGreaterThan(0);
  const exportsAction =
    /export\s+(?:async\s+)?(?:function|const|let|var)\s+(?:clientAction|action)\b|export\s*\{[^}]*\b(?:clientAction|action)\b/;
  expect(portal.filter(({ text }) => exportsAction.test(text)).map(({ path }) => path)).toEqual([]);
  expect('export async function action() {}').toMatch(exportsAction);
  expect("export { save as action } from './save.ts'").toMatch(exportsAction);
});

it(`no file has more than ${longest} lines`, () => {
  const long = files.filter(({ text }) => text.split('\n').length - 1 > longest);
  expect(long.map(({ path }) => path)).toEqual([]);
});

it('what the browser is sent holds nothing of the server', () => {
  // Words that stand in server code alone; the server's own bundle shows that they survive a build.
  const marks = ['DATABASE_URL', 'SESSION_SECRET', 'S3_SECRET_ACCESS_KEY', 'CODE_PEPPER'];
  const bundle = (folder: string) =>
    readdirSync(folder, { recursive: true, encoding: 'utf8' })
      .filter((name) => /\.m?js$/.test(name))
      .map((name) => ({ name, text: readFileSync(join(folder, name), 'utf8') }));
  if (!existsSync('build/client'))
    throw new Error('There is no build to look into. Run: npx react-router build');
  const server = bundle('build/server');
  expect(marks.filter((mark) => !server.some(({ text }) => text.includes(mark)))).toEqual([]);
  const client = bundle('build/client');
  expect(client.length).toBeGreaterThan(0);
  const leaks = client.flatMap(({ name, text }) =>
    [...marks, 'sequelize'].filter((mark) => text.includes(mark)).map((mark) => `${name}: ${mark}`),
  );
  expect(leaks).toEqual([]);
});
