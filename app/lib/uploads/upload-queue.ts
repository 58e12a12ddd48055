import { v7 } from 'uuid';
import { NOT_A_PHOTO, sizeSentence, SNIFFED_BYTES, sniffPhoto } from '#domain/photo-file.ts';
import { backOff } from './back-off.ts';
import type { Letter, Outcome } from './send-photo.ts';
import type { PhotoShelf, PhotoTarget, WaitingPhoto } from './waiting-photo.ts';

/** A photo on its way. `id` becomes the id of the photo at the shop once it is up. */
export interface GoingUp extends PhotoTarget {
  id: string;
  /** "Photo 13" once it has a number, the file's name before. */
  name: string;
  percent: number;
  state: 'waiting' | 'going-up' | 'up' | 'kept' | 'failed';
  reason?: string;
  /** It is not tried again. */
  final?: boolean;
  /** The file, as long as it is here. */
  file: Blob;
}

/** What the queue needs of the world outside it. */
export interface QueueParts {
  shelf: PhotoShelf;
  hash: (file: Blob) => Promise<string>;
  send: (letter: Letter) => Promise<Outcome>;
  /** Calls back after so many ms. */
  later: (ms: number, then: () => void) => void;
}

/** Photos that go up at the same time. */
const AT_ONCE = 2;

/** Attempts on a shop that answers but cannot take the photo; without a connection there is no end. */
const MOST_BUSY = 6;

interface Item {
  photo: WaitingPhoto;
  view: GoingUp;
  attempts: number;
  /** Waits for its next attempt. */
  resting: boolean;
}

/**
 * Brings photos to the shop, two at a time, each until it is up or refused. A photo stays on the
 * shelf until the shop has said that it is safe.
 */
export class UploadQueue {
  readonly #parts: QueueParts;
  readonly #items: Item[] = [];
  readonly #listeners = new Set<() => void>();
  #snapshot: readonly GoingUp[] = [];

  constructor(parts: QueueParts) {
    this.#parts = parts;
  }

  /** Takes up what a shelf still holds from before. */
  async resume(): Promise<void> {
    for (const photo of await this.#parts.shelf.all()) this.#enter(photo);
    this.#pump();
  }

  /** Adds files for one entry; what cannot be a photo is refused at once. */
  async add(files: readonly File[], target: PhotoTarget): Promise<void> {
    for (const file of files) {
      const photo = { ...target, id: v7(), file, name: file.name };
      const item = this.#enter(photo);
      const reason =
        sizeSentence(file.size) ?? ((await typeOf(file)) === null ? NOT_A_PHOTO : null);
      if (reason === null) await this.#parts.shelf.keep(photo);
      else this.#change(item, { state: 'failed', reason, final: true });
    }
    this.#pump();
  }

  /** Tries one photo again, now. */
  retry(id: string): void {
    const item = this.#items.find(({ view }) => view.id === id && !view.final);
    if (item === undefined) return;
    item.attempts = 0;
    item.resting = false;
    this.#change(item, { state: 'waiting', reason: undefined });
    this.#pump();
  }

  /** The connection is back: everything that waits for it goes on. */
  online(): void {
    for (const item of this.#items) item.resting = false;
    this.#pump();
  }

  /** Forgets the photos of an entry that are up or refused: its page has shown them. */
  clear(entryId: string): void {
    const over = ({ view }: Item) =>
      view.entryId === entryId && (view.state === 'up' || view.final === true);
    for (const item of this.#items.filter(over)) this.#items.splice(this.#items.indexOf(item), 1);
    this.#tell();
  }

  /** Everything on its way; the same array until something changes. */
  snapshot = (): readonly GoingUp[] => this.#snapshot;

  /** Calls `listener` at each change. Returns how to stop it. */
  subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  #enter(photo: WaitingPhoto): Item {
    const view: GoingUp = { ...photo, percent: 0, state: 'waiting' };
    const item = { photo, view, attempts: 0, resting: false };
    this.#items.push(item);
    this.#tell();
    return item;
  }

  #change(item: Item, change: Partial<GoingUp>): void {
    item.view = { ...item.view, ...change };
    this.#tell();
  }

  #tell(): void {
    this.#snapshot = this.#items.map(({ view }) => view);
    for (const listener of this.#listeners) listener();
  }

  #pump(): void {
    const going = this.#items.filter(({ view }) => view.state === 'going-up').length;
    const ready = ({ view, resting }: Item) =>
      !resting && (view.state === 'waiting' || view.state === 'kept');
    for (const item of this.#items.filter(ready).slice(0, AT_ONCE - going)) {
      this.#change(item, { state: 'going-up', percent: 0, reason: undefined });
      void this.#attempt(item).then((outcome) => this.#settle(item, outcome));
    }
  }

  async #attempt(item: Item): Promise<Outcome> {
    const { photo } = item;
    item.attempts += 1;
    try {
      const [sha256, type] = await Promise.all([this.#parts.hash(photo.file), typeOf(photo.file)]);
      const onProgress = (sent: number) =>
        this.#change(item, { percent: Math.min(99, (100 * sent) / photo.file.size) });
      const mediaType = type ?? 'application/octet-stream';
      return await this.#parts.send({ photo, sha256, mediaType, onProgress });
    } catch {
      const sentence = 'This file can no longer be read on this device. Choose it again.';
      return { kind: 'stopped', sentence };
    }
  }

  async #settle(item: Item, outcome: Outcome): Promise<void> {
    switch (outcome.kind) {
      case 'up':
        this.#arrived(item, outcome);
        await this.#parts.shelf.remove(item.photo.id);
        break;
      case 'refused':
        this.#change(item, { state: 'failed', reason: outcome.sentence, final: true });
        await this.#parts.shelf.remove(item.photo.id);
        break;
      case 'stopped':
        this.#change(item, { state: 'failed', reason: outcome.sentence });
        break;
      case 'busy':
        if (item.attempts >= MOST_BUSY)
          this.#change(item, { state: 'failed', reason: outcome.sentence });
        else this.#rest(item, { state: 'waiting', reason: outcome.sentence });
        break;
      case 'no signal':
        this.#rest(item, { state: 'kept' });
    }
    this.#pump();
  }

  /** The same file chosen twice is one photo at the shop, and one line here. */
  #arrived(item: Item, { id, number }: { id: string; number: number }): void {
    const twin = this.#items.find((other) => other !== item && other.view.id === id);
    if (twin !== undefined) this.#items.splice(this.#items.indexOf(item), 1);
    this.#change(item, { state: 'up', percent: 100, id, name: `Photo ${number}` });
  }

  #rest(item: Item, change: Partial<GoingUp>): void {
    item.resting = true;
    this.#change(item, change);
    this.#parts.later(backOff(item.attempts), () => {
      item.resting = false;
      this.#pump();
    });
  }
}

async function typeOf(file: Blob) {
  const head = new Uint8Array(await file.slice(0, SNIFFED_BYTES).arrayBuffer());
  return sniffPhoto(head);
}
