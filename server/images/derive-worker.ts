import { setPriority } from 'node:os';
import { derivePicture } from './derive-picture.ts';
import type { Answer, Question } from './picture-process.ts';

// A process of its own, with nothing of the server's in it: decodes one picture after the other.
setPriority(10);

async function answer({ file, type }: Question): Promise<Answer> {
  try {
    const bytes = Buffer.from(file.buffer, file.byteOffset, file.byteLength);
    return { derived: await derivePicture(bytes, type) };
  } catch {
    return { derived: null };
  }
}

process.on('message', (question: Question) => {
  void answer(question).then((found) => process.send?.(found));
});
process.on('disconnect', () => process.exit());
