import { realpathSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { sentenceFor } from '../scripts/sentences.mjs';

/** A started stand-in: what the others need to reach it, and how to stop it. */
export interface StandIn {
  /** Closes ports and files; resolves when nothing of it is left running. */
  stop: () => Promise<void>;
  /** Resolves with a sentence when the part of it that does the work has ended by itself. */
  lost?: Promise<string>;
}

/** What a stand-in's process tells the process that started it. */
export type Report = { ready: Record<string, unknown> } | { failed: string };

/**
 * Makes a module a program of its own: when Node was started with it, starts the stand-in with the options in
 * the environment variable STAND_IN (JSON), reports over IPC, and stops on SIGTERM or SIGINT.
 * Options travel in the environment because arguments are readable by every user of the machine.
 */
export async function runAsProgram<Options>(
  moduleUrl: string,
  start: (options: Options) => Promise<StandIn>,
): Promise<void> {
  const program = process.argv[1];
  if (!program || realpathSync(program) !== fileURLToPath(moduleUrl)) return;
  try {
    const running = await start(JSON.parse(process.env.STAND_IN ?? '{}') as Options);
    const stop = () => void running.stop().then(() => process.exit(0));
    process.once('SIGTERM', stop);
    process.once('SIGINT', stop);
    void running.lost?.then((sentence) => {
      console.error(sentence);
      process.exit(1);
    });
    report({ ready: plain(running) });
  } catch (error) {
    const failed = sentenceFor(error);
    console.error(failed);
    report({ failed });
    process.exitCode = 1;
    process.disconnect?.();
  }
}

const plain = ({ stop: _stop, lost: _lost, ...facts }: StandIn) =>
  Object.fromEntries(Object.entries(facts).filter(([, value]) => typeof value !== 'function'));

function report(message: Report) {
  process.send?.(message);
}
