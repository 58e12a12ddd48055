import { select } from '../db/sql.ts';
import { env } from '../env.ts';
import { mailTransport } from '../mail/transport.ts';

const PATIENCE_MS = 2_000;

type Answer = 'answers' | 'does not answer';

/** What the shop relies on, each as it is now. `ready`: pages can be served. */
export interface Health {
  ready: boolean;
  database: Answer;
  store: Answer;
  mail: Answer;
}

async function ask(question: Promise<unknown>): Promise<Answer> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const late = new Promise<Answer>((resolve) => {
    timer = setTimeout(resolve, PATIENCE_MS, 'does not answer');
  });
  const answer = question.then(
    (): Answer => 'answers',
    (): Answer => 'does not answer',
  );
  return Promise.race([answer, late]).finally(() => clearTimeout(timer));
}

async function storeAnswers(): Promise<void> {
  const signal = AbortSignal.timeout(PATIENCE_MS);
  const { status } = await fetch(env().S3_ENDPOINT, { signal, redirect: 'manual' });
  // Unsigned, so refused; but a store in trouble says 5xx.
  if (status >= 500) throw new Error(`the store answered ${status}`);
}

async function mailAnswers(): Promise<void> {
  const transport = mailTransport({ patienceMs: PATIENCE_MS });
  try {
    await transport.verify();
  } finally {
    transport.close();
  }
}

/** Asks all three at once, each for at most two seconds. */
export async function readHealth(): Promise<Health> {
  const [database, store, mail] = await Promise.all([
    ask(select('SELECT 1 AS one')),
    ask(storeAnswers()),
    ask(mailAnswers()),
  ]);
  return { ready: database === 'answers', database, store, mail };
}
