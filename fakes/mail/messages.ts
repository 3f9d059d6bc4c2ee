// The mails that arrived: what a reader needs of each in a journal, the mail as it came in a file.
import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { simpleParser, type AddressObject, type Attachment } from 'mailparser';
import { z } from 'zod';
import { openFiles } from '../files';
import { openJournal } from '../journal';

const MOST_MESSAGES = 5_000;

const messageShape = z.object({
  id: z.string(),
  /** The sender's own name for the mail: two deliveries of one mail share it. */
  messageId: z.string().nullable(),
  from: z.string(),
  /** The addresses it was delivered to, separated by a comma. */
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  html: z.string().nullable(),
  at: z.string(),
  attachments: z.array(z.object({ filename: z.string(), contentType: z.string(), bytes: z.number().int() })),
});

export type Message = z.output<typeof messageShape>;

export interface Messages {
  receive(raw: Buffer, envelope: { from: string; to: readonly string[] }): Promise<Message>;
  /** Newest first; with an address only what was delivered to it. */
  list(to?: string | null): Message[];
  get(id: string): Message | undefined;
  raw(id: string): Promise<Buffer>;
  attachment(id: string, index: number): Promise<Attachment | undefined>;
  clear(): void;
  close(): void;
}

const named = (from: AddressObject): string =>
  from.value.map(({ name, address }) => (name ? `${name} <${address ?? ''}>` : (address ?? ''))).join(', ');

const fileOf = (id: string): string => `${id}.eml`;

export function openMessages(directory: string | undefined, now: () => number): Messages {
  const journal = openJournal(directory);
  const messages = journal.table('messages', messageShape);
  const files = openFiles(
    directory === undefined ? undefined : join(directory, 'raw'),
    messages.all().map((message) => fileOf(message.id)),
  );
  const drop = (id: string): void => {
    messages.remove(id);
    files.drop(fileOf(id));
  };
  return {
    receive: async (raw, envelope) => {
      const mail = await simpleParser(raw);
      const id = randomBytes(9).toString('hex');
      files.write(fileOf(id), raw);
      const message = messages.put(id, {
        id,
        messageId: mail.messageId ?? null,
        from: mail.from ? named(mail.from) : envelope.from,
        to: envelope.to.join(', '),
        subject: mail.subject ?? '',
        text: mail.text ?? '',
        html: mail.html === false || mail.html === undefined ? null : mail.html,
        at: new Date(now()).toISOString(),
        attachments: mail.attachments.map((attachment) => ({
          filename: attachment.filename ?? 'unnamed',
          contentType: attachment.contentType,
          bytes: attachment.size,
        })),
      });
      for (const oldest of messages.all().slice(0, -MOST_MESSAGES)) drop(oldest.id);
      journal.flush();
      return message;
    },
    list: (to) => {
      const wanted = to?.trim().toLowerCase() ?? '';
      return messages
        .all()
        .filter((message) => wanted === '' || message.to.toLowerCase().split(', ').includes(wanted))
        .reverse();
    },
    get: (id) => messages.get(id),
    raw: (id) => files.read(fileOf(id)),
    attachment: async (id, index) => (await simpleParser(await files.read(fileOf(id)))).attachments[index],
    clear: () => {
      for (const message of messages.all()) drop(message.id);
      journal.flush();
    },
    close: () => journal.close(),
  };
}
