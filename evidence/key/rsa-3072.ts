import { toHex } from '#evidence/bytes/hex.ts';
import { readDer } from '#evidence/key/read-der.ts';

/** AlgorithmIdentifier of rsaEncryption with its NULL, RFC 8017 appendix A.1. */
const RSA_ENCRYPTION = '300d06092a864886f70d0101010500';

/** Whether a DER SubjectPublicKeyInfo holds an RSA key whose modulus has exactly 3072 bits. */
export function isRsa3072(spki: Uint8Array): boolean {
  try {
    const [outer, ...more] = readDer(spki);
    const [algorithm, key] = readDer(outer!.content);
    if (more.length > 0 || toHex(algorithm!.whole) !== RSA_ENCRYPTION) return false;
    // The bit string's first byte counts unused bits: none.
    const [modulus] = readDer(readDer(key!.content.subarray(1))[0]!.content);
    const digits = modulus!.content;
    return digits.length === 385 && digits[0] === 0 && digits[1]! >= 0x80;
  } catch {
    return false;
  }
}
