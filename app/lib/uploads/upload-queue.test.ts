import { describe, expect, it } from 'vitest';
import { backOff } from './back-off.ts';
import { memoryShelf } from './memory-shelf.ts';
import type { Letter, Outcome } from './send-photo.ts';
import { UploadQueue } from './upload-queue.ts';

const JPEG = [0xff, 0xd8, 0xff, 0xe0, 0, 0, 0, 0];
const target = { caseNumber: '2026-031', entryId: '019b0000-0000-7000-8000-000000000001' };

const photo = (name: string, bytes = JPEG) => new File([Uint8Array.from(bytes)], name);

/** A queue whose letters are answered by hand, and whose waits end by hand. */
function setUp(shelf = memoryShelf()) {
  const letters: (Letter & { answer: (outcome: Outcome) => void })[] = [];
  const waits: { ms: number; then: () => void }[] = [];
  const queue = new UploadQueue({
    shelf,
    hash: (file) => Promise.resolve(`hash of ${file.size}`),
    send: (letter) => new Promise((answer) => letters.push({ ...letter, answer })),
    later: (ms, then) => void waits.push({ ms, then }),
  });
  // Everything here is promises that are settled already: a few turns of the loop are enough.
  const settled = () => new Promise((done) => setTimeout(done, 5));
  const states = () => queue.snapshot().map(({ name, state }) => `${name} ${state}`);
  return { queue, letters, waits, shelf, settled, states };
}

const up = (number: number, id = `photo-${number}`): Outcome => ({ kind: 'up', id, number });

describe('photos on their way', () => {
  it('go up two at a time, in order, with their hash and true type', async () => {
    const { queue, letters, states, settled } = setUp();
    await queue.add([photo('a.jpg'), photo('b.png'), photo('c.jpg')], target);
    await settled();
    expect(states()).toEqual(['a.jpg going-up', 'b.png going-up', 'c.jpg waiting']);
    expect(letters.map(({ mediaType, sha256 }) => [mediaType, sha256])).toEqual([
      ['image/jpeg', 'hash of 8'],
      ['image/jpeg', 'hash of 8'],
    ]);
    letters[1]?.answer(up(14));
    await settled();
    expect(states()).toEqual(['a.jpg going-up', 'Photo 14 up', 'c.jpg going-up']);
    expect(queue.snapshot()[1]).toMatchObject({ id: 'photo-14', percent: 100 });
  });

  it('tell how far they have come, and are not up before the shop says so', async () => {
    const { queue, letters, settled } = setUp();
    await queue.add([photo('a.jpg')], target);
    await settled();
    letters[0]?.onProgress(4);
    expect(queue.snapshot()[0]?.percent).toBe(50);
    letters[0]?.onProgress(8);
    expect(queue.snapshot()[0]).toMatchObject({ percent: 99, state: 'going-up' });
  });

  it('stay on the shelf until they are up', async () => {
    const { queue, letters, shelf, settled } = setUp();
    await queue.add([photo('a.jpg'), photo('b.jpg')], target);
    await settled();
    expect((await shelf.all()).map(({ name }) => name)).toEqual(['a.jpg', 'b.jpg']);
    letters[0]?.answer(up(1));
    await settled();
    expect((await shelf.all()).map(({ name }) => name)).toEqual(['b.jpg']);
  });

  it('are taken up again from a shelf that has outlasted the page', async () => {
    const { queue, shelf } = setUp();
    await queue.add([photo('a.jpg')], target);
    const next = setUp(shelf);
    await next.queue.resume();
    await next.settled();
    expect(next.letters[0]?.photo).toMatchObject({ name: 'a.jpg', ...target });
    expect(next.letters[0]?.photo.id).toBe(queue.snapshot()[0]?.id);
  });

  it('are one line when the same file is chosen twice', async () => {
    const { queue, letters, states, settled } = setUp();
    await queue.add([photo('a.jpg'), photo('copy of a.jpg')], target);
    await settled();
    letters[0]?.answer(up(13));
    letters[1]?.answer(up(13));
    await settled();
    expect(states()).toEqual(['Photo 13 up']);
  });
});

describe('what the shop refuses', () => {
  it('says why and is not tried again', async () => {
    const { queue, letters, shelf, settled } = setUp();
    await queue.add([photo('a.jpg')], target);
    await settled();
    const sentence = 'This photo stops before its end. Take it again.';
    letters[0]?.answer({ kind: 'refused', sentence });
    await settled();
    expect(queue.snapshot()[0]).toMatchObject({ state: 'failed', reason: sentence, final: true });
    expect(await shelf.all()).toEqual([]);
    queue.retry(queue.snapshot()[0]?.id ?? '');
    await settled();
    expect(letters).toHaveLength(1);
  });

  it('is not sent at all when it cannot be a photo', async () => {
    const { queue, letters, shelf, settled } = setUp();
    const large = photo('large.jpg');
    Object.defineProperty(large, 'size', { value: 60_000_000 });
    await queue.add([photo('words.jpg', [72, 105]), photo('empty.jpg', []), large], target);
    await settled();
    expect(queue.snapshot().map(({ state, final, reason }) => [state, final, reason])).toEqual([
      ['failed', true, 'This file is not a photo the shop can read. Send JPEG, PNG, WebP or HEIC.'],
      ['failed', true, 'This file is empty. Choose the photo again.'],
      [
        'failed',
        true,
        'This file has 60 MB and the shop takes 50. Make the photo smaller and send it again.',
      ],
    ]);
    expect([letters, await shelf.all()]).toEqual([[], []]);
  });
});

