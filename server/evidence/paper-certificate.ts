import { createPublicKey, randomBytes, type KeyObject } from 'node:crypto';
import forge from 'node-forge';

const YEARS = 20;

/**
 * A self-signed certificate for the paper key: PDF readers want one to check a signature. They do
 * not know the shop and say so; whose key it is, is told by the witness log.
 * @param name the shop's name, shown by PDF readers as the signer
 * @returns DER of an X.509 certificate, SHA-256 with RSA, for signing only
 */
export function paperCertificate(privateKey: KeyObject, name: string, now: Date): Buffer {
  const certificate = forge.pki.createCertificate();
  const publicPem = createPublicKey(privateKey).export({ type: 'spki', format: 'pem' }) as string;
  certificate.publicKey = forge.pki.publicKeyFromPem(publicPem);
  // The first bit must be 0: a serial number is a positive integer (RFC 5280, 4.1.2.2).
  certificate.serialNumber = `01${randomBytes(15).toString('hex')}`;
  certificate.validity.notBefore = new Date(now.getTime() - 60_000);
  certificate.validity.notAfter = new Date(now);
  certificate.validity.notAfter.setUTCFullYear(now.getUTCFullYear() + YEARS);
  const subject = [
    { name: 'commonName', value: name, valueTagClass: forge.asn1.Type.UTF8 as never },
  ];
  certificate.setSubject(subject);
  certificate.setIssuer(subject);
  certificate.setExtensions([
    { name: 'basicConstraints', cA: false, critical: true },
    { name: 'keyUsage', digitalSignature: true, nonRepudiation: true, critical: true },
  ]);
  const privatePem = privateKey.export({ type: 'pkcs8', format: 'pem' }) as string;
  certificate.sign(forge.pki.privateKeyFromPem(privatePem), forge.md.sha256.create());
  const der = forge.asn1.toDer(forge.pki.certificateToAsn1(certificate)).getBytes();
  return Buffer.from(der, 'binary');
}
