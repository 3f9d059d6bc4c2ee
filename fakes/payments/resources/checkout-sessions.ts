// Checkout sessions: what the hosted page will charge, until when, and where it sends the person afterwards.
import { z } from 'zod';
import { badParam, missing, refused } from '../errors';
import { currency, expandParam, integer, metadata, positive, readParams, webUrl } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { LineItem, Session } from '../model/payments';
import { idOf, type Call, type Routes } from '../router';
import { newId, type Cause, type World } from '../world';

const LEAST_SECONDS = 30 * 60;
const MOST_SECONDS = 24 * 60 * 60;
/** The provider's smallest charge in US dollars. */
const LEAST_CENTS = 50;
const MOST_CENTS = 99_999_999;

const lineParam = z.strictObject({
  quantity: positive.default(1),
  price_data: z.strictObject({
    currency,
    unit_amount: integer.refine((value) => value >= 0, 'must be at least 0'),
    product_data: z.strictObject({
      name: z.string().min(1),
      description: z.string().optional(),
      images: z.array(z.string()).optional(),
      metadata: metadata.optional(),
      tax_code: z.string().optional(),
    }),
    tax_behavior: z.enum(['exclusive', 'inclusive', 'unspecified']).optional(),
  }),
});

const createParams = z.strictObject({
  mode: z.literal('payment', 'only payment is known here'),
  line_items: z.array(lineParam).min(1).max(100),
  success_url: webUrl,
  cancel_url: webUrl.optional(),
  client_reference_id: z.string().max(200).optional(),
  customer_email: z.email().optional(),
  customer_creation: z.enum(['always', 'if_required']).optional(),
  expires_at: integer.optional(),
  locale: z.string().optional(),
  metadata: metadata.default({}),
  payment_method_types: z.array(z.literal('card')).optional(),
  submit_type: z.enum(['auto', 'book', 'donate', 'pay']).optional(),
  ui_mode: z.literal('hosted_page').optional(),
  payment_intent_data: z
    .strictObject({
      capture_method: z.enum(['automatic', 'automatic_async']).optional(),
      description: z.string().optional(),
      metadata: metadata.default({}),
      receipt_email: z.email().optional(),
      statement_descriptor: z.string().max(22).optional(),
      statement_descriptor_suffix: z.string().max(22).optional(),
      transfer_group: z.string().optional(),
    })
    .optional(),
  expand: expandParam,
});

type CreateParams = z.output<typeof createParams>;

function endOf(world: World, asked: number | undefined): number {
  const now = world.seconds();
  if (asked === undefined) return now + MOST_SECONDS;
  const { strictExpiry } = world.settings;
  if (asked <= now || (strictExpiry && asked < now + LEAST_SECONDS))
    throw badParam(
      'expires_at must be at least 30 minutes after the session is made.',
      'parameter_invalid',
      'expires_at',
    );
  if (strictExpiry && asked > now + MOST_SECONDS)
    throw badParam(
      'expires_at must be within 24 hours after the session is made.',
      'parameter_invalid',
      'expires_at',
    );
  return asked;
}

function lineItem(line: CreateParams['line_items'][number]): LineItem {
  const { price_data: price, quantity } = line;
  const total = price.unit_amount * quantity;
  return {
    id: newId('li'),
    object: 'item',
    amount_discount: 0,
    amount_subtotal: total,
    amount_tax: 0,
    amount_total: total,
    currency: price.currency,
    description: price.product_data.name,
    price: {
      id: newId('price'),
      object: 'price',
      currency: price.currency,
      product: newId('prod', 14),
      type: 'one_time',
      unit_amount: price.unit_amount,
    },
    quantity,
  };
}

function totalOf(items: readonly LineItem[]): { cents: number; currency: string } {
  const [first] = items;
  const moneys = new Set(items.map((item) => item.currency));
  if (first === undefined || moneys.size !== 1)
    throw badParam('All line items must have the same currency.', 'parameter_invalid', 'line_items');
  const cents = items.reduce((sum, item) => sum + item.amount_total, 0);
  if (cents > 0 && cents < LEAST_CENTS)
    throw badParam('The total must be at least $0.50.', 'amount_too_small', 'line_items');
  if (cents > MOST_CENTS) throw badParam('The total is too large.', 'amount_too_large', 'line_items');
  return { cents, currency: first.currency };
}

