import { RouterContextProvider } from 'react-router';
import { viewerContext } from '#app/context.ts';
import type { Viewer } from '#domain/viewer.ts';

/** What a loader or action is called with, for a viewer at a path; `form` makes it a POST. */
export function routeArgs<Params extends Record<string, string>>(
  viewer: Viewer,
  path: string,
  params: Params,
  form?: Record<string, string | string[]>,
) {
  const url = new URL(path, 'http://shop.example');
  const context = new RouterContextProvider();
  context.set(viewerContext, viewer);
  const body = form && new FormData();
  for (const [name, values] of Object.entries(form ?? {}))
    for (const value of [values].flat()) body?.append(name, value);
  const request = new Request(url, body ? { method: 'POST', body } : {});
  return { request, url, context, params, pattern: path };
}

/** What a page throws or returns when it refuses: the status and the sentence. */
export async function refusalOf(
  work: Promise<unknown>,
): Promise<{ status: number; problem: string }> {
  const answer = await work.catch((thrown: unknown) => thrown);
  const { data, init } = answer as { data: { problem: string }; init: { status: number } };
  return { status: init.status, problem: data.problem };
}
