// Puts a draft on offer when nothing is missing; otherwise every missing thing is named at once.
import type { Actor } from '../../shared/accounts/actor';
import { recordAudit } from '../accounts/for-others';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { isRefusal, notFound, refuse, type Refusal } from '../http/refusal';
import { lockForLister, notWhile } from './access';
import { derivedOf, missingOf, outrightOf } from './facts';
import { loadStock, updateListing, type Stock } from './queries';
import { wordsOf } from './unit';

export async function publishDraft(
  deps: Deps,
  actor: Actor,
  id: string,
  version: number | undefined,
): Promise<Stock | Refusal> {
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const row = await lockForLister(tx, actor, id, version);
    if (isRefusal(row)) return row;
    if (row.status !== 'draft') return notWhile(row, 'Only a draft can be published.');
    const stock = await loadStock(tx, id);
    if (!stock) return notFound('listing');
    const errors = missingOf(
      stock,
      stock.shots.map((taken) => taken.shot),
      actor.mailChecked,
    );
    if (errors.length > 0) {
      const detail = errors.length === 1 ? 'One thing is missing.' : `${errors.length} things are missing.`;
      return refuse('invalid', detail, { errors });
    }
    const { seller } = stock;
    await updateListing(
      tx,
      row,
      {
        ...derivedOf(row),
        outrightCents: outrightOf(row),
        status: 'live',
        words: await wordsOf(tx, row, seller),
        zip: seller.zip,
        lat: seller.lat,
        lon: seller.lon,
        publishedAt: row.publishedAt ?? now,
        listedAt: now,
      },
      now,
    );
    await recordAudit(tx, {
      at: now,
      actorUserId: actor.userId,
      actorKind: 'lister',
      action: 'listing_published',
      objectKind: 'listing',
      objectId: id,
      detail: {},
    });
    return (await loadStock(tx, id)) ?? notFound('listing');
  });
}