function create({ world, form }: Call): Session {
  const params = readParams(createParams, form);
  const lineItems = params.line_items.map(lineItem);
  const total = totalOf(lineItems);
  const id = newId('cs_test', 40);
  const session: Session = {
    id,
    object: 'checkout.session',
    amount_subtotal: total.cents,
    amount_total: total.cents,
    cancel_url: params.cancel_url ?? null,
    client_reference_id: params.client_reference_id ?? null,
    created: world.seconds(),
    currency: total.currency,
    customer: null,
    customer_details: params.customer_email ? { email: params.customer_email, name: null } : null,
    customer_email: params.customer_email ?? null,
    expires_at: endOf(world, params.expires_at),
    livemode: false,
    locale: params.locale ?? null,
    metadata: params.metadata,
    mode: 'payment',
    payment_intent: null,
    payment_method_types: ['card'],
    payment_status: total.cents === 0 ? 'no_payment_required' : 'unpaid',
    status: 'open',
    submit_type: params.submit_type ?? null,
    success_url: params.success_url,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: `${world.baseUrl()}/pay/${id}`,
  };
  const intent = params.payment_intent_data;
  world.state.sessionPlans.put(id, {
    lineItems,
    intent: {
      description: intent?.description ?? null,
      metadata: intent?.metadata ?? {},
      receipt_email: intent?.receipt_email ?? null,
      transfer_group: intent?.transfer_group ?? null,
    },
  });
  return world.state.sessions.put(id, session);
}

/** The session as it stands now: one whose time has run out is expired first. */
export function currentSession(world: World, id: string, cause: Cause): Session | undefined {
  const session = world.state.sessions.get(id);
  if (session?.status === 'open' && session.expires_at <= world.seconds())
    return expireSession(world, session, cause);
  return session;
}

export function expireSession(world: World, session: Session, cause: Cause): Session {
  const expired = world.state.sessions.put(session.id, { ...session, status: 'expired', url: null });
  world.emit('checkout.session.expired', expired, cause);
  return expired;
}

function find(call: Call): Session {
  const session = currentSession(call.world, idOf(call), call.cause);
  if (session === undefined) throw missing('checkout.session', idOf(call));
  return session;
}

function expire(call: Call): Session {
  readParams(z.strictObject({ expand: expandParam }), call.form);
  const session = find(call);
  if (session.status !== 'open') {
    throw refused(
      `Only Checkout Sessions with a status in ["open"] can be expired. This one has the status ${session.status}.`,
    );
  }
  return expireSession(call.world, session, call.cause);
}

const linesOf = (world: World, session: string): LineItem[] =>
  world.state.sessionPlans.get(session)?.lineItems ?? [];

const sessionListParams = z.strictObject({
  ...listParams,
  payment_intent: z.string().optional(),
  status: z.enum(['open', 'complete', 'expired']).optional(),
});

export const checkoutSessionRoutes: Routes = {
  'POST /v1/checkout/sessions': create,
  'GET /v1/checkout/sessions': ({ world, form, path }) => {
    const { payment_intent: intent, status, ...paging } = readParams(sessionListParams, form);
    const sessions = world.state.sessions
      .all()
      .filter((session) => intent === undefined || session.payment_intent === intent)
      .filter((session) => status === undefined || session.status === status);
    return pageOf(sessions, paging, path);
  },
  'GET /v1/checkout/sessions/:id': (call) => {
    const { expand } = readParams(z.strictObject({ expand: expandParam }), call.form);
    const session = find(call);
    if (!expand.includes('line_items')) return session;
    const url = `${call.path}/line_items`;
    return {
      ...session,
      line_items: { object: 'list', data: linesOf(call.world, session.id), has_more: false, url },
    };
  },
  'GET /v1/checkout/sessions/:id/line_items': (call) => {
    const paging = readParams(z.strictObject(listParams), call.form);
    const lines = linesOf(call.world, find(call).id);
    return pageOf(lines.toReversed(), paging, call.path);
  },
  'POST /v1/checkout/sessions/:id/expire': expire,
};
