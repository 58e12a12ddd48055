import { fromBase64url, toBase64url } from '#evidence/bytes/base64url.ts';
import { fromUtf8, toUtf8 } from '#evidence/bytes/utf8.ts';
import { SignatureError } from '#evidence/errors.ts';
import type { JsonValue } from '#evidence/json/json-value.ts';
import { readJson } from '#evidence/json/read-json.ts';
import { sealJson } from '#evidence/json/seal-json.ts';
import { signEd25519 } from '#evidence/key/sign-ed25519.ts';
import { verifyEd25519 } from '#evidence/key/verify-ed25519.ts';
import { JWS_BYTES } from '#evidence/limits.ts';

type JsonObject = { [member: string]: JsonValue };
/** A compact JWS taken apart, its signature not yet checked. */
export type CompactJws = {
  header: JsonObject;
  payload: JsonObject;
  /** Whether the signature holds for a 32-byte Ed25519 public key. */
  signedBy: (publicKey: Uint8Array) => boolean;
};

/**
 * Signs a payload as a compact JWS (RFC 7515 §7.1), header and payload in canonical JSON.
 * @param secretKey the 32-byte Ed25519 secret
 */
export function signCompactJws(header: object, payload: object, secretKey: Uint8Array): string {
  const signed = [header, payload].map((part) => toBase64url(sealJson(part))).join('.');
  return `${signed}.${toBase64url(signEd25519(toUtf8(signed), secretKey))}`;
}

/**
 * Takes a compact JWS apart. Its header is data here and steers nothing: which key and which
 * algorithm count is decided by whoever calls.
 * @throws SignatureError when it is not three segments of base64url, a JSON object in each of the
 *   first two without a member twice; LimitError when too long or nested too deeply
 */
export function readCompactJws(jws: string): CompactJws {
  const segments = jws.split('.');
  const [head, body, tail] = segments;
  if (segments.length !== 3 || !head || !body || !tail || jws.length > JWS_BYTES) {
    throw new SignatureError('This is not a signed statement of ours.');
  }
  try {
    const signature = fromBase64url(tail);
    const message = toUtf8(`${head}.${body}`);
    return {
      header: readObject(head),
      payload: readObject(body),
      signedBy: (publicKey) => verifyEd25519(signature, message, publicKey),
    };
  } catch (cause) {
    throw new SignatureError('This signed statement is damaged.', { cause });
  }
}

function readObject(segment: string): JsonObject {
  const value = readJson(fromUtf8(fromBase64url(segment)), JWS_BYTES);
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    throw new SignatureError('A segment of this signed statement is no object.');
  }
  return value;
}
