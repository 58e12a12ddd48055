import { EventEmitter } from 'node:events';
import { FaultSwitch, withSwitch } from './faults.ts';
import type { Fault } from './faults.ts';
import { MailFolder } from './mail-folder.ts';
import { mailPages } from './mail-page.ts';
import { SmtpPort } from './mail-smtp.ts';
import { runAsProgram } from './stand-in.ts';
import type { StandIn } from './stand-in.ts';
import { serveLocally } from './web-server.ts';

export interface MailOptions {
  /** Where the mails are kept; made when missing. */
  directory: string;
  /** 0 chooses a free one. */
  smtpPort: number;
  /** 0 chooses a free one. */
  pagePort: number;
}

export interface Mail extends StandIn {
  /** Where to hand mails over: `smtp://127.0.0.1:3004`. */
  smtpUrl: string;
  /** Where to read them. */
  pageUrl: string;
  fault: (fault: Fault) => Promise<void>;
}

/**
 * Starts the mail catcher on 127.0.0.1: it takes every mail for every address, delivers none of them any further,
 * keeps them on the disk and shows them on a web page and as JSON. Faults touch the SMTP side alone.
 */
export async function startMail(options: MailOptions): Promise<Mail> {
  const folder = await MailFolder.open(options.directory);
  const arrivals = new EventEmitter().setMaxListeners(0);
  const faults: FaultSwitch = new FaultSwitch(({ kind }) =>
    kind === 'gone' ? smtp.close() : smtp.open(),
  );
  const smtp = new SmtpPort(options.smtpPort, faults, async (from, to, message) => {
    await folder.keep(from, to, message);
    arrivals.emit('mail');
  });
  const pages = withSwitch(faults, mailPages(folder, arrivals));
  const web = await serveLocally('The mail page', options.pagePort, pages);
  await smtp.open();
  return {
    smtpUrl: `smtp://127.0.0.1:${smtp.port}`,
    pageUrl: web.origin,
    fault: (fault) => faults.set(fault),
    stop: async () => {
      await smtp.close();
      await web.close();
    },
  };
}

await runAsProgram(import.meta.url, startMail);
