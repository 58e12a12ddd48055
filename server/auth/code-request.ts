import { z } from 'zod';
import { codeCookie } from './cookies.ts';

const CodeRequestSchema = z.object({
  token: z.string(),
  email: z.string(),
  /** Where to go after the sign-in. */
  back: z.string().nullable(),
});

/** What the browser that asked for a code keeps: in no page and no script's reach. */
export type CodeRequest = z.infer<typeof CodeRequestSchema>;

/** The code request of this browser, or null when it asked for none (or too long ago). */
export async function readCodeRequest(request: Request): Promise<CodeRequest | null> {
  const value: unknown = await codeCookie().parse(request.headers.get('Cookie'));
  return CodeRequestSchema.safeParse(value).data ?? null;
}

/** The Set-Cookie value that keeps a code request, or forgets it. */
export async function keepCodeRequest(kept: CodeRequest | null): Promise<string> {
  return kept === null ? codeCookie().serialize('', { maxAge: 0 }) : codeCookie().serialize(kept);
}
