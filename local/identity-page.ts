import type { IncomingMessage, ServerResponse } from 'node:http';
import type { Provider } from 'oidc-provider';
import { demoStaff } from './demo-staff.ts';
import { escapeHtml, page, pageHeaders } from './page.ts';

/** The path under which a sign-in that waits for a choice is found. */
export const interactionPath = '/who/';

/** Shows who can be chosen, and takes the choice: a person's subject id, or turning back. */
export async function serveInteraction(
  provider: Provider,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> {
  try {
    await provider.interactionDetails(request, response);
    if (request.method === 'POST') {
      const result = choice(await formField(request, 'person'));
      await provider.interactionFinished(request, response, result, {
        mergeWithLastSubmission: false,
      });
    } else {
      response.writeHead(200, pageHeaders).end(choicePage());
    }
  } catch {
    const body = '<p>This sign-in has run out. Go back to the shop and sign in again.</p>';
    response.writeHead(400, pageHeaders).end(page('Nobody is signing in', body));
  }
}

function choice(person: string) {
  if (demoStaff.some(({ sub }) => sub === person))
    return { login: { accountId: person, remember: false } };
  return { error: 'access_denied', error_description: 'Nobody was chosen.' };
}

function choicePage(): string {
  const button = (value: string, label: string) =>
    `<div><button name="person" value="${escapeHtml(value)}">${escapeHtml(label)}</button></div>`;
  return page(
    'Who is signing in?',
    `<p>This page stands in for the shop’s identity provider. It asks for no password, because everybody here is invented.</p>
<form method="post">
${demoStaff.map(({ sub, name, does }) => button(sub, `${name}, ${does}`)).join('\n')}
${button('', 'Turn back')}
</form>`,
  );
}

async function formField(request: IncomingMessage, name: string): Promise<string> {
  let body = '';
  for await (const chunk of request) body += String(chunk);
  return new URLSearchParams(body).get(name) ?? '';
}
