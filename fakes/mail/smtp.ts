// Takes mail over SMTP, and goes wrong at the end of a message when a fault asks for it.
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import type { Fault, FaultKind, Faults } from '../faults';
import { faultMs, pause, TIMEOUT_MS } from '../http';
import type { Messages } from './messages';

const MAX_MESSAGE_BYTES = 25 * 1024 * 1024;
const SLOW_MS = 5_000;

const FAULTS: readonly FaultKind[] = [
  'timeout_before',
  'timeout_after',
  'status',
  'slow',
  'late_answer',
  'hang',
];

class Refusal extends Error {
  readonly responseCode: number;
  constructor(responseCode: number, message: string) {
    super(message);
    this.responseCode = responseCode;
  }
}

interface Smtp {
  readonly port: number;
  close(): Promise<void>;
}

async function readAll(stream: SMTPServerDataStream): Promise<Buffer> {
  const parts: Buffer[] = [];
  const chunks: AsyncIterable<Buffer> = stream;
  for await (const chunk of chunks) parts.push(chunk);
  if (stream.sizeExceeded) throw new Refusal(552, 'Message exceeds fixed maximum message size');
  return Buffer.concat(parts);
}

const injected = (fault: Fault): Refusal => {
  const code = fault.code ?? 451;
  return new Refusal(code, code < 500 ? 'Try again later' : 'Mailbox unavailable');
};

/** What becomes of one message: stored or not, then answered, refused, or (null) left without an answer. */
async function take(
  messages: Messages,
  fault: Fault | null,
  raw: Buffer,
  session: SMTPServerSession,
): Promise<string | null> {
  const { mailFrom, rcptTo } = session.envelope;
  if (fault?.kind === 'status') throw injected(fault);
  if (fault?.kind === 'hang' || fault?.kind === 'timeout_before') return null;
  if (fault?.kind === 'slow') await pause(faultMs(fault, SLOW_MS));
  const message = await messages.receive(raw, {
    from: mailFrom === false ? '' : mailFrom.address,
    to: rcptTo.map((recipient) => recipient.address),
  });
  if (fault?.kind === 'timeout_after') return null;
  if (fault?.kind === 'late_answer') await pause(faultMs(fault, SLOW_MS));
  return `Message taken as ${message.id}`;
}

export async function startSmtp(settings: {
  host: string;
  port: number;
  messages: Messages;
  faults: Faults;
}): Promise<Smtp> {
  const { messages, faults } = settings;
  const drop = (session: SMTPServerSession): void => {
    for (const connection of server.connections) if (connection.id === session.id) connection.close();
  };
  const server = new SMTPServer({
    name: 'mail.stand-in.example',
    authOptional: true,
    allowInsecureAuth: true,
    disabledCommands: ['STARTTLS'],
    disableReverseLookup: true,
    size: MAX_MESSAGE_BYTES,
    closeTimeout: 100,
    onAuth: (auth, _session, done) => done(null, { user: auth.username ?? 'anybody' }),
    onData: (stream, session, done) => {
      const recipients = session.envelope.rcptTo.map((recipient) => recipient.address);
      const answer = async (): Promise<void> => {
        const raw = await readAll(stream);
        const fault = faults.take(['DATA', ...recipients, ...recipients.map((to) => `SEND ${to}`)], FAULTS);
        const text = await take(messages, fault, raw, session);
        if (text !== null) return done(null, text);
        // A hang is ended by the caller alone.
        if (fault?.kind !== 'hang')
          setTimeout(() => drop(session), fault ? faultMs(fault, TIMEOUT_MS) : 0).unref();
      };
      answer().catch((error: unknown) => done(error instanceof Error ? error : new Error('failed')));
    },
  });
  // A caller that hangs up in the middle is no concern of the stand-in.
  server.on('error', () => undefined);
  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject);
    server.listen(settings.port, settings.host, resolve);
  });
  const address = server.server.address();
  return {
    port: typeof address === 'object' && address !== null ? address.port : settings.port,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}
