// One attempt to hand an event to the endpoint, signed as the provider signs.
import { createHmac } from 'node:crypto';
import type { ProviderEvent } from './model/delivery';

const ATTEMPT_MS = 10_000;

/** `t=<seconds>,v1=<hex HMAC-SHA256 of "t.body">`, as the provider documents it. */
function sign(payload: string, secret: string, atSeconds: number): string {
  const signature = createHmac('sha256', secret).update(`${atSeconds}.${payload}`).digest('hex');
  return `t=${atSeconds},v1=${signature}`;
}

export const renderEvent = (event: ProviderEvent, open: boolean): object => ({
  ...event,
  pending_webhooks: open ? 1 : 0,
});

/** Null when the event was taken, otherwise what went wrong. */
export async function attempt(
  event: ProviderEvent,
  settings: { url: string; secret: string; stop: AbortSignal },
): Promise<string | null> {
  const payload = JSON.stringify(renderEvent(event, true), null, 2);
  try {
    const answer = await fetch(settings.url, {
      method: 'POST',
      headers: {
        'content-type': 'application/json; charset=utf-8',
        'stripe-signature': sign(payload, settings.secret, Math.floor(Date.now() / 1000)),
      },
      body: payload,
      redirect: 'manual',
      signal: AbortSignal.any([settings.stop, AbortSignal.timeout(ATTEMPT_MS)]),
    });
    await answer.arrayBuffer();
    return answer.ok ? null : `HTTP ${answer.status}`;
  } catch (error) {
    return error instanceof Error ? error.message : 'no answer';
  }
}
