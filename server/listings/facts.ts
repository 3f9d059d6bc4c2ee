// Between a listing's row and the plain facts that the rules of shared/ speak of.
import type { ChangeBody } from '../../shared/listings/contract';
import { unitKind, type UnitKind } from '../../shared/catalogue/kinds';
import { gradeOf, isQuestion } from '../../shared/listings/condition';
import { missingForPublish, type DraftFacts } from '../../shared/listings/publish';
import { exchangeTerms, totalCents, type ExchangeTerms } from '../../shared/listings/terms';
import { unitState, type UnitState } from '../../shared/listings/card';
import type { FieldError } from '../../shared/kernel/problem';
import type { ListingRow } from './for-others';
import type { NewListing, Stock } from './queries';
import { codeKeyOf } from './search-parts';

export const kindOf = (row: Pick<ListingRow, 'kind'>): UnitKind | null => unitKind.nullable().parse(row.kind);
export const stateOf = (row: Pick<ListingRow, 'state'>): UnitState => unitState.parse(row.state);

export function exchangeOf(row: ListingRow): ExchangeTerms | null {
  if (!row.exchange) return null;
  return exchangeTerms.parse({
    depositCents: row.depositCents ?? 0,
    windowDays: row.windowDays,
    schedule: row.schedule,
    returnFreight: row.returnFreight ?? 'seller',
  });
}

/** What a buyer pays who keeps the old unit: the seller's own figure, or price and deposit together. */
export function outrightOf(
  row: Pick<ListingRow, 'outright' | 'outrightCents' | 'priceCents' | 'exchange' | 'depositCents'>,
): number | null {
  if (!row.outright) return null;
  if (row.outrightCents !== null) return row.outrightCents;
  return row.priceCents === null ? null : row.priceCents + (row.exchange ? (row.depositCents ?? 0) : 0);
}

export const draftFacts = (row: ListingRow): DraftFacts => ({
  kind: kindOf(row),
  variantId: row.variantId,
  caseCode: row.caseCode,
  state: stateOf(row),
  rebuilt: row.rebuilt,
  condition: row.condition,
  priceCents: row.priceCents,
  exchange: exchangeOf(row),
  outright: row.outright,
  outrightCents: outrightOf(row),
  freight: row.freight,
  notes: row.notes,
});

export const missingOf = (
  stock: Pick<Stock, 'row' | 'seller'>,
  shots: readonly string[],
  mailChecked: boolean,
): FieldError[] => missingForPublish(draftFacts(stock.row), shots, { kind: stock.seller.kind }, mailChecked);

/** The faults of a change that no later step could mend. */
export function changeErrors(body: ChangeBody): FieldError[] {
  return Object.keys(body.condition ?? {})
    .filter((code) => !isQuestion(code))
    .map((code) => ({ path: `condition.${code}`, message: 'There is no such question' }));
}

/** What the seller said, as columns; what wasn't said stays as it is. */
export function columnsOf(body: ChangeBody): Partial<NewListing> {
  const { terms } = body;
  const exchange = terms?.exchange ?? null;
  return {
    ...(body.caseCode === undefined ? {} : { caseCode: body.caseCode, codeKey: codeKeyOf(body.caseCode) }),
    ...(body.donorVehicleId === undefined ? {} : { donorVehicleId: body.donorVehicleId }),
    ...(body.state === undefined ? {} : { state: body.state }),
    ...(body.mileage === undefined ? {} : { mileage: body.mileage }),
    ...(body.rebuilt === undefined ? {} : { rebuilt: body.rebuilt }),
    ...(body.condition === undefined ? {} : { condition: body.condition }),
    ...(body.priceCents === undefined ? {} : { priceCents: body.priceCents }),
    ...(body.freight === undefined ? {} : { freight: body.freight }),
    ...(body.shipDays === undefined ? {} : { shipDays: body.shipDays }),
    ...(body.notes === undefined ? {} : { notes: body.notes }),
    ...(terms === undefined
      ? {}
      : {
          exchange: exchange !== null,
          depositCents: exchange?.depositCents ?? null,
          windowDays: exchange?.windowDays ?? null,
          schedule: exchange?.schedule ?? [],
          returnFreight: exchange?.returnFreight ?? null,
          outright: terms.outright,
          outrightCents: terms.outright ? (terms.outrightCents ?? null) : null,
        }),
  };
}

/** The columns that follow from the others. */
export function derivedOf(row: ListingRow): Pick<NewListing, 'grade' | 'totalCents'> {
  const kind = kindOf(row);
  const priced = row.priceCents !== null && (row.exchange || row.outright);
  return {
    grade: kind ? gradeOf(kind, row.condition).grade : null,
    totalCents: priced
      ? totalCents({
          priceCents: row.priceCents ?? 0,
          depositCents: row.depositCents,
          outrightCents: outrightOf(row),
          exchange: row.exchange,
        })
      : null,
  };
}
