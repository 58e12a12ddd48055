/**
 * What a person is told when the machine stands in the way: one sentence that says what is wrong, and what to do.
 * Only Node's own modules here, because it runs before anything is installed.
 */

/** An error whose message is already the sentence for a person; no stack is shown for it. */
export class Failure extends Error {}

const diskFull =
  /ENOSPC|No space left on device|enough free space|No more room in record file|The table '[^']*' is full|Errcode: 28\b|error(?: number)? 28\b/;
const noNetwork =
  /EAI_AGAIN|ENOTFOUND|ENETUNREACH|EHOSTUNREACH|ETIMEDOUT|ECONNREFUSED|ECONNRESET|Temporary failure resolving|Could not resolve|Could not connect|Failed to fetch|Unable to fetch/;

/**
 * The sentence for what a failed program printed, or undefined when nothing in it is known.
 * @param {string} output everything the program wrote
 * @param {string} what what was being fetched or done, as the subject of the sentence
 * @returns {string | undefined}
 */
export function sentenceForOutput(output, what) {
  if (diskFull.test(output)) return diskFullSentence();
  if (noNetwork.test(output))
    return `${what} could not be fetched. Check the network, then run the same command again.`;
  return undefined;
}

/**
 * The sentence for a full disk when that is what a program complained of, otherwise undefined.
 * @param {string} output everything the program wrote
 * @returns {string | undefined}
 */
export function sentenceForFullDisk(output) {
  return diskFull.test(output) ? diskFullSentence() : undefined;
}

/** @returns {string} */
export function diskFullSentence() {
  return 'The disk is full. Free about 1 GB, then run the same command again.';
}

/**
 * @param {number} port the port that is taken
 * @param {string} what what wanted it ("The web server")
 * @param {string} variable the environment variable that chooses another
 * @returns {string}
 */
export function portInUseSentence(port, what, variable) {
  return `${what} needs port ${port}, which another program is using. Stop that program, or choose another port: ${variable}=${port + 10} npm start`;
}

/**
 * The sentence for an error, in words when it is one that a person can cause.
 * @param {unknown} error
 * @returns {string}
 */
export function sentenceFor(error) {
  if (!(error instanceof Error)) return String(error);
  if (error instanceof Failure) return error.message;
  const { code, path } = /** @type {NodeJS.ErrnoException} */ (error);
  if (code === 'ENOSPC' || diskFull.test(error.message)) return diskFullSentence();
  if ((code === 'EACCES' || code === 'EPERM' || code === 'EROFS') && path)
    return `${path} cannot be written. Give this user the right to write there, or run as the user who owns it.`;
  return error.message;
}
