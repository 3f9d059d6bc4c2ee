// Which unit a listing is of: its variant and family from the catalogue, its title, and the words it's found by.
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { ChangeBody } from '../../shared/listings/contract';
import type { ListingPage } from '../../shared/listings/page';
import { readCode } from '../../shared/reading/read-code';
import { currentBook, findFamily, findVariant } from '../catalogue/for-others';
import type { Tx } from '../db/client';
import { invalid, isRefusal, type Refusal } from '../http/refusal';
import { findDonor, type NewListing, type SellerRow } from './queries';
import type { ListingRow } from './for-others';

export interface Unit {
  readonly variantId: string;
  readonly variantName: string;
  readonly kind: UnitKind;
  readonly title: string;
  readonly family: ListingPage['family'];
}

export async function unitOf(tx: Tx, variantId: string): Promise<Unit | null> {
  const variant = await findVariant(tx, variantId);
  const family = variant && (await findFamily(tx, variant.familyId));
  if (!family) return null;
  return {
    variantId: variant.id,
    variantName: variant.label,
    kind: family.kind,
    // The first mark of the variant sets it apart in a list; the page shows all of them.
    title: [family.name, variant.label.split(',')[0]?.trim()].filter(Boolean).join(', '),
    family: {
      id: family.id,
      maker: family.maker,
      designation: family.designation,
      name: family.name,
      control: family.control,
      forwardRatios: family.forwardRatios,
      reverseRatio: family.reverseRatio,
      lowRange: family.lowRange,
      weightLb: family.dryWeightLb,
      fluid: family.fluid,
    },
  };
}

const KIND_WORDS: Readonly<Record<UnitKind, string>> = {
  automatic: 'automatic transmission gearbox auto',
  manual: 'manual transmission gearbox stick',
  transfer_case: 'transfer case gearbox t-case',
  axle: 'axle differential diff',
};

/** What a person may type that stands in no other column. */
export async function wordsOf(tx: Tx, row: ListingRow, seller: SellerRow): Promise<string> {
  const unit = row.variantId ? await unitOf(tx, row.variantId) : null;
  if (!unit) return '';
  return [KIND_WORDS[unit.kind], unit.variantName, seller.name, seller.city, seller.region].join(' ');
}

type UnitColumns = Pick<NewListing, 'variantId' | 'familyId' | 'kind' | 'title'>;

async function chosenUnit(tx: Tx, body: ChangeBody): Promise<UnitColumns | Refusal | null> {
  if (body.variantId) {
    const unit = await unitOf(tx, body.variantId);
    if (!unit) return invalid('variantId', 'There is no such unit in the catalogue');
    return { variantId: unit.variantId, familyId: unit.family.id, kind: unit.kind, title: unit.title };
  }
  if (body.variantId === null) return { variantId: null, familyId: null, kind: body.kind ?? null, title: '' };
  return null;
}

/** The variant that a new code names, where nobody has chosen one: only when exactly one fits. */
async function unitByCode(tx: Tx, body: ChangeBody, before: ListingRow | null): Promise<UnitColumns | null> {
  if (!body.caseCode || before?.variantId) return null;
  const variantId = await variantByCode(tx, body.caseCode);
  const unit = variantId ? await unitOf(tx, variantId) : null;
  return unit && { variantId: unit.variantId, familyId: unit.family.id, kind: unit.kind, title: unit.title };
}

/** The columns that say which unit it is, from what was chosen or from the code; the donor must be the seller's own. */
export async function settleUnit(
  tx: Tx,
  sellerId: string,
  body: ChangeBody,
  before: ListingRow | null,
): Promise<{ columns: Partial<NewListing> } | Refusal> {
  if (body.donorVehicleId) {
    const donor = await findDonor(tx, body.donorVehicleId);
    if (donor?.sellerId !== sellerId)
      return invalid('donorVehicleId', 'There is no such donor vehicle of yours');
  }
  const chosen = await chosenUnit(tx, body);
  if (isRefusal(chosen)) return chosen;
  if (chosen) return { columns: chosen };
  const read = await unitByCode(tx, body, before);
  if (read) return { columns: read };
  // Without a variant the kind alone picks the checklist; with one the family decides.
  return { columns: body.kind !== undefined && !before?.variantId ? { kind: body.kind } : {} };
}

async function variantByCode(tx: Tx, text: string): Promise<string | null> {
  const { candidates, verdict } = readCode(text, await currentBook(tx));
  return verdict === 'cannot_tell' ? null : (candidates[0]?.variantId ?? null);
}

/** The code taken apart as this variant bears it; null where it isn't one of its codes. */
export async function readCodeOf(tx: Tx, text: string, variantId: string): Promise<ListingPage['code']> {
  const book = await currentBook(tx);
  const own = book.filter((entry) => entry.variantId === variantId);
  const [candidate] = readCode(text, own).candidates;
  return candidate ? { text, segments: [...candidate.segments], builtOn: candidate.builtOn } : null;
}
