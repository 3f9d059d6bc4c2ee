// What listings say in words: kinds, states, grades, places, and what is offered.
import type { Card, UnitState } from '../../shared/listings/card';
import type { Grade } from '../../shared/listings/condition';
import type { ListingStatus } from '../../shared/listings/page';
import { formatCents } from '../../shared/kernel/money';

export const STATE_WORDS: Readonly<Record<UnitState, string>> = {
  pulled: 'Pulled',
  in_vehicle: 'Still in the vehicle',
};

export const GRADE_WORDS: Readonly<Record<Grade, string>> = {
  A: 'A, complete',
  B: 'B, small parts missing',
  C: 'C, case damage',
  D: 'D, not a core',
};

export const TERMS_WORDS = {
  exchange: 'Exchange, with deposit',
  outright: 'Outright, keep your core',
} as const;

export const STATUS_WORDS: Readonly<Record<ListingStatus, string>> = {
  draft: 'Draft',
  live: 'On sale',
  reserved: 'On hold',
  sold: 'Sold',
  withdrawn: 'Off sale',
};

/** "$1,450.00": the first figure of a tag, and what stands under it. */
export function offerOf(card: Pick<Card, 'priceCents' | 'depositCents' | 'outrightCents'>): {
  readonly priceCents: number;
  readonly words: string;
} {
  if (card.depositCents === null)
    return { priceCents: card.outrightCents ?? card.priceCents, words: 'outright, keep your core' };
  const outright = card.outrightCents === null ? ' only' : `, or ${formatCents(card.outrightCents)} outright`;
  return { priceCents: card.priceCents, words: `exchange${outright}` };
}

export function placeWords(place: {
  readonly city: string;
  readonly region: string;
  readonly miles?: number | null;
}): string {
  const miles = place.miles ?? null;
  const away = miles === null ? '' : `, ${miles.toLocaleString('en-US')} mi`;
  return `${place.city}, ${place.region}${away}`;
}

export const mileageWords = (mileage: number | null): string =>
  mileage === null ? 'Odometer not known' : `Odometer ${mileage.toLocaleString('en-US')} mi`;
