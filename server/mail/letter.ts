/** The words of a mail, before they are written out as text and as HTML. */
export interface Letter {
  subject: string;
  /** Whom it greets; a code needs no greeting. */
  greeting?: string;
  lines: string[];
  /** Label and value. */
  facts: [string, string][];
  /** `path` on our site. */
  link?: { path: string; label: string };
}

/** The shop as it signs its mails. */
export interface Sender {
  name: string;
  address: string;
  telephone: string;
}

const MARKS: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
const escaped = (text: string) => text.replace(/[&<>"']/g, (mark) => MARKS[mark] ?? mark);

const signature = ({ name, address, telephone }: Sender) => [name, address, telephone];

/** The mail as plain text; `origin` is our address without a slash. */
export function letterText(letter: Letter, sender: Sender, origin: string): string {
  const { greeting, lines, facts, link } = letter;
  return [
    ...(greeting === undefined ? [] : [`${greeting},`]),
    ...lines,
    ...(facts.length > 0 ? [facts.map(([label, value]) => `${label}: ${value}`).join('\n')] : []),
    ...(link === undefined ? [] : [`${link.label}: ${origin}${link.path}`]),
    signature(sender).join('\n'),
  ]
    .join('\n\n')
    .concat('\n');
}

/** The mail as HTML without pictures or anything fetched; styles stand inline for mail programs. */
export function letterHtml(letter: Letter, sender: Sender, origin: string): string {
  const { greeting, lines, facts, link } = letter;
  const p = (html: string) => `<p style="margin:0 0 16px">${html}</p>`;
  const row = ([label, value]: [string, string]) =>
    `<tr><th scope="row" style="text-align:left;font-weight:400;padding:2px 16px 2px 0;color:#5a5549">${escaped(label)}</th><td style="padding:2px 0">${escaped(value)}</td></tr>`;
  const table =
    facts.length > 0 ? `<table style="margin:0 0 16px">${facts.map(row).join('')}</table>` : '';
  const to =
    link === undefined
      ? ''
      : p(`<a href="${escaped(origin + link.path)}">${escaped(link.label)}</a>`);
  return `<!doctype html><html lang="en-GB"><head><meta charset="utf-8"><title>${escaped(letter.subject)}</title></head><body style="font:16px/1.5 Georgia,serif;color:#1d1b16;max-width:36em">${[
    greeting === undefined ? '' : p(`${escaped(greeting)},`),
    ...lines.map((line) => p(escaped(line))),
    table,
    to,
    p(signature(sender).map(escaped).join('<br>')),
  ].join('')}</body></html>`;
}
