// Opens the provider's hosted page for a reserved order; where the provider doesn't answer, the order waits and it can be tried again.
import { eq } from 'drizzle-orm';
import { isFinalRefusal } from '../gateways/payments';
import type { Deps } from '../deps';
import type { OrderRow } from './load';
import { orders } from './tables';

const linesOf = (order: OrderRow): { label: string; cents: number }[] =>
  [
    { label: `Used core: ${order.title}`, cents: order.priceCents },
    { label: 'Core deposit, held until your old unit is graded', cents: order.depositCents },
    { label: 'Freight', cents: order.freightCents },
    { label: 'Sales tax', cents: order.taxCents },
  ].filter((one) => one.cents > 0);

/** @returns the page's address, or null where the provider doesn't answer now */
export async function openCheckout(deps: Deps, order: OrderRow, email: string): Promise<string | null> {
  const page = `${deps.env.PUBLIC_URL}/orders/${order.id}`;
  try {
    const session = await deps.payments.openCheckout(
      {
        orderId: order.id,
        orderNumber: order.number,
        lines: linesOf(order),
        expiresAt: order.checkoutExpiresAt,
        successUrl: `${page}/paid?session={CHECKOUT_SESSION_ID}`,
        cancelUrl: page,
        customerEmail: email,
      },
      `checkout:${order.id}`,
    );
    await deps.db
      .update(orders)
      .set({ checkoutSessionId: session.sessionId, checkoutUrl: session.url })
      .where(eq(orders.id, order.id));
    return session.url;
  } catch (error) {
    if (isFinalRefusal(error)) throw error;
    deps.log.warn({ err: error, orderId: order.id }, 'checkout cannot be opened now');
    return null;
  }
}
