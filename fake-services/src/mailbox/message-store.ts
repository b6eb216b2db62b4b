import { randomBytes } from 'node:crypto';
import { EventEmitter } from 'node:events';
import { mkdir, readdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { MailEnvelope, StoredMail } from './mail-types.js';
import { matcherOf } from './message-filter.js';
import type { MailFilter } from './message-filter.js';
import { parseMessage } from './parse-message.js';

/**
 * The mails on disk, one `.eml` with the raw bytes and one `.json` with the envelope each. The envelope is written last:
 * a mail without one was never answered for, so its sender sends it again.
 */
export class MessageStore {
  readonly #arrivals = new EventEmitter<{ mail: [StoredMail] }>().setMaxListeners(0);
  readonly #mails = new Map<string, StoredMail>();
  #lastSequence = 0;
  #queue: Promise<unknown> = Promise.resolve();

  private constructor(private readonly directory: string) {}

  /** Opens a folder, made when missing, with the mails of earlier runs. */
  static async open(directory: string): Promise<MessageStore> {
    await mkdir(directory, { recursive: true });
    const store = new MessageStore(directory);
    await store.#load();
    return store;
  }

  /** Keeps a mail; once this resolves it is on disk. */
  add(sender: string, recipients: string[], raw: Buffer): Promise<StoredMail> {
    return this.#exclusively(async () => {
      const sequence = this.#lastSequence + 1;
      const envelope: MailEnvelope = {
        id: `${String(sequence).padStart(6, '0')}-${randomBytes(4).toString('hex')}`,
        sequence,
        receivedAt: new Date().toISOString(),
        sender,
        recipients: [...new Set(recipients.map((address) => address.toLowerCase()))],
      };
      const mail = { envelope, content: await parseMessage(raw) };
      await this.#write(`${envelope.id}.eml`, raw);
      await this.#write(`${envelope.id}.json`, JSON.stringify(envelope));
      this.#lastSequence = sequence;
      this.#mails.set(envelope.id, mail);
      this.#arrivals.emit('mail', mail);
      return mail;
    });
  }

  /**
   * Mails that pass the filter, newest first.
   * @throws FilterError
   */
  list(filter: MailFilter = {}): StoredMail[] {
    return [...this.#mails.values()]
      .filter(matcherOf(filter))
      .sort((one, other) => other.envelope.sequence - one.envelope.sequence);
  }

  /**
   * The newest mail that passes the filter, as soon as there is one.
   * @throws Error after `timeoutMs` milliseconds without; FilterError
   */
  async waitFor(filter: MailFilter = {}, timeoutMs: number): Promise<StoredMail> {
    const isWanted = matcherOf(filter);
    const [newest] = this.list(filter);
    if (newest) return newest;
    return new Promise((resolve, reject) => {
      const finish = () => {
        clearTimeout(timer);
        this.#arrivals.off('mail', look);
      };
      const look = (mail: StoredMail) => {
        if (!isWanted(mail)) return;
        finish();
        resolve(mail);
      };
      const timer = setTimeout(() => {
        finish();
        reject(new Error(`No mail for ${JSON.stringify(filter)} within ${timeoutMs} ms.`));
      }, timeoutMs);
      this.#arrivals.on('mail', look);
    });
  }

  find(id: string): StoredMail | null {
    return this.#mails.get(id) ?? null;
  }

  /** The bytes as they came in, null for an unknown id. */
  async findRaw(id: string): Promise<Buffer | null> {
    return this.#mails.has(id) ? readFile(this.#path(`${id}.eml`)) : null;
  }

  /** Deletes every mail and tells how many there were. */
  clear(): Promise<number> {
    return this.#exclusively(async () => {
      const ids = [...this.#mails.keys()];
      // The envelope goes first, so that a kill in between leaves nothing half there.
      for (const id of ids) await rm(this.#path(`${id}.json`), { force: true });
      for (const id of ids) await rm(this.#path(`${id}.eml`), { force: true });
      this.#mails.clear();
      return ids.length;
    });
  }

  /** Resolves when nothing is being written any more. */
  async settle(): Promise<void> {
    await this.#exclusively(async () => undefined);
  }

  async #load(): Promise<void> {
    const names = await readdir(this.directory);
    for (const name of names.filter((each) => each.endsWith('.tmp'))) await rm(this.#path(name), { force: true });
    const ids = names.filter((name) => name.endsWith('.json')).map((name) => name.slice(0, -'.json'.length));
    for (const id of ids.sort()) {
      const envelope = JSON.parse(await readFile(this.#path(`${id}.json`), 'utf8')) as MailEnvelope;
      const content = await parseMessage(await readFile(this.#path(`${id}.eml`)));
      this.#mails.set(id, { envelope, content });
      this.#lastSequence = Math.max(this.#lastSequence, envelope.sequence);
    }
  }

  /** One change at a time; a failed one does not stop those behind it. */
  #exclusively<T>(change: () => Promise<T>): Promise<T> {
    const result = this.#queue.then(change);
    this.#queue = result.catch(() => undefined);
    return result;
  }

  async #write(name: string, data: Buffer | string): Promise<void> {
    await writeFile(this.#path(`${name}.tmp`), data);
    await rename(this.#path(`${name}.tmp`), this.#path(name));
  }

  #path(name: string): string {
    return join(this.directory, name);
  }
}
