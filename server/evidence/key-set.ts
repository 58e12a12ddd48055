import { createPublicKey } from 'node:crypto';
import { publicKeys } from './current-key.ts';

/** A public key as a JSON Web Key (RFC 7517); `status` is the log's. */
export type PublishedKey = JsonWebKey & {
  kid: string;
  use: 'sig';
  /** RFC 9864; an RSA key names none, because papers are signed by PKCS#7. */
  alg?: 'Ed25519';
  witnessmark: { use: string; status: 'current' | 'retired' | 'revoked'; leaf: number };
};

/** The shop's public keys as a JSON Web Key Set. It repeats the log's key leaves and adds nothing. */
export async function keySet(): Promise<{ keys: PublishedKey[] }> {
  const keys = await publicKeys();
  return {
    keys: keys.map(({ id, use, alg, spki, addedAtLeaf, retiredAtLeaf, revokedAtLeaf }) => ({
      ...createPublicKey({ key: spki, format: 'der', type: 'spki' }).export({ format: 'jwk' }),
      kid: id,
      use: 'sig',
      ...(alg === 'Ed25519' ? { alg } : {}),
      witnessmark: {
        use,
        status: revokedAtLeaf !== null ? 'revoked' : retiredAtLeaf !== null ? 'retired' : 'current',
        leaf: addedAtLeaf,
      },
    })),
  };
}
