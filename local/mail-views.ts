import type { CaughtMail } from './mail-page.ts';
import { escapeHtml, page } from './page.ts';

/** The list of caught mails, newest first; `to` is the one address it is limited to. */
export function listPage(mails: CaughtMail[], to: string | null): string {
  const rows = mails.map(
    (mail) => `<tr>
<td>${time(mail)}</td>
<td>${mail.to.map((address) => `<a href="/?to=${encodeURIComponent(address)}">${escapeHtml(address)}</a>`).join('<br>')}</td>
<td><a href="/mails/${mail.id}">${escapeHtml(mail.subject || '(no subject)')}</a></td>
</tr>`,
  );
  const none = '<p>Nothing has been sent yet. This page shows a mail when it is loaded again.</p>';
  const table = `<table><tr><th>Sent</th><th>To</th><th>Subject</th></tr>\n${rows.join('\n')}\n</table>`;
  const all = to === null ? '' : '<p><a href="/">Show mails to everybody</a></p>';
  return page(
    to === null ? 'Mail sent by the shop' : `Mail sent to ${to}`,
    `<p>Every mail is kept on this computer and goes no further.</p>\n${all}${mails.length ? table : none}`,
  );
}

/** One mail: its envelope, its text with links, its HTML in a closed frame, and what is attached. */
export function mailPage(mail: CaughtMail): string {
  const frame = `<h2>As HTML</h2>\n<iframe sandbox title="The mail’s HTML" src="/mails/${mail.id}/html"></iframe>`;
  const attached = mail.attachments.map(
    ({ filename, size, url }) =>
      `<li><a href="${url}">${escapeHtml(filename)}</a> (${size} bytes)</li>`,
  );
  return page(
    mail.subject || '(no subject)',
    `<p>To ${escapeHtml(mail.to.join(', '))}<br>From ${escapeHtml(mail.from)}<br>Sent ${time(mail)}</p>
<pre>${withLinks(mail.text)}</pre>
${attached.length ? `<h2>Attached</h2>\n<ul>${attached.join('\n')}</ul>` : ''}
${mail.html ? frame : ''}
<p><a href="/mails/${mail.id}/raw">The message as it was sent</a> · <a href="/">All mails</a></p>`,
  );
}

const time = ({ received }: CaughtMail) =>
  `<time datetime="${received}">${received.slice(0, 16).replace('T', ', ')} UTC</time>`;

function withLinks(text: string): string {
  return text
    .split(/(https?:\/\/[^\s<>"]+)/)
    .map((piece, index) =>
      index % 2
        ? `<a rel="noreferrer" href="${escapeHtml(piece)}">${escapeHtml(piece)}</a>`
        : escapeHtml(piece),
    )
    .join('');
}
