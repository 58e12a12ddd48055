/** Someone at the site without a script: keeps cookies, follows nothing by itself, sends forms as a browser does. */
export class Visitor {
  private readonly cookies = new Map<string, string>();

  constructor(private readonly origin: string) {}

  /** Puts a cookie there, given as a Set-Cookie value. */
  take(setCookie: string): void {
    const [pair = '', ...attributes] = setCookie.split(';');
    const at = pair.indexOf('=');
    const name = pair.slice(0, at).trim();
    const gone = attributes.some((attribute) => /^\s*max-age=0$/i.test(attribute));
    if (gone) this.cookies.delete(name);
    else this.cookies.set(name, pair.slice(at + 1));
  }

  cookie(name: string): string | undefined {
    return this.cookies.get(name);
  }

  async send(path: string, init: RequestInit = {}): Promise<Response> {
    const headers = new Headers(init.headers);
    const cookie = [...this.cookies].map((pair) => pair.join('=')).join('; ');
    if (cookie !== '') headers.set('Cookie', cookie);
    const answer = await fetch(new URL(path, this.origin), {
      redirect: 'manual',
      ...init,
      headers,
    });
    for (const set of answer.headers.getSetCookie()) this.take(set);
    return answer;
  }

  /** Sends a form from a page of the site. */
  post(path: string, fields: Record<string, string>): Promise<Response> {
    const headers = { Origin: this.origin };
    return this.send(path, { method: 'POST', body: new URLSearchParams(fields), headers });
  }
}

/** Where an answer sends on to, as a path on the site, or whole when it leaves the site. */
export function sentTo(answer: Response): string {
  const location = answer.headers.get('Location') ?? '';
  const url = new URL(location, answer.url);
  return url.origin === new URL(answer.url).origin ? url.pathname + url.search : url.href;
}
