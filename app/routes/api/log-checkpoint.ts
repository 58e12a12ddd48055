import { problemResponse } from '#app/lib/problem.ts';
import { NotFound } from '#domain/errors.ts';
import { newestCheckpoint } from '#server/evidence/newest-checkpoint.ts';

const NONE = new NotFound('The log has no signed head yet. Ask again in a minute.');

/** The newest signed head of the witness log, exactly as it was signed. */
export async function loader() {
  const note = await newestCheckpoint();
  if (note === null) return problemResponse(NONE);
  return new Response(note, {
    headers: { 'Content-Type': 'text/plain; charset=utf-8', 'Cache-Control': 'no-cache' },
  });
}
