import { keySet } from '#server/evidence/key-set.ts';

/** The shop's public keys (RFC 7517). */
export async function loader() {
  return Response.json(await keySet(), {
    headers: { 'Content-Type': 'application/jwk-set+json', 'Cache-Control': 'no-cache' },
  });
}
