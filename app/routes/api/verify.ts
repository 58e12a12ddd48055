import type { Route } from './+types/verify';
import { problemResponse } from '#app/lib/problem.ts';
import { NotFound } from '#domain/errors.ts';
import { CodeError } from '#evidence/errors.ts';
import { parseCode } from '#evidence/code/parse-code.ts';
import { requestContext } from '#server/http/context.ts';
import { publicRecord } from '#server/warranty/public-record.ts';

const NOT_KNOWN = new NotFound('This shop has not issued this number. Compare it with your paper.');

/** The record of a number, for whoever wants to check it: `{ bundle, size }`. */
export async function loader({ params, context }: Route.LoaderArgs) {
  try {
    const code = parseCode(params.code);
    const record = await publicRecord({ code, ip: context.get(requestContext).ip });
    if (!record) throw NOT_KNOWN;
    return Response.json(record, { headers: { 'Cache-Control': 'no-cache' } });
  } catch (error) {
    if (error instanceof CodeError) return problemResponse(NOT_KNOWN);
    return problemResponse(error);
  }
}
