// @vitest-environment happy-dom
import { act } from 'react';
import { createRoot, type Root } from 'react-dom/client';
import { createRoutesStub, useLoaderData } from 'react-router';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { useChanges } from './use-changes.ts';

Object.assign(globalThis, { IS_REACT_ACT_ENVIRONMENT: true });

let root: Root;
let version: string;
let loads: number;
let asked: string[];
let visible: DocumentVisibilityState;
let answer: () => Response;

beforeEach(() => {
  vi.useFakeTimers();
  [version, loads, asked, visible] = ['1', 0, [], 'visible'];
  answer = () => Response.json({ version });
  vi.spyOn(globalThis, 'fetch').mockImplementation((path) => {
    asked.push(path as string);
    return Promise.resolve().then(answer);
  });
  vi.spyOn(document, 'visibilityState', 'get').mockImplementation(() => visible);
});
afterEach(async () => {
  await act(async () => root.unmount());
  vi.useRealTimers();
  vi.restoreAllMocks();
});

function Page({ knows }: { knows: boolean }) {
  const shown = useLoaderData<{ version: string }>().version;
  useChanges(knows ? { case: '2026-031', version: shown } : {});
  return <p>{shown}</p>;
}

async function open(knows: boolean): Promise<void> {
  const Stub = createRoutesStub([
    {
      path: '/',
      Component: () => <Page knows={knows} />,
      HydrateFallback: () => null,
      loader: () => {
        loads += 1;
        return { version };
      },
    },
  ]);
  root = createRoot(document.body.appendChild(document.createElement('div')));
  await act(async () => root.render(<Stub />));
  await pass(0);
}

const pass = (ms: number) => act(async () => void (await vi.advanceTimersByTimeAsync(ms)));

it('runs the page’s loaders again when the case has changed, once', async () => {
  await open(true);
  expect(loads).toBe(1);
  await pass(5_000);
  expect(asked).toEqual(['/api/changes?case=2026-031']);
  expect(loads).toBe(1);
  version = '2';
  await pass(5_000);
  expect(loads).toBe(2);
  expect(document.body.textContent).toContain('2');
  await pass(20_000);
  expect(loads).toBe(2);
});

it('misses nothing that changed between the page’s loader and the first question', async () => {
  await open(true);
  version = '2';
  await pass(5_000);
  expect(loads).toBe(2);
});

it('takes the first answer for what the page shows when its loader knows no version', async () => {
  await open(false);
  await pass(5_000);
  expect(asked).toEqual(['/api/changes']);
  expect(loads).toBe(1);
  version = '2';
  await pass(5_000);
  expect(loads).toBe(2);
});

it('asks nothing while nobody looks, and at once when somebody does', async () => {
  await open(true);
  visible = 'hidden';
  await pass(60_000);
  expect(asked).toEqual([]);
  version = '2';
  visible = 'visible';
  act(() => void document.dispatchEvent(new Event('visibilitychange')));
  await pass(0);
  expect(loads).toBe(2);
});

it.each([
  ['the network is gone', () => Promise.reject(new TypeError('failed')) as never],
  ['the server is in trouble', () => new Response('', { status: 503 })],
])('leaves the page as it is while %s', async (_, trouble) => {
  await open(true);
  answer = trouble;
  await pass(30_000);
  expect(loads).toBe(1);
  expect(document.body.textContent).toContain('1');
  answer = () => Response.json({ version: '2' });
  version = '2';
  await pass(5_000);
  expect(loads).toBe(2);
});

it('has the page’s loaders lead to the sign-in when the session has ended', async () => {
  await open(true);
  answer = () => Response.json({ code: 'signed-out' }, { status: 401 });
  await pass(5_000);
  expect(loads).toBe(2);
});
