// What other features may use of notices: queue a mail in their own transaction, to whom it concerns.
import { and, eq, isNull, sql } from 'drizzle-orm';
import type { ClockName } from '../../shared/orders/clocks';
import type { FlowMail, MailTo } from '../../shared/orders/flow';
import { sellerMembers, users } from '../accounts/tables';
import type { Tx } from '../db/client';
import { queueEffect } from '../jobs/outbox';
import type { OrderRow } from '../orders/load';
import { accountLetter, type AccountMail } from './account-letters';
import { render, type Letter } from './letter';
import { orderLetter, type OrderTemplate, type ReminderTemplate } from './order-letters';

interface QueuedLetter {
  readonly to: string;
  readonly letter: Letter;
  readonly key: string;
  readonly orderId?: string;
  readonly now: Date;
}

/** Rendered now: what is sent later never changes. The same key twice is one mail. */
export async function queueLetter(tx: Tx, input: QueuedLetter): Promise<void> {
  await queueEffect(tx, {
    key: input.key,
    kind: 'mail',
    orderId: input.orderId ?? null,
    payload: { to: input.to, ...render(input.letter) },
    now: input.now,
  });
}

export async function queueMail(
  tx: Tx,
  input: { to: string; mail: AccountMail; key: string; now: Date },
): Promise<void> {
  await queueLetter(tx, { to: input.to, letter: accountLetter(input.mail), key: input.key, now: input.now });
}

export interface Recipient {
  readonly userId: string;
  readonly email: string;
}

/** The builder; the seller's owners and dock hands; every admin. */
export async function recipientsOf(
  tx: Tx,
  order: Pick<OrderRow, 'builderId' | 'sellerId'>,
  to: MailTo,
): Promise<Recipient[]> {
  const columns = { userId: users.id, email: users.email };
  if (to === 'builder') return tx.select(columns).from(users).where(eq(users.id, order.builderId));
  if (to === 'admin') {
    return tx
      .select(columns)
      .from(users)
      .where(and(eq(users.isAdmin, true), isNull(users.closedAt)));
  }
  return tx
    .select(columns)
    .from(sellerMembers)
    .innerJoin(users, eq(users.id, sellerMembers.userId))
    .where(
      and(
        eq(sellerMembers.sellerId, order.sellerId),
        sql`${sellerMembers.duties} && array['owner', 'dock']::text[]`,
        isNull(users.closedAt),
      ),
    );
}

interface OrderMailInput {
  readonly order: OrderRow;
  readonly template: OrderTemplate;
  readonly to: MailTo;
  /** Makes the key: the order's version, or the clock that struck. */
  readonly occasion: string;
  readonly now: Date;
  readonly publicUrl: string;
}

async function queueToAll(tx: Tx, input: OrderMailInput): Promise<void> {
  const { order, template, to, now } = input;
  for (const person of await recipientsOf(tx, order, to)) {
    await queueLetter(tx, {
      to: person.email,
      letter: orderLetter(template, { order, to, url: `${input.publicUrl}/orders/${order.id}`, now }),
      key: `mail:${order.id}:${input.occasion}:${template}:${person.userId}`,
      orderId: order.id,
      now,
    });
  }
}

export async function queueOrderMails(
  tx: Tx,
  input: { order: OrderRow; mails: readonly FlowMail[]; version: number; now: Date; publicUrl: string },
): Promise<void> {
  for (const mail of input.mails) {
    await queueToAll(tx, {
      order: input.order,
      template: mail.template,
      to: mail.to,
      occasion: `v${input.version}`,
      now: input.now,
      publicUrl: input.publicUrl,
    });
  }
}

const isReminder = (clock: ClockName): clock is ReminderTemplate =>
  clock === 'transit_nudge' || clock.startsWith('core_reminder_');

/** A clock that only writes: the builder is reminded; of a late pallet the seller too. */
export async function queueReminder(
  tx: Tx,
  input: { order: OrderRow; clock: ClockName; now: Date; publicUrl: string },
): Promise<void> {
  const { order, clock, now, publicUrl } = input;
  if (!isReminder(clock)) return;
  // The due date makes the occasion: a window that was extended reminds again.
  const occasion = `${clock}@${order.dueAt?.toISOString() ?? order.shippedAt?.toISOString() ?? ''}`;
  const sides: readonly MailTo[] = clock === 'transit_nudge' ? ['builder', 'seller'] : ['builder'];
  for (const to of sides) await queueToAll(tx, { order, template: clock, to, occasion, now, publicUrl });
}
