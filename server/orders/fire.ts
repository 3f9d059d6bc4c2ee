// Lets due clocks strike: each does its action once, whoever of the processes gets there first.
import { eq } from 'drizzle-orm';
import { STRIKES } from '../../shared/orders/clocks';
import type { Step } from '../../shared/orders/facts';
import type { Action } from '../../shared/orders/states';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { isRefusal } from '../http/refusal';
import { queueReminder } from '../notices/for-others';
import { actOnLocked } from './act';
import { dueClockIds, endClock, takeDue } from './deadlines';
import { lockOrder, type OrderRow } from './load';
import { deadlines } from './tables';

function stepOf(action: Action, order: OrderRow): Step | null {
  switch (action) {
    case 'expire':
    case 'lapse':
    case 'release':
      return { action };
    case 'cancel':
    case 'accept':
    case 'agree':
      return { action, input: { version: order.version } };
    default:
      return null;
  }
}

/** Strikes one clock. @returns true where something happened */
export async function fireDeadline(deps: Deps, deadlineId: string): Promise<boolean> {
  const [known] = await deps.db
    .select({ orderId: deadlines.orderId })
    .from(deadlines)
    .where(eq(deadlines.id, deadlineId));
  if (!known) return false;
  const now = deps.clock.now();
  const result = await transaction(deps.db, async (tx) => {
    // The order's lock first, as every other step takes it: the two never wait for each other in a ring.
    const order = await lockOrder(tx, known.orderId);
    const due = await takeDue(tx, deadlineId, now);
    if (!order || !due) return false;
    const { action } = STRIKES[due.clock];
    await endClock(tx, due.id, 'fired', now);
    if (action === null) {
      await queueReminder(tx, { order, clock: due.clock, now, publicUrl: deps.env.PUBLIC_URL });
      return true;
    }
    const step = stepOf(action, order);
    if (!step) throw new Error(`the clock ${due.clock} has no step for ${action}`);
    const outcome = await actOnLocked(deps, tx, order, {
      orderId: order.id,
      roles: ['clock'],
      step,
      actorUserId: null,
    });
    return isRefusal(outcome) ? outcome : true;
  });
  if (isRefusal(result)) {
    // Frozen by a chargeback: the clock stays open and strikes once that is over.
    deps.log.info({ deadlineId, detail: result.detail }, 'a due clock has to wait');
    return false;
  }
  return result;
}

/** Strikes everything that is due now, also what falls due by it. @returns how many struck */
export async function sweepDeadlines(deps: Deps): Promise<number> {
  const tried: string[] = [];
  let struck = 0;
  for (;;) {
    const ids = await dueClockIds(deps, deps.clock.now(), tried);
    if (ids.length === 0) return struck;
    for (const id of ids) {
      tried.push(id);
      if (await fireDeadline(deps, id)) struck += 1;
    }
  }
}
