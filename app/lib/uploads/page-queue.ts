import { hashFile } from './hash-file.ts';
import { memoryShelf } from './memory-shelf.ts';
import { sendPhoto } from './send-photo.ts';
import { UploadQueue } from './upload-queue.ts';

let held: UploadQueue | undefined;

/** The one queue of this page. It goes on while the person moves about in the program. Browser only. */
export function pageQueue(): UploadQueue {
  if (held !== undefined) return held;
  const queue = new UploadQueue({
    shelf: memoryShelf(),
    hash: hashFile,
    send: sendPhoto,
    later: (ms, then) => void setTimeout(then, ms),
  });
  held = queue;
  window.addEventListener('online', () => queue.online());
  window.addEventListener('beforeunload', (event) => {
    const waiting = queue.snapshot().some(({ state, final }) => state !== 'up' && !final);
    if (waiting) event.preventDefault();
  });
  void queue.resume();
  return queue;
}
