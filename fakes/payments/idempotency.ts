// Idempotency keys as the provider treats them: the first answer is replayed, other parameters are refused, for a day.
import { createHash } from 'node:crypto';
import { ProviderError } from './errors';
import type { State } from './state';

const KEPT_MS = 24 * 60 * 60 * 1000;

export interface Answer {
  readonly status: number;
  readonly body: string;
  readonly requestId: string;
}

export interface Idempotency {
  /**
   * The answer to replay, or null when the call is new; then the key is taken until `finish`.
   * @throws ProviderError 400 for other parameters, 409 while the first call still runs
   */
  begin(key: string, fingerprint: string): Answer | null;
  /** Keeps the answer under the key, or with null sets the key free again. */
  finish(key: string, fingerprint: string, answer: Answer | null): void;
}

/** Two calls are the same when method, path, account and parameters are, in whatever order the parameters came. */
export function fingerprintOf(method: string, path: string, account: string, form: string): string {
  const parameters = Array.from(new URLSearchParams(form), ([name, value]) => `${name}=${value}`).sort();
  return createHash('sha256')
    .update([method, path, account, ...parameters].join('\n'))
    .digest('hex');
}

export function createIdempotency(state: State, now: () => number): Idempotency {
  const running = new Map<string, string>();
  const mismatch = (key: string): ProviderError =>
    new ProviderError(400, {
      type: 'idempotency_error',
      message: `Keys for idempotent requests can only be used with the same parameters they were first used with: '${key}'.`,
    });
  return {
    begin: (key, fingerprint) => {
      const current = running.get(key);
      if (current !== undefined && current !== fingerprint) throw mismatch(key);
      if (current !== undefined) {
        throw new ProviderError(409, {
          type: 'idempotency_error',
          code: 'idempotency_key_in_use',
          message: `Another request with the same key is still running: '${key}'.`,
        });
      }
      const saved = state.idempotency.get(key);
      if (saved !== undefined && now() - saved.savedAtMs < KEPT_MS) {
        if (saved.fingerprint !== fingerprint) throw mismatch(key);
        return { status: saved.status, body: saved.body, requestId: saved.requestId };
      }
      running.set(key, fingerprint);
      return null;
    },
    finish: (key, fingerprint, answer) => {
      running.delete(key);
      if (answer !== null) state.idempotency.put(key, { fingerprint, ...answer, savedAtMs: now() });
    },
  };
}
