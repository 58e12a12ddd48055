import { describe, expect, it } from 'vitest';
import { Failure, portInUseSentence, sentenceFor, sentenceForOutput } from './sentences.mjs';

const full = 'The disk is full. Free about 1 GB, then run the same command again.';
const noNetwork =
  'The npm packages could not be fetched. Check the network, then run the same command again.';

// Lines printed by apt 2.6 and npm 11 with no network and by MariaDB 10.11 on a full disk; the first two lines
// are from memory.
describe('sentenceForOutput', () => {
  it.each([
    ['npm warn tar TAR_ENTRY_ERROR ENOSPC: no space left on device, write', full],
    ["E: You don't have enough free space in /var/cache/apt/archives/.", full],
    ['[ERROR] InnoDB: preallocating 12582912 bytes for file ./ibdata1 failed with error 28', full],
    ['Can\'t create table `a`.`rests` (errno: 135 "No more room in record file")', full],
    ['npm error code ECONNREFUSED\nnpm error syscall connect', noNetwork],
    ['npm error code ENOTFOUND\nnpm error syscall getaddrinfo', noNetwork],
    [
      '  Could not connect to 127.0.0.1:9 (127.0.0.1). - connect (111: Connection refused)',
      noNetwork,
    ],
    ['E: Unable to fetch some archives, maybe run apt-get update', noNetwork],
    ['npm error code EINTEGRITY', undefined],
    ['error 282 in line 28', undefined],
  ])('%s', (output, sentence) => {
    expect(sentenceForOutput(output, 'The npm packages')).toBe(sentence);
  });
});

describe('sentenceFor', () => {
  const failed = (code: string, path?: string) =>
    Object.assign(new Error(`${code}: it failed`), { code, path });

  it('puts errors of the machine into words', () => {
    expect(sentenceFor(failed('ENOSPC'))).toBe(full);
    expect(sentenceFor(failed('EACCES', '/srv/.data'))).toBe(
      '/srv/.data cannot be written. Give this user the right to write there, or run as the user who owns it.',
    );
  });

  it('leaves sentences and unknown errors as they are', () => {
    expect(sentenceFor(new Failure('The glue pot is cold.'))).toBe('The glue pot is cold.');
    expect(sentenceFor(new Error('something else'))).toBe('something else');
    expect(sentenceFor('words')).toBe('words');
  });
});

it('names the port, who wants it and how to choose another', () => {
  expect(portInUseSentence(3000, 'Witnessmark', 'PORT')).toBe(
    'Witnessmark needs port 3000, which another program is using. Stop that program, or choose another port: PORT=3010 npm start',
  );
});
