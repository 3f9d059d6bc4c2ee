// What other features may use of orders: take a step, let the clocks strike, say who is a party.
import { eq } from 'drizzle-orm';
import type { PhotoParty } from '../photos/for-others';
import { sideOf } from './roles';
import { orders } from './tables';

export { actOnOrder, type ActInput } from './act';
export { sweepDeadlines, fireDeadline } from './fire';
export type { OrderRow } from './load';
export { findHead, type OrderHead } from './queries';
export { presentHeads, presentMoney } from './present';
export { presentOrderPhoto } from './present-photo';
export { papersOf, type PaperName } from './papers';
export { trackRecordOf } from './track-record';
export { rolesOf, sideOf, type Side } from './roles';

export const orderPhotoParty: PhotoParty = {
  kind: 'order',
  sight: async (deps, objectId, actor) => {
    const [order] = await deps.db.select().from(orders).where(eq(orders.id, objectId));
    return order && sideOf(actor, order) !== null ? 'party' : 'no';
  },
};
