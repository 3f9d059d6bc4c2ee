// Puts the mail stand-in together and starts it: in its own process, or inside a test.
import { join } from 'node:path';
import { createFaults, type Faults } from '../faults';
import { answerFaults, listen, sendJson } from '../http';
import { answerInbox } from './inbox';
import { openMessages, type Message } from './messages';
import { startSmtp } from './smtp';

const MAX_BODY_BYTES = 100_000;

interface MailFakeOptions {
  readonly host?: string;
  /** 0 takes a free port. */
  readonly smtpPort?: number;
  readonly webPort?: number;
  /** The base folder; the stand-in keeps its state in `mail` below it, or in memory without one. */
  readonly dataDir?: string | undefined;
  readonly now?: () => number;
}

export interface MailFake {
  readonly smtpUrl: string;
  readonly smtpPort: number;
  /** The inbox. */
  readonly url: string;
  readonly webPort: number;
  readonly faults: Faults;
  /** Newest first. */
  messages(to?: string): Message[];
  clear(): void;
  close(): Promise<void>;
}

export async function startMailFake(options: MailFakeOptions = {}): Promise<MailFake> {
  const host = options.host ?? '127.0.0.1';
  const directory = options.dataDir === undefined ? undefined : join(options.dataDir, 'mail');
  const messages = openMessages(directory, options.now ?? (() => Date.now()));
  const faults = createFaults();
  const web = await listen({
    host,
    port: options.webPort ?? 0,
    maxBodyBytes: MAX_BODY_BYTES,
    handle: async (asked) => {
      if (answerFaults(asked, faults)) return;
      if (asked.url.pathname === '/_state')
        return sendJson(asked.response, 200, { messages: messages.list(), faults: faults.list() });
      await answerInbox(messages, asked);
    },
    failed: (error, request, response) => {
      process.stderr.write(`mail stand-in: ${request.method} ${request.url}: ${String(error)}\n`);
      if (response.headersSent) response.destroy();
      else sendJson(response, 500, { error: 'The stand-in failed.' });
    },
  });
  const smtp = await startSmtp({ host, port: options.smtpPort ?? 0, messages, faults }).catch(
    async (error: unknown) => {
      await web.close();
      throw error;
    },
  );
  return {
    smtpUrl: `smtp://${host}:${smtp.port}`,
    smtpPort: smtp.port,
    url: web.url,
    webPort: web.port,
    faults,
    messages: (to) => messages.list(to),
    clear: () => messages.clear(),
    close: async () => {
      await Promise.all([web.close(), smtp.close()]);
      messages.close();
    },
  };
}