describe('trouble on the way', () => {
  it('no signal: kept, and tried again longer and longer, without end', async () => {
    const { queue, letters, waits, states, settled } = setUp();
    await queue.add([photo('a.jpg')], target);
    for (let attempt = 0; attempt < 8; attempt += 1) {
      await settled();
      letters[attempt]?.answer({ kind: 'no signal' });
      await settled();
      expect(states()).toEqual(['a.jpg kept']);
      waits[attempt]?.then();
    }
    await settled();
    expect(letters).toHaveLength(9);
    const [first = 0, second = 0] = waits.map(({ ms }) => ms);
    expect(first).toBeLessThanOrEqual(2000);
    expect(second).toBeGreaterThan(first);
  });

  it('no signal: goes on at once when the connection is back', async () => {
    const { queue, letters, settled } = setUp();
    await queue.add([photo('a.jpg')], target);
    await settled();
    letters[0]?.answer({ kind: 'no signal' });
    await settled();
    queue.online();
    await settled();
    expect(letters).toHaveLength(2);
    expect(letters[1]?.photo.id).toBe(letters[0]?.photo.id);
  });

  it('a busy shop: tried a few times, then left to the person with the sentence', async () => {
    const { queue, letters, waits, settled } = setUp();
    const sentence = 'The shop’s photo store does not answer. Wait a minute and try again.';
    await queue.add([photo('a.jpg')], target);
    for (let attempt = 0; attempt < 6; attempt += 1) {
      await settled();
      letters[attempt]?.answer({ kind: 'busy', sentence });
      await settled();
      waits[attempt]?.then();
    }
    await settled();
    expect(letters).toHaveLength(6);
    expect(queue.snapshot()[0]).toMatchObject({ state: 'failed', reason: sentence });
    expect(queue.snapshot()[0]?.final).toBeUndefined();
    queue.retry(queue.snapshot()[0]?.id ?? '');
    await settled();
    expect(letters).toHaveLength(7);
    letters[6]?.answer(up(3));
    await settled();
    expect(queue.snapshot()[0]).toMatchObject({ state: 'up', name: 'Photo 3' });
  });

  it('signed out: the others wait no less, and it can be sent again', async () => {
    const { queue, letters, shelf, settled } = setUp();
    await queue.add([photo('a.jpg')], target);
    await settled();
    letters[0]?.answer({ kind: 'stopped', sentence: 'You are signed out. Sign in and try again.' });
    await settled();
    expect(queue.snapshot()[0]).toMatchObject({ state: 'failed' });
    expect(await shelf.all()).toHaveLength(1);
    queue.retry(queue.snapshot()[0]?.id ?? '');
    await settled();
    expect(letters).toHaveLength(2);
  });

  it('a file that can no longer be read is said to be so', async () => {
    const { queue, settled } = setUp();
    const gone = photo('gone.jpg');
    await queue.add([gone], target);
    const broken = new UploadQueue({
      shelf: memoryShelf(),
      hash: () => Promise.reject(new Error('NotReadableError')),
      send: () => expect.unreachable('it was sent'),
      later: () => expect.unreachable('it was tried again'),
    });
    await broken.add([gone], target);
    await settled();
    expect(broken.snapshot()[0]?.reason).toBe(
      'This file can no longer be read on this device. Choose it again.',
    );
  });
});

describe('the list of an entry', () => {
  it('forgets what is up or refused, and nothing that waits', async () => {
    const { queue, letters, states, settled } = setUp();
    await queue.add([photo('a.jpg'), photo('b.jpg'), photo('c.jpg', [1])], target);
    await settled();
    letters[0]?.answer(up(1));
    await settled();
    queue.clear('another entry');
    expect(states()).toHaveLength(3);
    queue.clear(target.entryId);
    expect(states()).toEqual(['b.jpg going-up']);
  });

  it('is the same array until something changes', async () => {
    const { queue } = setUp();
    expect(queue.snapshot()).toBe(queue.snapshot());
    let told = 0;
    const stop = queue.subscribe(() => (told += 1));
    await queue.add([photo('a.jpg')], target);
    expect(told).toBeGreaterThan(0);
    stop();
    const before = told;
    queue.clear(target.entryId);
    expect(told).toBe(before);
  });
});

it('waits are at most a minute, and apart from each other', () => {
  expect([1, 2, 3, 9].map((attempts) => backOff(attempts, () => 1))).toEqual([
    2000, 4000, 8000, 60_000,
  ]);
  expect(backOff(1, () => 0)).toBe(1500);
});
