// Puts the object store's stand-in together and starts it: in its own process, or inside a test.
import { randomBytes } from 'node:crypto';
import type { IncomingMessage, ServerResponse } from 'node:http';
import { join } from 'node:path';
import { createFaults, type Fault, type FaultKind, type Faults } from '../faults';
import {
  answerFaults,
  BodyTooLarge,
  dropLater,
  faultMs,
  listen,
  pause,
  sendJson,
  TIMEOUT_MS,
  type Asked,
} from '../http';
import { StorageError, type StorageErrorCode } from './errors';
import { openObjects, type Objects } from './objects';
import { operationFor } from './operations';
import { splitPath, type StorageAnswer } from './request';
import { verify, type Credentials } from './sigv4';
import { document } from './xml';

const MAX_OBJECT_BYTES = 64 * 1024 * 1024;
/** Chunk headers and trailers around the object's own bytes. */
const FRAMING_BYTES = 1024 * 1024;
const SLOW_MS = 5_000;

const FAULTS: readonly FaultKind[] = [
  'timeout_before',
  'timeout_after',
  'status',
  'slow',
  'late_answer',
  'malformed',
  'hang',
];

const ANY_ORIGIN = {
  'access-control-allow-origin': '*',
  'access-control-expose-headers': 'ETag, Content-Length, Content-Range, Content-Type, Last-Modified',
  'cross-origin-resource-policy': 'cross-origin',
};

export interface StorageFakeOptions extends Partial<Credentials> {
  readonly host?: string;
  /** 0 takes a free port. */
  readonly port?: number;
  /** The base folder; the stand-in keeps its state in `storage` below it, or in memory without one. */
  readonly dataDir?: string | undefined;
  /** A bucket that is there from the start. */
  readonly bucket?: string | undefined;
  readonly maxObjectBytes?: number;
  readonly now?: () => number;
}

export interface StorageFake {
  readonly url: string;
  readonly port: number;
  readonly faults: Faults;
  close(): Promise<void>;
}

interface Store {
  readonly objects: Objects;
  readonly faults: Faults;
  readonly credentials: Credentials;
  readonly maxObjectBytes: number;
  readonly now: () => number;
}

const newRequestId = (): string => randomBytes(8).toString('hex').toUpperCase();

function send(response: ServerResponse, answer: StorageAnswer): void {
  if (response.destroyed) return;
  const xml = typeof answer.body === 'string' ? { 'content-type': 'application/xml' } : {};
  response.writeHead(answer.status, {
    ...ANY_ORIGIN,
    ...xml,
    'x-amz-request-id': newRequestId(),
    ...answer.headers,
  });
  response.end(answer.body);
}

function errorAnswer(method: string | undefined, resource: string, error: StorageError): StorageAnswer {
  const body = document('Error', {
    Code: error.code,
    Message: error.message,
    ...error.details,
    Resource: resource,
    RequestId: newRequestId(),
  });
  return { status: error.status, body: method === 'HEAD' ? undefined : body };
}

const INJECTED: Readonly<Record<number, StorageErrorCode>> = {
  403: 'AccessDenied',
  404: 'NoSuchKey',
  503: 'SlowDown',
};

/** The status is the one asked for; the code in the XML is what the real service sends with it. */
function injected(fault: Fault): StorageAnswer {
  const status = fault.code ?? 500;
  const error = new StorageError(
    INJECTED[status] ?? 'InternalError',
    'We encountered an internal error. Please try again.',
  );
  return { ...errorAnswer('GET', '', error), status };
}

function preflight(response: ServerResponse): void {
  response.writeHead(200, {
    ...ANY_ORIGIN,
    'access-control-allow-methods': 'GET, HEAD, PUT',
    'access-control-allow-headers': '*',
    'access-control-max-age': '3000',
  });
  response.end();
}

async function answer(store: Store, asked: Asked): Promise<void> {
  const { response } = asked;
  const place = splitPath(asked.rawPath);
  const operation = operationFor({ asked, ...place });
  const fault = store.faults.take([`${asked.method} ${asked.url.pathname}`, operation.name], FAULTS);
  if (fault?.kind === 'timeout_before' || fault?.kind === 'hang')
    return dropLater(response, faultMs(fault, TIMEOUT_MS));
  if (fault?.kind === 'status') return send(response, injected(fault));
  if (fault?.kind === 'slow') await pause(faultMs(fault, SLOW_MS));
  const signed = {
    method: asked.method,
    rawPath: asked.rawPath,
    query: asked.url.searchParams,
    headers: asked.headers,
  };
  const verified = verify(signed, store.credentials, store.now());
  const { objects, maxObjectBytes } = store;
  const result = await operation.run({ asked, ...place, objects, maxObjectBytes, verified });
  if (fault?.kind === 'timeout_after') return dropLater(response, faultMs(fault, TIMEOUT_MS));
  if (fault?.kind === 'late_answer') await pause(faultMs(fault, SLOW_MS));
  const body = result.body;
  const cut = fault?.kind === 'malformed' && body !== undefined ? body.slice(0, body.length / 2) : body;
  if (cut !== body) response.shouldKeepAlive = false;
  send(response, { ...result, body: cut });
}

function failed(error: unknown, request: IncomingMessage, response: ServerResponse): void {
  if (response.headersSent) return void response.destroy();
  const known =
    error instanceof StorageError
      ? error
      : error instanceof BodyTooLarge
        ? new StorageError('EntityTooLarge', 'Your proposed upload exceeds the maximum allowed size.')
        : new StorageError('InternalError', 'We encountered an internal error. Please try again.');
  if (known.code === 'InternalError')
    process.stderr.write(`storage stand-in: ${request.method} ${request.url}: ${String(error)}\n`);
  send(response, errorAnswer(request.method, (request.url ?? '/').split('?')[0] ?? '/', known));
}

export async function startStorageFake(options: StorageFakeOptions = {}): Promise<StorageFake> {
  const now = options.now ?? (() => Date.now());
  const objects = openObjects(
    options.dataDir === undefined ? undefined : join(options.dataDir, 'storage'),
    now,
  );
  if (options.bucket !== undefined) objects.makeBucket(options.bucket);
  const faults = createFaults();
  const store: Store = {
    objects,
    faults,
    credentials: {
      accessKeyId: options.accessKeyId ?? 'stand-in',
      secretAccessKey: options.secretAccessKey ?? 'stand-in-secret',
    },
    maxObjectBytes: options.maxObjectBytes ?? MAX_OBJECT_BYTES,
    now,
  };
  const server = await listen({
    host: options.host ?? '127.0.0.1',
    port: options.port ?? 0,
    maxBodyBytes: store.maxObjectBytes + FRAMING_BYTES,
    failed,
    handle: async (asked) => {
      if (answerFaults(asked, faults)) return;
      if (asked.method === 'OPTIONS') return preflight(asked.response);
      if (asked.url.pathname === '/_state') {
        const buckets = objects
          .buckets()
          .map((bucket) => ({ ...bucket, objects: objects.list(bucket.name) }));
        return sendJson(asked.response, 200, { buckets, faults: faults.list() });
      }
      await answer(store, asked);
    },
  });
  return {
    url: server.url,
    port: server.port,
    faults,
    close: async () => {
      await server.close();
      objects.close();
    },
  };
}
