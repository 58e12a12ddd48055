import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { Failure, sentenceForFullDisk } from '../scripts/sentences.mjs';
import { killGroup, startChild, stopChild } from './child.ts';
import type { Child, Program } from './child.ts';

/** A program without the place of its log. */
export type Start = Omit<Program, 'logFile'> & { logName: string };

const longestStart = 90_000;
const longestStop = { each: 20_000, all: 40_000 };

/**
 * Starts programs in order, waits until each is ready, and stops them all in reverse order. When one that should
 * go on ends by itself, `onLoss` is told in one sentence.
 */
export class Supervisor {
  private readonly children: Child[] = [];
  private stopping: Promise<void> | undefined;

  constructor(
    private readonly logFolder: string,
    private readonly onLoss: (sentence: string) => void = () => undefined,
  ) {
    mkdirSync(logFolder, { recursive: true });
  }

  /** Starts a stand-in; resolves with what it said it is reachable by. Throws its sentence when it does not start. */
  async startStandIn<Ready>(start: Omit<Start, 'env'>, options: object): Promise<Ready> {
    const env = { ...process.env, STAND_IN: JSON.stringify(options) };
    const child = this.launch({ ...start, env });
    const report = await this.within(child, child.report);
    if ('failed' in report) throw new Failure(report.failed);
    this.watch(child);
    return report.ready as Ready;
  }

  /** Starts a web server; resolves when `url` answers with 200. Throws a sentence when it does not. */
  async startWeb(start: Start, url: string): Promise<void> {
    const child = this.launch(start);
    await this.within(child, answers(url, child));
    this.watch(child);
  }

  /** Runs a program to its end. Throws its last words when it fails. */
  async run(start: Start): Promise<void> {
    const child = this.launch(start);
    const how = await child.ended;
    this.children.splice(this.children.indexOf(child), 1);
    if (how !== 0) throw this.failure(child, how);
  }

  /** Stops everything in reverse order; what does not stop in time is ended. Safe to call again. */
  stop(): Promise<void> {
    this.stopping ??= this.stopAll();
    return this.stopping;
  }

  /** Ends everything at once, in no order. */
  kill(): void {
    this.children.forEach(killGroup);
  }

  private async stopAll() {
    const end = Date.now() + longestStop.all;
    for (const child of [...this.children].reverse())
      await stopChild(child, Math.max(0, Math.min(longestStop.each, end - Date.now())));
  }

  private launch({ logName, ...program }: Start): Child {
    if (this.stopping) throw new Failure('Stopped.');
    const child = startChild({ ...program, logFile: join(this.logFolder, `${logName}.log`) });
    this.children.push(child);
    return child;
  }

  private async within<Value>(child: Child, ready: Promise<Value>): Promise<Value> {
    const cap = new AbortController();
    const outcome = await Promise.race([
      ready.then((value) => ({ value })),
      child.ended.then((how) => ({ how })),
      wait(longestStart, { how: 'no answer' }, { signal: cap.signal }),
    ]);
    cap.abort();
    if ('value' in outcome) return outcome.value;
    throw this.failure(child, outcome.how);
  }

  private failure(child: Child, how: number | string): Failure {
    if (this.stopping) return new Failure('Stopped.');
    const words = child.lastWords();
    const known = sentenceForFullDisk(words);
    const last = words.split('\n').at(-1);
    return new Failure(known ?? (last || `${child.name} did not start (${how}).`));
  }

  private watch(child: Child) {
    void child.ended.then((how) => {
      if (this.stopping) return;
      const words = child.lastWords().split('\n').at(-1);
      this.onLoss(`${child.name} has ended by itself (${how})${words ? `: ${words}` : '.'}`);
    });
  }
}

async function answers(url: string, child: Child): Promise<void> {
  for (; !child.isOver(); await wait(50)) {
    const response = await fetch(url).catch(() => undefined);
    if (response?.ok) return;
  }
  await new Promise(() => undefined);
}
