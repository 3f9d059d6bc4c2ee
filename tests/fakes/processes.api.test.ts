// The stand-ins as processes of their own: ready line, bad settings, a kill at any moment, a clean stop.
import { GetObjectCommand, PutObjectCommand } from '@aws-sdk/client-s3';
import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import nodemailer from 'nodemailer';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { BUCKET, clientFor as storageClient, CREDENTIALS } from './storage-given';
import { clientFor as paymentsClient, SECRET_KEY, sessionParams, WEBHOOK_SECRET } from './payments-given';

let dataDir: string;
const running: ChildProcess[] = [];
beforeEach(() => {
  dataDir = mkdtempSync(join(tmpdir(), 'fakes-test-'));
});
afterEach(() => {
  for (const child of running.splice(0)) child.kill('SIGKILL');
  rmSync(dataDir, { recursive: true });
});

interface Started {
  readonly child: ChildProcess;
  readonly ready: string;
}

function launch(name: string, env: Record<string, string>): ChildProcess {
  const child = spawn(process.execPath, ['--import', 'tsx', `fakes/${name}/main.ts`], {
    env: { PATH: process.env['PATH'], DATA_DIR: dataDir, ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  running.push(child);
  return child;
}

async function start(name: string, env: Record<string, string>): Promise<Started> {
  const child = launch(name, env);
  let errors = '';
  child.stderr?.on('data', (part: Buffer) => (errors += part.toString()));
  const ready = await new Promise<string>((resolve, reject) => {
    child.stdout?.once('data', (part: Buffer) => resolve(part.toString()));
    child.once('exit', () => reject(new Error(errors)));
  });
  return { child, ready };
}

async function end({ child }: Started, signal: NodeJS.Signals): Promise<number | null> {
  const exited = once(child, 'exit');
  child.kill(signal);
  await exited;
  return child.exitCode;
}

const portIn = (ready: string, after: string): number =>
  Number(new RegExp(`${after}127\\.0\\.0\\.1:(\\d+)`).exec(ready)?.[1]);

const at = (port: number): { url: string; port: number } => ({ url: `http://127.0.0.1:${port}`, port });

test(
  'when payments is killed right after an answer, then what it answered is there again',
  { timeout: 30_000 },
  async () => {
    const env = { PAYMENTS_PORT: '0', STRIPE_SECRET_KEY: SECRET_KEY, STRIPE_WEBHOOK_SECRET: WEBHOOK_SECRET };
    const first = await start('payments', env);
    expect(first.ready).toMatch(/^Payments stand-in ready at http:\/\/127\.0\.0\.1:\d+\n$/);
    const ids: string[] = [];
    for (let round = 0; round < 20; round += 1) {
      const stripe = paymentsClient(at(portIn(first.ready, 'http://')));
      ids.unshift(
        (await stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: `open-${round}` })).id,
      );
    }
    await end(first, 'SIGKILL');
    const second = await start('payments', env);
    const stripe = paymentsClient(at(portIn(second.ready, 'http://')));
    const sessions = await stripe.checkout.sessions.list({ limit: 100 });
    expect(sessions.data.map((session) => session.id)).toEqual(ids);
    const again = await stripe.checkout.sessions.create(sessionParams(), { idempotencyKey: 'open-19' });
    expect(again.id).toBe(ids[0]);
    expect(await end(second, 'SIGTERM')).toBe(0);
  },
);

test(
  'when storage is killed right after an answer, then the object is there again',
  { timeout: 30_000 },
  async () => {
    const env = {
      STORAGE_PORT: '0',
      S3_ACCESS_KEY_ID: CREDENTIALS.accessKeyId,
      S3_SECRET_ACCESS_KEY: CREDENTIALS.secretAccessKey,
      S3_BUCKET: BUCKET,
    };
    const first = await start('storage', env);
    expect(first.ready).toMatch(/^Storage stand-in ready at http:\/\/127\.0\.0\.1:\d+\n$/);
    await storageClient(at(portIn(first.ready, 'http://'))).send(
      new PutObjectCommand({ Bucket: BUCKET, Key: 'k', Body: 'bytes' }),
    );
    await end(first, 'SIGKILL');
    const second = await start('storage', env);
    const answer = await storageClient(at(portIn(second.ready, 'http://'))).send(
      new GetObjectCommand({ Bucket: BUCKET, Key: 'k' }),
    );
    expect(await answer.Body?.transformToString()).toBe('bytes');
    expect(await end(second, 'SIGINT')).toBe(0);
  },
);

test(
  'when mail is killed right after an answer, then the mail is there again',
  { timeout: 30_000 },
  async () => {
    const env = { MAIL_PORT: '0', MAIL_WEB_PORT: '0' };
    const first = await start('mail', env);
    expect(first.ready).toMatch(
      /^Mail stand-in ready at smtp:\/\/127\.0\.0\.1:\d+, inbox at http:\/\/127\.0\.0\.1:\d+\n$/,
    );
    const transport = nodemailer.createTransport({
      host: '127.0.0.1',
      port: portIn(first.ready, 'smtp://'),
      ignoreTLS: true,
    });
    await transport.sendMail({ from: 'a@example.com', to: 'b@example.com', subject: 'kept', text: 'text' });
    await end(first, 'SIGKILL');
    const second = await start('mail', env);
    const list: unknown = await (
      await fetch(`http://127.0.0.1:${portIn(second.ready, 'http://')}/api/messages`)
    ).json();
    expect(list).toMatchObject([{ to: 'b@example.com', subject: 'kept' }]);
    expect(await end(second, 'SIGTERM')).toBe(0);
  },
);

test('when settings are bad, then each is named and nothing starts', { timeout: 30_000 }, async () => {
  await expect(start('payments', { PAYMENTS_PORT: 'many', STRIPE_SECRET_KEY: SECRET_KEY })).rejects.toThrow(
    /PAYMENTS_PORT: .*\n {2}STRIPE_WEBHOOK_SECRET: /,
  );
});
