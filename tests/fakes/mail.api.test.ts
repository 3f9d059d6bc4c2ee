// The mail stand-in through nodemailer: mail in, out as JSON and as pages, faults, duplicates, restart.
import { createHash, randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import nodemailer, { type SendMailOptions } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { z } from 'zod';
import { startMailFake, type MailFake } from '../../fakes/mail/start';

let fake: MailFake;
beforeEach(async () => {
  fake = await startMailFake();
});
afterEach(() => fake.close());

const mail = {
  from: 'Spragyard <notices@spragyard.example>',
  to: 'ana@example.com',
  subject: 'Received: your core',
  text: 'Graded in 5 business days.',
  html: '<p>Graded in <b>5 business days</b>.</p>',
};

async function send(message: SendMailOptions, settings: object = {}, to: MailFake = fake) {
  const transport = nodemailer.createTransport({
    host: '127.0.0.1',
    port: to.smtpPort,
    secure: false,
    ignoreTLS: true,
    ...settings,
  });
  try {
    return await transport.sendMail(message);
  } finally {
    transport.close();
  }
}

const shape = z.object({
  id: z.string(),
  messageId: z.string().nullable(),
  from: z.string(),
  to: z.string(),
  subject: z.string(),
  text: z.string(),
  html: z.string().nullable(),
  at: z.iso.datetime(),
  attachments: z.array(z.object({ filename: z.string(), contentType: z.string(), bytes: z.number() })),
});

const list = async (query = '') =>
  z.array(shape).parse(await (await fetch(`${fake.url}/api/messages${query}`)).json());

async function newest(): Promise<z.output<typeof shape>> {
  const [message] = await list();
  if (message === undefined) throw new Error('no mail arrived');
  return message;
}

const fault = async (body: object): Promise<void> => {
  const answer = await fetch(`${fake.url}/_faults`, { method: 'POST', body: JSON.stringify(body) });
  expect(answer.status).toBe(201);
};

describe('when a mail arrives', () => {
  test('then it is listed with what it says, in any alphabet, and its attachments come back whole', async () => {
    const pdf = randomBytes(50_000);
    await send({
      ...mail,
      to: 'Żaneta <zaneta@example.com>, bo@example.com',
      subject: '№ 7 – Gehäuse größer als 日本',
      text: 'Zażółć gęślą jaźń\n.\n..leading dots',
      attachments: [{ filename: 'return tag – ä.pdf', content: pdf, contentType: 'application/pdf' }],
    });
    const message = await newest();
    expect(message).toMatchObject({
      to: 'zaneta@example.com, bo@example.com',
      from: 'Spragyard <notices@spragyard.example>',
      subject: '№ 7 – Gehäuse größer als 日本',
      html: mail.html,
      attachments: [{ filename: 'return tag – ä.pdf', contentType: 'application/pdf', bytes: 50_000 }],
    });
    expect(message.text.trim()).toBe('Zażółć gęślą jaźń\n.\n..leading dots');
    expect(Math.abs(Date.now() - Date.parse(message.at))).toBeLessThan(5_000);
    const file = await (await fetch(`${fake.url}/api/messages/${message.id}/attachments/0`)).arrayBuffer();
    const hash = (data: Buffer) => createHash('sha256').update(data).digest('hex');
    expect(hash(Buffer.from(file))).toBe(hash(pdf));
    expect((await fetch(`${fake.url}/api/messages/${message.id}/attachments/1`)).status).toBe(404);
  });

  test('then the list is newest first, by recipient when asked, and can be emptied', async () => {
    await send({ ...mail, subject: 'first' });
    await send({ ...mail, subject: 'second', to: 'bo@example.com', bcc: 'ana@example.com' });
    await send({ ...mail, subject: 'third', to: 'bo@example.com' });
    const subjects = async (query: string) => (await list(query)).map((each) => each.subject);
    expect(await subjects('')).toEqual(['third', 'second', 'first']);
    expect(await subjects('?to=Ana@example.com')).toEqual(['second', 'first']);
    const { id } = await newest();
    expect(await (await fetch(`${fake.url}/api/messages/${id}`)).json()).toMatchObject({ subject: 'third' });
    expect((await fetch(`${fake.url}/api/messages`, { method: 'DELETE' })).status).toBe(204);
    expect(await subjects('')).toEqual([]);
    expect((await fetch(`${fake.url}/api/messages/${id}`)).status).toBe(404);
  });

  test('then one sent twice under one Message-ID is there twice', async () => {
    const again = { ...mail, messageId: '<order-7-delivered@spragyard.example>' };
    await send(again);
    await send(again);
    const ids = (await list()).map((each) => each.messageId);
    expect(ids).toEqual(Array(2).fill('<order-7-delivered@spragyard.example>'));
  });

  test('then a sender with a name and password is let in as well', async () => {
    await send(mail, { auth: { user: 'spragyard', pass: 'secret' } });
    expect(fake.messages('ana@example.com')).toHaveLength(1);
  });

  test('then its page shows it as text and in a frame without script', async () => {
    await send({
      ...mail,
      subject: '<script>alert(1)</script>',
      html: '<script>alert(1)</script><a href="http://x.example">go</a>',
    });
    const { id } = await newest();
    const inbox = await (await fetch(fake.url)).text();
    expect(inbox).toContain('&lt;script&gt;alert(1)&lt;/script&gt;');
    const page = await (await fetch(`${fake.url}/messages/${id}`)).text();
    expect(page).not.toContain('<script');
    expect(page).toContain('sandbox="allow-popups allow-popups-to-escape-sandbox"');
    const frame = await fetch(`${fake.url}/messages/${id}/html`);
    expect(frame.headers.get('content-security-policy')).toMatch(/default-src 'none'.*sandbox/);
    expect((await fetch(`${fake.url}/messages/abc`)).status).toBe(404);
  });
});

describe('when the mail server is made to fail', () => {
  test.each([451, 550])('then %i refuses a mail to the one it is meant for, once', async (code) => {
    await fault({ match: 'ana@example.com', kind: 'status', code });
    await send({ ...mail, to: 'bo@example.com' });
    await expect(send(mail)).rejects.toMatchObject({ responseCode: code });
    await send(mail);
    expect(fake.messages().map((each) => each.to)).toEqual(['ana@example.com', 'bo@example.com']);
  });

  test.each([
    ['hang', 0],
    ['timeout_before', 0],
    ['timeout_after', 1],
  ])('then with %s the sender gets no answer and %i mail is there', async (kind, stored) => {
    await fault({ match: '*', kind });
    await expect(send(mail, { socketTimeout: 200 })).rejects.toMatchObject({ code: 'ETIMEDOUT' });
    expect(fake.messages()).toHaveLength(stored);
  });

  test('then a time-out with a length ends by a closed connection', async () => {
    await fault({ match: 'DATA', kind: 'timeout_after', ms: 50 });
    const began = Date.now();
    await expect(send(mail)).rejects.toThrow();
    expect(Date.now() - began).toBeLessThan(3_000);
    expect(await (await fetch(`${fake.url}/_state`)).json()).toMatchObject({ messages: [{ to: mail.to }] });
  });
});

test('when the stand-in is started again, then the mail is still there', async () => {
  const dataDir = mkdtempSync(join(tmpdir(), 'fakes-test-'));
  try {
    const first = await startMailFake({ dataDir });
    await send({ ...mail, attachments: [{ filename: 'a.txt', content: 'bytes' }] }, {}, first);
    const before = first.messages();
    await first.close();
    const second = await startMailFake({ dataDir });
    expect(second.messages()).toEqual(before);
    const attachment = await fetch(`${second.url}/api/messages/${before[0]?.id}/attachments/0`);
    expect(await attachment.text()).toBe('bytes');
    await second.close();
  } finally {
    rmSync(dataDir, { recursive: true });
  }
});
