import { readHealth } from '#server/health/read-health.ts';

/** For people and machines that watch the server: 200 while pages can be served, 503 otherwise. */
export async function loader() {
  const health = await readHealth();
  const headers = { 'Cache-Control': 'no-store' };
  return Response.json(health, { status: health.ready ? 200 : 503, headers });
}
