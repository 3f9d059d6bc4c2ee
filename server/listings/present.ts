// Rows of listings as they leave the server, field by field.
import type { FieldError } from '../../shared/kernel/problem';
import { milesBetween } from '../../shared/kernel/geo';
import { card, type Card } from '../../shared/listings/card';
import type { SellerListing, StockItem } from '../../shared/listings/contract';
import { type UnitKind } from '../../shared/catalogue/kinds';
import { checklist, gradeOf, GRADE_RULES, type Answers } from '../../shared/listings/condition';
import { hazards } from '../../shared/listings/hazards';
import { listingStatus, type ListingPage } from '../../shared/listings/page';
import { requiredShots, shotList } from '../../shared/listings/shots';
import { returnByGrade } from '../../shared/listings/terms';
import { photoUrls, presentPhoto } from '../photos/for-others';
import { exchangeOf, kindOf, outrightOf, stateOf } from './facts';
import type { ListingRow } from './for-others';
import type { ShotPhoto, Stock } from './queries';
import type { CardRow } from './search';
import type { Point } from './search-parts';

const milesOf = (row: { lat: number | null; lon: number | null }, from: Point | null): number | null =>
  from && row.lat !== null && row.lon !== null
    ? Math.round(milesBetween(from, { lat: row.lat, lon: row.lon }))
    : null;

export const presentCard = (row: CardRow, from: Point | null): Card =>
  card.parse({
    id: row.id,
    title: row.title,
    kind: row.kind,
    familyId: row.family_id,
    variantId: row.variant_id,
    caseCode: row.case_code,
    grade: row.grade,
    state: row.state,
    priceCents: row.price_cents,
    depositCents: row.exchange ? row.deposit_cents : null,
    outrightCents: row.outright ? row.outright_cents : null,
    totalCents: row.total_cents,
    sellerId: row.seller_id,
    sellerName: row.seller_name,
    city: row.city,
    region: row.region,
    zip: row.zip,
    miles: milesOf(row, from),
    fit: null,
    photoUrl: row.cover_photo_id ? photoUrls(row.cover_photo_id).small : null,
    photoCount: row.photo_count,
    listedAt: row.listed_at.toISOString(),
  });

export function presentCondition(kind: UnitKind, state: 'in_vehicle' | 'pulled', answers: Answers) {
  const result = gradeOf(kind, answers);
  return {
    checks: checklist(kind).map((one) => ({ ...one, answer: answers[one.code] ?? null })),
    grade: result.grade,
    rule: result.rule,
    because: [...result.because],
    hazards: hazards(kind, state, answers),
  };
}

export function presentShots(row: ListingRow, shots: readonly ShotPhoto[]) {
  const kind = kindOf(row);
  if (!kind) return [];
  const needed = requiredShots(kind, stateOf(row), row.condition).map((shot) => shot.code);
  return shotList(kind).map((shot) => ({
    code: shot.code,
    number: shot.number,
    name: shot.name,
    instruction: shot.instruction,
    required: needed.includes(shot.code),
    photos: shots.filter((taken) => taken.shot === shot.code).map((taken) => presentPhoto(taken.photo)),
  }));
}

export function presentTerms(row: ListingRow, kind: UnitKind): ListingPage['terms'] {
  const exchange = exchangeOf(row);
  return {
    priceCents: row.priceCents ?? 0,
    exchange: exchange
      ? {
          ...exchange,
          examples: returnByGrade(kind, exchange).map((example) => ({
            ...example,
            lines: [...example.lines],
            rule: GRADE_RULES[example.grade],
          })),
        }
      : null,
    outrightCents: outrightOf(row),
    totalCents: row.totalCents ?? 0,
  };
}

export function presentStock(stock: Stock, missing: FieldError[]): SellerListing {
  const { row, shots } = stock;
  const kind = kindOf(row);
  return {
    id: row.id,
    version: row.version,
    sellerId: row.sellerId,
    status: listingStatus.parse(row.status),
    kind,
    variantId: row.variantId,
    familyId: row.familyId,
    title: row.title,
    caseCode: row.caseCode,
    tagCode: row.tagCode,
    donorVehicleId: row.donorVehicleId,
    state: stateOf(row),
    mileage: row.mileage,
    rebuilt: row.rebuilt,
    condition: kind ? presentCondition(kind, stateOf(row), row.condition) : null,
    answers: answersOf(row.condition),
    priceCents: row.priceCents,
    totalCents: row.totalCents,
    terms: { exchange: exchangeOf(row), outright: row.outright, outrightCents: row.outrightCents },
    freight: row.freight,
    shipDays: row.shipDays,
    notes: row.notes,
    zip: row.zip,
    shots: presentShots(row, shots),
    photos: shots.map((taken) => presentPhoto(taken.photo)),
    coverPhotoId: row.coverPhotoId,
    missing,
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    listedAt: row.listedAt?.toISOString() ?? null,
  };
}

const answersOf = (given: Answers): SellerListing['answers'] => {
  const kept: SellerListing['answers'] = {};
  for (const [code, value] of Object.entries(given)) if (value) kept[code] = value;
  return kept;
};

export function presentStockItem(row: ListingRow, missing: readonly FieldError[]): StockItem {
  return {
    id: row.id,
    version: row.version,
    sellerId: row.sellerId,
    status: listingStatus.parse(row.status),
    title: row.title,
    kind: kindOf(row),
    state: stateOf(row),
    caseCode: row.caseCode,
    tagCode: row.tagCode,
    grade:
      row.grade === 'A' || row.grade === 'B' || row.grade === 'C' || row.grade === 'D' ? row.grade : null,
    priceCents: row.priceCents,
    depositCents: row.exchange ? row.depositCents : null,
    outrightCents: outrightOf(row),
    photoUrl: row.coverPhotoId ? photoUrls(row.coverPhotoId).small : null,
    photoCount: row.photoCount,
    missing: missing.map((error) => error.path),
    createdAt: row.createdAt.toISOString(),
    listedAt: row.listedAt?.toISOString() ?? null,
  };
}
