// The provider's error object, and the errors that more than one resource answers with.

export interface ErrorBody {
  readonly type:
    'api_error' | 'card_error' | 'idempotency_error' | 'invalid_request_error' | 'rate_limit_error';
  readonly message: string;
  readonly code?: string;
  readonly param?: string;
  readonly decline_code?: string;
  readonly charge?: string;
}

/** `began` tells whether work had begun: only then does the provider remember the answer under its key. */
export class ProviderError extends Error {
  readonly status: number;
  readonly body: ErrorBody;
  readonly began: boolean;
  constructor(status: number, body: ErrorBody, began = false) {
    super(body.message);
    this.name = 'ProviderError';
    this.status = status;
    this.body = body;
    this.began = began;
  }
}

/** Refused because of its parameters, before any work. */
export const badParam = (message: string, code: string, param?: string): ProviderError =>
  new ProviderError(400, { type: 'invalid_request_error', message, code, param });

/** Refused because of the state of things, after work had begun. */
export const refused = (message: string, code?: string, param?: string): ProviderError =>
  new ProviderError(400, { type: 'invalid_request_error', message, code, param }, true);

export const missing = (kind: string, id: string, param = 'id'): ProviderError =>
  new ProviderError(param === 'id' ? 404 : 400, {
    type: 'invalid_request_error',
    code: 'resource_missing',
    message: `No such ${kind}: '${id}'`,
    param,
  });

/** The answer of an injected status, in the shape that the provider gives to it. */
export function errorForStatus(status: number): ErrorBody {
  if (status === 402)
    return {
      type: 'card_error',
      code: 'card_declined',
      decline_code: 'generic_decline',
      message: 'Your card was declined.',
    };
  if (status === 429) return { type: 'rate_limit_error', code: 'rate_limit', message: 'Too many requests.' };
  if (status >= 500) return { type: 'api_error', message: 'Something went wrong at the provider.' };
  return { type: 'invalid_request_error', message: `Refused with ${status} by a fault.` };
}
