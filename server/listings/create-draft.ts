// Starts a draft for a seller: the unit may already be known from its code, everything else may come later.
import { hasDuty, type Actor } from '../../shared/accounts/actor';
import { newId } from '../../shared/kernel/ids';
import { newTagCode } from '../../shared/kernel/tag-code';
import type { ChangeBody, DraftBody } from '../../shared/listings/contract';
import { terms } from '../../shared/listings/terms';
import { transaction } from '../db/transaction';
import type { Deps } from '../deps';
import { notFound, refuse, type Refusal } from '../http/refusal';
import { changeErrors, columnsOf, derivedOf } from './facts';
import { insertListing, loadStock, findSeller, updateListing, type SellerRow, type Stock } from './queries';
import { settleUnit } from './unit';

/** The seller's own terms, where the draft brings none. */
function termsOf(seller: SellerRow): ChangeBody['terms'] {
  const { depositCents, windowDays, schedule, returnFreight: payer, outright } = seller.terms;
  const exchange =
    depositCents === null ? null : { depositCents, windowDays, schedule, returnFreight: payer };
  const parsed = terms.safeParse({ exchange, outright });
  return parsed.success ? parsed.data : undefined;
}

export async function createDraft(deps: Deps, actor: Actor, body: DraftBody): Promise<Stock | Refusal> {
  const { sellerId, ...fields } = body;
  if (!actor.memberships.some((membership) => membership.sellerId === sellerId))
    return notFound('seller account');
  if (!hasDuty(actor, sellerId, 'lister'))
    return refuse('forbidden', 'Only somebody with the lister duty lists units.');
  const errors = changeErrors(fields);
  if (errors.length > 0) return refuse('invalid', errors[0]?.message ?? '', { errors });
  const now = deps.clock.now();
  return transaction(deps.db, async (tx) => {
    const seller = await findSeller(tx, sellerId);
    if (!seller) return notFound('seller account');
    const unit = await settleUnit(tx, sellerId, fields, null);
    if ('refusal' in unit) return unit;
    const draft = await insertListing(tx, {
      id: newId('lst', now.getTime()),
      sellerId,
      tagCode: newTagCode(),
      state: 'pulled',
      zip: seller.zip,
      lat: seller.lat,
      lon: seller.lon,
      createdAt: now,
      updatedAt: now,
      ...columnsOf({
        ...fields,
        terms: fields.terms ?? termsOf(seller),
        shipDays: fields.shipDays ?? seller.terms.shipDays,
      }),
      ...unit.columns,
    });
    await updateListing(tx, draft, derivedOf(draft), now);
    const stock = await loadStock(tx, draft.id);
    return stock ?? notFound('listing');
  });
}
