import { randomBytes, type KeyObject } from 'node:crypto';
import { P12Signer } from '@signpdf/signer-p12';
import { SignPdf } from '@signpdf/signpdf';
import forge from 'node-forge';

/** The paper key with its certificate in the form the signer takes; it never leaves memory. */
function pack(privateKey: KeyObject, certificate: Buffer): { p12: Buffer; passphrase: string } {
  const key = forge.pki.privateKeyFromPem(
    privateKey.export({ type: 'pkcs8', format: 'pem' }).toString(),
  );
  const cert = forge.pki.certificateFromAsn1(forge.asn1.fromDer(certificate.toString('binary')));
  const passphrase = randomBytes(16).toString('hex');
  const asn1 = forge.pkcs12.toPkcs12Asn1(key, [cert], passphrase, { algorithm: 'aes256' });
  return { p12: Buffer.from(forge.asn1.toDer(asn1).getBytes(), 'binary'), passphrase };
}

/**
 * Signs a paper that has a signature field: PKCS#7, detached, RSA with SHA-256, over every byte of the
 * file but the signature's own.
 */
export function signPaper(
  pdf: Buffer,
  { privateKey, certificate, now }: { privateKey: KeyObject; certificate: Buffer; now: Date },
): Promise<Buffer> {
  const { p12, passphrase } = pack(privateKey, certificate);
  return new SignPdf().sign(pdf, new P12Signer(p12, { passphrase }), now);
}
