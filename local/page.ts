/** Text made safe to stand in HTML, in attributes too. */
export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => `&#${character.charCodeAt(0)};`);
}

/** A page of a stand-in: plain, so that nobody takes it for a page of the shop. `body` is HTML. */
export function page(title: string, body: string): string {
  return `<!doctype html>
<html lang="en">
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<title>${escapeHtml(title)}</title>
<link rel="icon" href="data:,">
<style>
:root { color-scheme: light dark; font: 17px/1.5 system-ui, sans-serif }
body { margin: 0 auto; padding: 2rem 1rem; max-width: 44rem }
button { font: inherit; padding: .7rem 1rem; margin: .3rem 0; min-width: 16rem; text-align: left }
table { border-collapse: collapse; width: 100% } td, th { text-align: left; padding: .4rem .8rem .4rem 0; vertical-align: top }
iframe { width: 100%; height: 32rem; border: 1px solid } pre { white-space: pre-wrap; overflow-wrap: anywhere }
</style>
<h1>${escapeHtml(title)}</h1>
${body}
</html>
`;
}

/** Headers for such a page: no script, nothing from elsewhere. */
export const pageHeaders = {
  'content-type': 'text/html; charset=utf-8',
  'content-security-policy':
    "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-src 'self'; frame-ancestors 'none'; base-uri 'none'",
  'cache-control': 'no-store',
};
