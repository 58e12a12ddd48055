import { createServer, type IncomingMessage, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { text } from 'node:stream/consumers';
import { Window } from 'happy-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { sendPhoto } from './send-photo.ts';

interface Asked {
  method: string | undefined;
  url: string | undefined;
  headers: IncomingMessage['headers'];
  body: string;
}

let server: Server;
let window: Window;
let asked: Asked[];
let answer: { status: number; body: string };

beforeEach(async () => {
  asked = [];
  server = createServer((request, response) => {
    void text(request).then((body) => {
      const { method, url, headers } = request;
      asked.push({ method, url, headers, body });
      response.writeHead(answer.status, { 'content-type': 'application/json' }).end(answer.body);
    });
  });
  await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
  const { port } = server.address() as AddressInfo;
  window = new Window({ url: `http://127.0.0.1:${port}/bench` });
  vi.stubGlobal('XMLHttpRequest', window.XMLHttpRequest);
});

afterEach(async () => {
  vi.unstubAllGlobals();
  await window.happyDOM.close();
  server.closeAllConnections();
  server.close();
});

const send = () =>
  sendPhoto({
    photo: {
      id: '019b0000-0000-7000-8000-000000000002',
      caseNumber: '2026-031',
      entryId: '019b0000-0000-7000-8000-000000000001',
      file: new window.Blob(['photo']) as unknown as Blob,
      name: 'Brücke 1.jpg',
    },
    sha256: 'ab'.repeat(32),
    mediaType: 'image/jpeg',
    onProgress: () => undefined,
  });

describe('sending a photo', () => {
  it('is one PUT by its id, with hash, type and name', async () => {
    answer = { status: 201, body: '{"photo":{"id":"x","number":13,"sha256":"ab"},"linked":true}' };
    expect(await send()).toEqual({ kind: 'up', id: 'x', number: 13 });
    expect(asked).toMatchObject([
      {
        method: 'PUT',
        url: '/api/cases/2026-031/photos/019b0000-0000-7000-8000-000000000002?entry=019b0000-0000-7000-8000-000000000001',
        headers: {
          'content-type': 'image/jpeg',
          'x-content-sha256': 'ab'.repeat(32),
          'x-file-name': 'Br%C3%BCcke%201.jpg',
        },
        body: 'photo',
      },
    ]);
  });

  it.each([
    [400, 'invalid', 'refused'],
    [403, 'not-allowed', 'refused'],
    [409, 'conflict', 'refused'],
    [413, 'too-large', 'refused'],
    [415, 'unsupported', 'refused'],
    [400, 'arrived-damaged', 'busy'],
    [401, 'signed-out', 'stopped'],
    [429, 'too-many', 'busy'],
    [503, 'store-unavailable', 'busy'],
  ])('%i %s is %s', async (status, code, kind) => {
    answer = { status, body: JSON.stringify({ code, sentence: 'What is wrong. What to do.' }) };
    expect(await send()).toEqual({ kind, sentence: 'What is wrong. What to do.' });
  });

  it('an answer of something on the way is no refusal', async () => {
    answer = { status: 413, body: '<html>Request Entity Too Large</html>' };
    expect(await send()).toMatchObject({ kind: 'busy' });
    answer = { status: 200, body: '<html>Welcome to the café</html>' };
    expect(await send()).toMatchObject({ kind: 'busy' });
  });

  it('no connection is no signal', async () => {
    server.closeAllConnections();
    await new Promise((closed) => server.close(closed));
    expect(await send()).toEqual({ kind: 'no signal' });
  });
});
