import { mkdir, mkdtemp, writeFile } from 'node:fs/promises';
import { connect } from 'node:net';
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync } from 'node:zlib';
import express, { type Express } from 'express';
import { afterEach, describe, expect, it } from 'vitest';
import { bodyLimit } from './body-limit.ts';
import { securityHeaders } from './headers.ts';
import { ownOrigin } from './origin.ts';
import { precompressed } from './precompressed.ts';

const ORIGIN = 'https://shop.example';
const servers: Server[] = [];

async function serve(set: (app: Express) => void): Promise<string> {
  const app = express();
  set(app);
  const server = createServer(app);
  servers.push(server);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
}

afterEach(() => {
  for (const server of servers.splice(0)) {
    server.close();
    server.closeAllConnections();
  }
});

describe('the origin of a change', () => {
  const app = () =>
    serve((it) => {
      it.use(ownOrigin(ORIGIN));
      it.use((request, response) => {
        response.json({ method: request.method, host: request.headers.host });
      });
    });

  it.each(['POST', 'PUT', 'PATCH', 'DELETE'])('must be ours for %s', async (method) => {
    const url = await app();
    const status = async (headers: HeadersInit) => (await fetch(url, { method, headers })).status;
    expect(await status({ Origin: ORIGIN })).toBe(200);
    for (const other of [
      'https://evil.example',
      'http://shop.example',
      'null',
      `${ORIGIN}.evil.example`,
    ]) {
      expect(await status({ Origin: other })).toBe(403);
    }
    expect(await status({})).toBe(403);
  });

  it('is said in words when it is not ours', async () => {
    const answer = await fetch(await app(), { method: 'POST', headers: { Origin: 'null' } });
    expect(await answer.json()).toEqual({
      code: 'other-origin',
      sentence:
        'This was sent from a page of another address. Open https://shop.example and do it there.',
    });
  });

  it('does not matter for reading', async () => {
    const answer = await fetch(await app(), { headers: { Origin: 'https://evil.example' } });
    expect(answer.status).toBe(200);
  });

  it('stands for the host behind a proxy that renames it', async () => {
    const answer = await fetch(await app(), { method: 'POST', headers: { Origin: ORIGIN } });
    expect(await answer.json()).toMatchObject({ host: 'shop.example' });
  });
});

describe('bodies', () => {
  const app = () =>
    serve((it) => {
      it.use(bodyLimit(({ path }) => (path === '/photo' ? null : 1_000)));
      it.use('/unread', (_request, response) => {
        response.status(413).send('too much for this route');
      });
      it.use(async (request, response) => {
        let bytes = 0;
        for await (const chunk of request) bytes += (chunk as Buffer).length;
        response.json({ bytes });
      });
    });
  const send = async (path: string, bytes: number) =>
    fetch(`${await app()}${path}`, { method: 'POST', body: new Uint8Array(bytes) });

  it('pass up to the limit', async () => {
    expect(await (await send('/', 1_000)).json()).toEqual({ bytes: 1_000 });
    expect(await (await send('/photo', 5_000_000)).json()).toEqual({ bytes: 5_000_000 });
  });

  it('beyond it get a 413 that the sender sees, however large they are', async () => {
    for (const bytes of [1_001, 20_000_000]) {
      const answer = await send('/', bytes);
      expect(answer.status).toBe(413);
      expect(await answer.json()).toMatchObject({ code: 'too-large' });
    }
  });

  it('that a route leaves unread do not hide its answer', async () => {
    const answer = await send('/unread', 900);
    expect(answer.status).toBe(413);
    expect(await answer.text()).toBe('too much for this route');
  });

  it('of unknown length are refused', async () => {
    const { port, hostname } = new URL(await app());
    const text = await new Promise<string>((resolve) => {
      const socket = connect(Number(port), hostname, () => {
        socket.write(
          'POST / HTTP/1.1\r\nHost: a\r\nTransfer-Encoding: chunked\r\n\r\n5\r\nhello\r\n',
        );
      });
      socket.once('data', (data) => {
        resolve(data.toString());
        socket.destroy();
      });
    });
    expect(text).toMatch(/^HTTP\/1\.1 411 /);
  });
});

