import { randomUUID } from 'node:crypto';
import { mkdir, open, readFile, readdir, rename, rm } from 'node:fs/promises';
import { join } from 'node:path';

/** One mail as it was handed over: the envelope, and the message byte for byte. */
export interface StoredMail {
  /** Sorts by time of arrival. */
  id: string;
  received: string;
  from: string;
  /** The addresses it was delivered to, whatever its headers say. */
  to: string[];
  /** The message, each character one byte. */
  raw: string;
}

const fileName = /^\d{15}-[0-9a-f-]{36}\.json$/;

/** The caught mails on the disk, one file each. A file appears whole or not at all. */
export class MailFolder {
  private constructor(private readonly directory: string) {}

  /** Opens the folder, making it when missing. */
  static async open(directory: string): Promise<MailFolder> {
    await mkdir(directory, { recursive: true });
    return new MailFolder(directory);
  }

  /** Keeps a mail; when this resolves it is on the disk. */
  async keep(from: string, to: string[], message: Buffer): Promise<StoredMail> {
    const now = Date.now();
    const mail: StoredMail = {
      id: `${String(now).padStart(15, '0')}-${randomUUID()}`,
      received: new Date(now).toISOString(),
      from,
      to,
      raw: message.toString('latin1'),
    };
    const making = join(this.directory, `${mail.id}.making`);
    const file = await open(making, 'w');
    await file.writeFile(JSON.stringify(mail));
    await file.sync();
    await file.close();
    await rename(making, join(this.directory, `${mail.id}.json`));
    return mail;
  }

  /** All mails, oldest first. */
  async all(): Promise<StoredMail[]> {
    const names = (await readdir(this.directory)).filter((name) => fileName.test(name)).sort();
    return Promise.all(names.map((name) => this.read(name)));
  }

  /** One mail, or undefined when there is none with this id. */
  async find(id: string): Promise<StoredMail | undefined> {
    const name = `${id}.json`;
    return fileName.test(name) ? this.read(name).catch(() => undefined) : undefined;
  }

  /** Throws every mail away. */
  async empty(): Promise<void> {
    const names = await readdir(this.directory);
    await Promise.all(names.map((name) => rm(join(this.directory, name), { force: true })));
  }

  private async read(name: string): Promise<StoredMail> {
    return JSON.parse(await readFile(join(this.directory, name), 'utf8')) as StoredMail;
  }
}

/** The message's bytes. */
export const messageBytes = (mail: StoredMail) => Buffer.from(mail.raw, 'latin1');
