import type { EventEmitter } from 'node:events';
import { once } from 'node:events';
import type { RequestListener, ServerResponse } from 'node:http';
import { simpleParser } from 'mailparser';
import type { ParsedMail } from 'mailparser';
import { messageBytes } from './mail-folder.ts';
import type { MailFolder, StoredMail } from './mail-folder.ts';
import { listPage, mailPage } from './mail-views.ts';
import { page, pageHeaders } from './page.ts';

/** A mail as the JSON answers give it. */
export interface CaughtMail {
  id: string;
  /** ISO 8601, UTC. */
  received: string;
  /** Envelope addresses, not headers. */
  from: string;
  to: string[];
  subject: string;
  text: string;
  html: string;
  messageId: string;
  attachments: { filename: string; contentType: string; size: number; url: string }[];
}

const longestWait = 30_000;

/**
 * Answers the catcher's web requests: `/` the list (`?to=` one address), `/mails/<id>` one mail, `/mails.json`
 * (`?to=`; with `?count=n&wait=ms` it answers when that many are there or the time is over), `DELETE /mails.json`.
 */
export function mailPages(folder: MailFolder, arrivals: EventEmitter): RequestListener {
  const parsed = new Map<string, Promise<ParsedMail>>();
  const parse = (mail: StoredMail) => {
    const held = parsed.get(mail.id) ?? simpleParser(messageBytes(mail));
    parsed.set(mail.id, held);
    return held;
  };
  const mailsTo = async (to: string | null): Promise<CaughtMail[]> => {
    const mails = (await folder.all()).filter((mail) => to === null || isTo(mail, to));
    return Promise.all(mails.map(async (mail) => caught(mail, await parse(mail))));
  };

  async function list(query: URLSearchParams): Promise<CaughtMail[]> {
    const end = Date.now() + Math.min(Number(query.get('wait') ?? 0), longestWait);
    const count = Number(query.get('count') ?? 0);
    for (;;) {
      const abort = AbortSignal.timeout(Math.max(0, end - Date.now()));
      const arrival = once(arrivals, 'mail', { signal: abort }).catch(() => undefined);
      const mails = await mailsTo(query.get('to'));
      if (mails.length >= count || Date.now() >= end) return mails;
      await arrival;
    }
  }

  async function answer(method: string, url: URL, response: ServerResponse): Promise<void> {
    const [, first = '', id = '', part = '', index = ''] = url.pathname.split('/');
    if (url.pathname === '/mails.json' && method === 'DELETE') {
      await folder.empty();
      response.writeHead(204).end();
    } else if (url.pathname === '/mails.json') {
      sendJson(response, await list(url.searchParams));
    } else if (url.pathname === '/') {
      const to = url.searchParams.get('to');
      response.writeHead(200, pageHeaders).end(listPage((await mailsTo(to)).reverse(), to));
    } else {
      const mail = first === 'mails' ? await folder.find(id) : undefined;
      if (mail) sendPart(response, mail, await parse(mail), part, Number(index));
      else
        response
          .writeHead(404, pageHeaders)
          .end(page('No such mail', '<p><a href="/">All mails</a></p>'));
    }
  }

  return (request, response) => {
    const url = new URL(request.url ?? '/', 'http://127.0.0.1');
    answer(request.method ?? 'GET', url, response).catch((error: unknown) => {
      response.writeHead(500).end(`${String(error)}\n`);
    });
  };
}

const isTo = (mail: StoredMail, to: string) =>
  mail.to.some((address) => address.toLowerCase() === to.toLowerCase());

function caught(mail: StoredMail, message: ParsedMail): CaughtMail {
  return {
    id: mail.id,
    received: mail.received,
    from: mail.from,
    to: mail.to,
    subject: message.subject ?? '',
    text: message.text ?? '',
    html: message.html || '',
    messageId: message.messageId ?? '',
    attachments: message.attachments.map(({ filename, contentType, size }, index) => ({
      filename: filename ?? `attachment-${index + 1}`,
      contentType,
      size,
      url: `/mails/${mail.id}/attachments/${index}`,
    })),
  };
}

function sendPart(
  response: ServerResponse,
  mail: StoredMail,
  message: ParsedMail,
  part: string,
  index: number,
): void {
  const attachment = part === 'attachments' ? message.attachments[index] : undefined;
  if (part === '') response.writeHead(200, pageHeaders).end(mailPage(caught(mail, message)));
  else if (part === 'html') sendHtml(response, message.html || '');
  else if (part === 'raw') sendFile(response, `${mail.id}.eml`, messageBytes(mail));
  else if (attachment) sendFile(response, attachment.filename ?? 'attachment', attachment.content);
  else response.writeHead(404, pageHeaders).end(page('No such part', ''));
}

/** The mail's own HTML, in a sandbox of its own even when it is opened outside the page's frame. */
function sendHtml(response: ServerResponse, html: string): void {
  response
    .writeHead(200, {
      'content-type': 'text/html; charset=utf-8',
      'content-security-policy':
        "sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:",
    })
    .end(html);
}

function sendFile(response: ServerResponse, name: string, bytes: Buffer): void {
  response
    .writeHead(200, {
      'content-type': 'application/octet-stream',
      'content-disposition': `attachment; filename*=UTF-8''${encodeURIComponent(name).replaceAll("'", '%27')}`,
      'x-content-type-options': 'nosniff',
    })
    .end(bytes);
}

function sendJson(response: ServerResponse, value: unknown): void {
  response.writeHead(200, { 'content-type': 'application/json' }).end(JSON.stringify(value));
}
