import { brotliCompressSync } from 'node:zlib';
import type { BrowserContext } from 'playwright-core';

/** What a page costs on first load, in bytes after brotli at its highest quality; pictures as sent. */
export interface Weight {
  html: number;
  css: number;
  js: number;
  fonts: number;
  pictures: number;
  requests: number;
}

const KIND: Record<string, keyof Weight> = {
  document: 'html',
  stylesheet: 'css',
  script: 'js',
  font: 'fonts',
  image: 'pictures',
};

const PACKED = new Set<keyof Weight>(['html', 'css', 'js']);

/**
 * Opens `url` in a fresh page of `context`, waits until the network is quiet, and weighs every
 * answer. The same brotli is applied to everything, so that what a server happens to do does not count.
 */
export async function weighPage(context: BrowserContext, url: string): Promise<Weight> {
  const page = await context.newPage();
  const weight: Weight = { html: 0, css: 0, js: 0, fonts: 0, pictures: 0, requests: 0 };
  const read: Promise<void>[] = [];
  page.on('response', (response) => {
    const kind = KIND[response.request().resourceType()];
    weight.requests += 1;
    if (kind === undefined || !response.ok()) return;
    read.push(
      response.body().then((body) => {
        weight[kind] += PACKED.has(kind) ? brotliCompressSync(body).length : body.length;
      }),
    );
  });
  const answer = await page.goto(url, { waitUntil: 'networkidle' });
  if (!answer?.ok()) throw new Error(`${url} answered ${answer?.status() ?? 'nothing'}.`);
  await Promise.all(read);
  await page.close();
  return weight;
}
