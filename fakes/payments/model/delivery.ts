// Events with their deliveries, remembered answers, and what is still to happen.
import { z } from 'zod';

const text = z.string();
const maybe = z.string().nullable();
const count = z.number().int();

export const eventShape = z.object({
  id: text,
  object: z.literal('event'),
  account: text.optional(),
  api_version: text,
  created: count,
  data: z.object({ object: z.unknown() }),
  livemode: z.literal(false),
  request: z.object({ id: maybe, idempotency_key: maybe }),
  type: text,
});

export const deliveryShape = z.object({
  id: text,
  eventId: text,
  attempts: count,
  dueAtMs: z.number(),
  /** Waits until a later event has gone out, or until it is due. */
  held: z.boolean(),
  deliveredAtMs: z.number().nullable(),
  givenUp: z.boolean(),
  lastAnswer: maybe,
});

export const idempotencyShape = z.object({
  fingerprint: text,
  status: count,
  body: text,
  requestId: text,
  savedAtMs: z.number(),
});

/** A refund that is going to fail. */
export const scheduledShape = z.object({ refund: text, dueAtMs: z.number() });

export const taxCalculationShape = z.object({
  id: text,
  answer: z.record(text, z.unknown()),
  lineItems: z.array(z.object({ id: text }).loose()),
});

export type ProviderEvent = z.output<typeof eventShape>;
export type Delivery = z.output<typeof deliveryShape>;
export type TaxCalculation = z.output<typeof taxCalculationShape>;
