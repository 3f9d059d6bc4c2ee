// What stands between a draft and an offer: every missing or refused thing by name, so that all can be mended at once.
import type { SellerKind } from '../accounts/actor';
import type { Cents } from '../kernel/money';
import type { FieldError } from '../kernel/problem';
import { claimsIn } from './claims';
import { type UnitKind } from '../catalogue/kinds';
import { checklist, numberRemoved, type Answers } from './condition';
import type { FreightFigures } from './freight';
import { requiredShots } from './shots';
import { scheduleErrors, type ExchangeTerms } from './terms';

export interface DraftFacts {
  readonly kind: UnitKind | null;
  readonly variantId: string | null;
  readonly caseCode: string;
  readonly state: 'in_vehicle' | 'pulled';
  readonly rebuilt: boolean;
  readonly condition: Answers;
  readonly priceCents: Cents | null;
  readonly exchange: ExchangeTerms | null;
  readonly outright: boolean;
  readonly outrightCents: Cents | null;
  readonly freight: FreightFigures | null;
  readonly notes: string;
}

export interface SellerFacts {
  readonly kind: SellerKind;
}

const REBUILT_NOTES_MIN = 40;

function unitErrors(draft: DraftFacts): FieldError[] {
  const errors: FieldError[] = [];
  if (draft.caseCode.trim() === '')
    errors.push({ path: 'caseCode', message: 'Type the code stamped on the case' });
  if (!draft.variantId || !draft.kind) {
    errors.push({ path: 'variantId', message: 'Choose which unit it is' });
    return errors;
  }
  for (const question of checklist(draft.kind)) {
    const given = draft.condition[question.code];
    if (given === undefined || (given === 'unknown' && !question.mayBeUnknown)) {
      errors.push({ path: `condition.${question.code}`, message: `Answer: ${question.label}` });
    }
  }
  if (numberRemoved(draft.condition)) {
    errors.push({
      path: 'condition.number_intact',
      message: 'A unit whose identifying number was removed cannot be sold here (18 U.S.C. 511)',
    });
  }
  if (draft.state === 'pulled' && draft.condition['drained'] === 'no') {
    errors.push({ path: 'condition.drained', message: 'Drain it and plug every opening first' });
  }
  return errors;
}

function photoErrors(draft: DraftFacts, shotsTaken: readonly string[]): FieldError[] {
  if (!draft.kind) return shotsTaken.length > 0 ? [] : [{ path: 'photos', message: 'Shoot the unit' }];
  return requiredShots(draft.kind, draft.state, draft.condition)
    .filter((shot) => !shotsTaken.includes(shot.code))
    .map((shot) => ({ path: `photos.${shot.code}`, message: `Shoot ${shot.number}: ${shot.name}` }));
}

function moneyErrors(draft: DraftFacts): FieldError[] {
  const errors: FieldError[] = [];
  if (draft.priceCents === null || draft.priceCents === 0) {
    errors.push({ path: 'priceCents', message: 'Type a price, such as 1450.00' });
  }
  if (!draft.exchange && !draft.outright) {
    errors.push({ path: 'terms', message: 'Offer it for exchange, outright, or both' });
  }
  if (draft.exchange) {
    errors.push(...scheduleErrors(draft.exchange));
    if (draft.exchange.schedule.length === 0) {
      errors.push({ path: 'terms.exchange.schedule', message: 'List what you take off, and how much' });
    }
  }
  if (draft.outright && draft.outrightCents === 0) {
    errors.push({ path: 'terms.outrightCents', message: 'Type a price, such as 1980.00' });
  }
  if (!draft.freight) errors.push({ path: 'freight', message: 'Give weight and size on the pallet' });
  return errors;
}

function wordErrors(draft: DraftFacts, seller: SellerFacts): FieldError[] {
  if (!draft.rebuilt) {
    const [claim] = claimsIn(draft.notes);
    if (!claim) return [];
    const message = `“${claim.word}” is said of the unit, but it is sold used. Leave it out (16 CFR 20)`;
    return [{ path: 'notes', message }];
  }
  if (seller.kind !== 'rebuilder')
    return [{ path: 'rebuilt', message: 'Only a rebuilder account sells rebuilt units' }];
  return draft.notes.trim().length < REBUILT_NOTES_MIN
    ? [{ path: 'notes', message: 'Say what was taken apart, cleaned and replaced (16 CFR 20)' }]
    : [];
}

/**
 * Everything that keeps a draft from being published, each with the path of the field to mend; empty when it may go live.
 * A missing shot is named `photos.<shot>`, an unanswered check `condition.<question>`.
 * @param shotsTaken the codes of the shots that have a photo
 * @param mailChecked has the person who publishes confirmed the e-mail address?
 */
export function missingForPublish(
  draft: DraftFacts,
  shotsTaken: readonly string[],
  seller: SellerFacts,
  mailChecked: boolean,
): FieldError[] {
  return [
    ...unitErrors(draft),
    ...photoErrors(draft, shotsTaken),
    ...moneyErrors(draft),
    ...wordErrors(draft, seller),
    ...(mailChecked ? [] : [{ path: 'account.mail', message: 'Confirm your e-mail address first' }]),
  ];
}

/** What a buyer is always told, in these words, on the listing, the invoice and the tag. */
export const usedNotice = (rebuilt: boolean): string =>
  rebuilt ? 'Used unit, rebuilt by the seller' : 'Used core';
