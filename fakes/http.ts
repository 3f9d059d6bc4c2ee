// The small HTTP server under the stand-ins: whole bodies, plain answers, a close that does not wait for anybody.
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import { z } from 'zod';
import type { Fault, Faults } from './faults';

export interface Asked {
  readonly method: string;
  /** The path as it was sent, still percent-encoded. */
  readonly rawPath: string;
  readonly url: URL;
  readonly headers: IncomingMessage['headers'];
  readonly body: Buffer;
  readonly request: IncomingMessage;
  readonly response: ServerResponse;
}

export interface Listening {
  readonly port: number;
  readonly url: string;
  close(): Promise<void>;
}

export class BodyTooLarge extends Error {}

export const pause = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms));

async function readBody(request: IncomingMessage, maxBytes: number): Promise<Buffer> {
  const parts: Buffer[] = [];
  let bytes = 0;
  const chunks: AsyncIterable<Buffer> = request;
  for await (const chunk of chunks) {
    bytes += chunk.byteLength;
    if (bytes <= maxBytes) parts.push(chunk);
  }
  if (bytes > maxBytes) throw new BodyTooLarge(`more than ${maxBytes} bytes`);
  return Buffer.concat(parts);
}

/** Starts a server; `handle` answers every request, `failed` what `handle` threw. */
export async function listen(settings: {
  host: string;
  port: number;
  maxBodyBytes: number;
  handle(asked: Asked): Promise<void> | void;
  failed(error: unknown, request: IncomingMessage, response: ServerResponse): void;
}): Promise<Listening> {
  const server = createServer((request, response) => {
    const target = request.url ?? '/';
    const answer = async (): Promise<void> => {
      await settings.handle({
        method: request.method ?? 'GET',
        rawPath: target.split('?')[0] ?? '/',
        url: new URL(`http://${request.headers.host ?? settings.host}${target}`),
        headers: request.headers,
        body: await readBody(request, settings.maxBodyBytes),
        request,
        response,
      });
    };
    answer().catch((error: unknown) => settings.failed(error, request, response));
  });
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject);
    server.listen(settings.port, settings.host, resolve);
  });
  const address = server.address();
  const port = typeof address === 'object' && address !== null ? address.port : settings.port;
  return {
    port,
    url: `http://${settings.host}:${port}`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

export function sendJson(
  response: ServerResponse,
  status: number,
  value: unknown,
  headers: Readonly<Record<string, string>> = {},
): void {
  if (response.destroyed) return;
  response.writeHead(status, { 'content-type': 'application/json; charset=utf-8', ...headers });
  response.end(`${JSON.stringify(value, null, 2)}\n`);
}

export function sendHtml(response: ServerResponse, status: number, html: string): void {
  if (response.destroyed) return;
  response.writeHead(status, {
    'content-type': 'text/html; charset=utf-8',
    'cache-control': 'no-store',
    // The pages carry no script; inline style is theirs, and mails shown inside a frame inherit this.
    'content-security-policy':
      "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-src 'self'; base-uri 'none'",
    'x-content-type-options': 'nosniff',
    'referrer-policy': 'no-referrer',
  });
  response.end(html);
}

/** Leaves the caller without an answer: the connection breaks after `ms`, or when the caller gives up. */
export function dropLater(response: ServerResponse, ms: number): void {
  const timer = setTimeout(() => response.destroy(), ms);
  timer.unref();
  response.once('close', () => clearTimeout(timer));
}

/** Long enough for any caller to give up first. */
export const TIMEOUT_MS = 30_000;

export const faultMs = (fault: Fault, otherwise: number): number => fault.ms ?? otherwise;

/** `GET`, `POST` and `DELETE /_faults`, the same for every stand-in. True when it answered. */
export function answerFaults(asked: Asked, faults: Faults): boolean {
  if (asked.url.pathname !== '/_faults') return false;
  const { response } = asked;
  if (asked.method === 'GET') sendJson(response, 200, { items: faults.list() });
  else if (asked.method === 'DELETE') {
    faults.clear();
    sendJson(response, 200, { items: [] });
  } else if (asked.method === 'POST') {
    try {
      sendJson(response, 201, faults.add(JSON.parse(asked.body.toString('utf8') || '{}')));
    } catch (error) {
      if (!(error instanceof z.ZodError) && !(error instanceof SyntaxError)) throw error;
      sendJson(response, 422, { error: error instanceof z.ZodError ? z.prettifyError(error) : 'not JSON' });
    }
  } else sendJson(response, 405, { error: 'GET, POST or DELETE' });
  return true;
}
