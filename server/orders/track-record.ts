// How a seller's deals ended, counted from the orders themselves, for the page of a unit.
import { eq, sql } from 'drizzle-orm';
import type { TrackRecord } from '../../shared/listings/page';
import type { Deps } from '../deps';
import { cases } from '../cases/tables';
import { orders } from './tables';

/** Null where nothing was sold yet: no record is not a bad record. */
export async function trackRecordOf(deps: Deps, sellerId: string): Promise<TrackRecord | null> {
  const [row] = await deps.db
    .select({
      sold: sql<number>`count(*) filter (where ${orders.outbound} in ('accepted', 'settled'))::int`,
      depositsSettled: sql<number>`count(*) filter (where ${orders.core} = 'settled')::int`,
      depositsWhole: sql<number>`count(*) filter (where ${orders.core} = 'settled'
        and coalesce(jsonb_array_length(${orders.deductions}), 0) = 0)::int`,
      cases: sql<number>`count(*) filter (where exists (select 1 from ${cases} c where c.order_id = orders.id))::int`,
      daysToShip: sql<
        number | null
      >`avg(extract(epoch from ${orders.shippedAt} - ${orders.paidAt}) / 86400)::float8`,
    })
    .from(orders)
    .where(eq(orders.sellerId, sellerId));
  if (!row || row.sold === 0) return null;
  return { ...row, daysToShip: row.daysToShip === null ? null : Math.round(row.daysToShip * 10) / 10 };
}
