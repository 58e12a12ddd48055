import { toUtf8 } from '#evidence/bytes/utf8.ts';

/**
 * What a witness signs (C2SP tlog-cosignature, Ed25519): a header line, the time and the whole
 * text of the checkpoint.
 * @param seconds since 1970, as the cosignature carries it
 */
export function cosignedText(seconds: bigint, text: string): Uint8Array {
  return toUtf8(`cosignature/v1\ntime ${seconds}\n${text}`);
}