describe('the headers of every answer', () => {
  const headersOf = async (https: boolean) => {
    const url = await serve((it) => {
      it.use(securityHeaders({ https }));
      it.use((_request, response) => {
        response.json({ nonce: response.locals.nonce as unknown });
      });
    });
    const answer = await fetch(url);
    const { nonce } = (await answer.json()) as { nonce: string };
    return { headers: answer.headers, nonce, url };
  };

  it('let only our own scripts run, and this answer’s inline ones', async () => {
    const { headers, nonce } = await headersOf(false);
    const policy = headers.get('Content-Security-Policy') ?? '';
    expect(Buffer.from(nonce, 'base64')).toHaveLength(16);
    expect(policy).toContain(`script-src 'self' 'nonce-${nonce}';`);
    expect(policy).toContain("default-src 'none'");
    expect(policy).toContain("frame-ancestors 'none'");
    expect(policy).toContain("base-uri 'none'");
    expect(policy).not.toMatch(/script-src[^;]*unsafe/);
    expect(headers.get('X-Content-Type-Options')).toBe('nosniff');
    expect(headers.get('Referrer-Policy')).toBe('same-origin');
    expect(headers.get('Permissions-Policy')).toContain('camera=(self)');
  });

  it('carry another nonce each time', async () => {
    const { nonce, url } = await headersOf(false);
    const again = (await (await fetch(url)).json()) as { nonce: string };
    expect(again.nonce).not.toBe(nonce);
  });

  it('insist on https only where people come by https', async () => {
    expect((await headersOf(true)).headers.get('Strict-Transport-Security')).toContain('max-age=');
    expect((await headersOf(false)).headers.has('Strict-Transport-Security')).toBe(false);
  });
});

describe('static files', () => {
  const SCRIPT = 'export const a = 1;\n'.repeat(200);
  const app = async () => {
    const folder = await mkdtemp(join(tmpdir(), 'static-'));
    await mkdir(join(folder, 'assets'));
    await writeFile(join(folder, 'assets/a.js'), SCRIPT);
    await writeFile(join(folder, 'assets/a.js.br'), brotliCompressSync(SCRIPT));
    await writeFile(join(folder, 'assets/b.js'), SCRIPT);
    return serve((it) => {
      it.use(precompressed(folder));
      it.use(express.static(folder, { index: false, redirect: false }));
    });
  };
  const get = async (path: string, encodings: string) =>
    fetch(`${await app()}${path}`, { headers: { 'Accept-Encoding': encodings } });

  it('go out as the build compressed them, to browsers that take it', async () => {
    const answer = await get('/assets/a.js', 'gzip, br');
    expect(answer.headers.get('Content-Encoding')).toBe('br');
    expect(answer.headers.get('Content-Type')).toBe('text/javascript; charset=utf-8');
    expect(answer.headers.get('Vary')).toBe('Accept-Encoding');
    expect(Number(answer.headers.get('Content-Length'))).toBeLessThan(100);
    expect(await answer.text()).toBe(SCRIPT);
  });

  it('go out as they are to others, and where there is nothing better', async () => {
    for (const [path, encodings] of [
      ['/assets/a.js', 'gzip'],
      ['/assets/a.js', 'br;q=0'],
      ['/assets/b.js', 'br'],
    ] as const) {
      const answer = await get(path, encodings);
      expect(answer.headers.has('Content-Encoding')).toBe(false);
      expect(await answer.text()).toBe(SCRIPT);
    }
  });

  it('are only those of the folder', async () => {
    for (const path of ['/assets/../../a.js', '/assets/..%2f..%2fetc.js', '/assets/missing.js']) {
      expect((await get(path, 'br')).status).toBe(404);
    }
  });
});
