import { createTransport, type Transporter } from 'nodemailer';
import { env, isLoopback } from '../env.ts';

const SECOND_MS = 1000;

/** The way to the mail server of SMTP_URL. Off this machine it insists on TLS. */
export function mailTransport({
  url = env().SMTP_URL,
  patienceMs = 10 * SECOND_MS,
} = {}): Transporter {
  return createTransport({
    url,
    requireTLS: !isLoopback(url) && url.startsWith('smtp:'),
    connectionTimeout: patienceMs,
    greetingTimeout: patienceMs,
    socketTimeout: patienceMs,
    dnsTimeout: patienceMs,
    // The library then opens neither files nor addresses that might stand in a mail.
    disableFileAccess: true,
    disableUrlAccess: true,
  });
}
