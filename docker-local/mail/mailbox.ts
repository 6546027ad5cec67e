import { randomBytes } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync } from 'node:fs';
import { rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { readMessage, type MessageSummary } from './read-message';

export interface StoredMessage extends MessageSummary {
  id: string;
  receivedAt: string;
  /** The addresses given to the server; they are who really gets the message. */
  recipients: string[];
  emlFile: string;
}

/** A folder of messages: one .eml each, with a .json beside it that appears last and makes it count. */
export class Mailbox {
  constructor(private readonly folder: string) {
    mkdirSync(folder, { recursive: true });
  }

  async keep(raw: Buffer, recipients: string[]): Promise<StoredMessage> {
    const receivedAt = new Date().toISOString();
    const id = `${receivedAt.replace(/[:.]/g, '-')}-${randomBytes(4).toString('hex')}`;
    const message = {
      id,
      receivedAt,
      recipients,
      emlFile: `${id}.eml`,
      ...readMessage(raw.toString('latin1')),
    };
    await writeFile(join(this.folder, message.emlFile), raw);
    await writeFile(join(this.folder, `${id}.new`), JSON.stringify(message, null, 2));
    await rename(join(this.folder, `${id}.new`), join(this.folder, `${id}.json`));
    return message;
  }

  /** Newest first. */
  list(): StoredMessage[] {
    const names = readdirSync(this.folder).filter((name) => name.endsWith('.json'));
    const read = (name: string) => JSON.parse(readFileSync(join(this.folder, name), 'utf8')) as StoredMessage;
    return names.sort().reverse().map(read);
  }
}
