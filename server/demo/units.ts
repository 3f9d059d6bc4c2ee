// About four hundred units on sale, spread over the sellers, each with a code its variant can bear and photos by shot.
import type { Actor } from '../../shared/accounts/actor';
import type { CatalogueData } from '../../shared/catalogue/contract';
import type { UnitKind } from '../../shared/catalogue/kinds';
import { checklist, type Answer, type Answers } from '../../shared/listings/condition';
import { requiredShots, shotList } from '../../shared/listings/shots';
import { composeCode } from '../../shared/reading/compose-code';
import type { Deps } from '../deps';
import { isRefusal } from '../http/refusal';
import { createDraft } from '../listings/create-draft';
import { publishDraft } from '../listings/publish';
import { insertListingPhoto, lockListing, shotsOf, updateListing } from '../listings/queries';
import { coverOf } from '../listings/cover';
import { linkPhoto, storePhoto } from '../photos/for-others';
import type { Cast, SeededSeller } from './people';
import { pictureOf } from './pictures';
import { chanceOf, type Chance } from './random';
import { drawCodePad } from './stand-in';

type Variant = CatalogueData['variants'][number];
type Family = CatalogueData['families'][number];

const UNITS = 404;
const DAY_MS = 86_400_000;

const NOTES = [
  'Ran fine, truck was rolled. Pulled last week.',
  'Slipped in second. Hard parts look good.',
  'Pan was never off. Drained two days.',
  'Came out of a work truck with full history.',
  'Reverse only. Good case and converter.',
  'Matched pair: the transfer case is on sale too.',
  '',
  '',
];

const BASE_CENTS: Readonly<Record<UnitKind, number>> = {
  automatic: 98_000,
  manual: 74_000,
  transfer_case: 52_000,
  axle: 61_000,
};

/** Mostly yes; a fault here and there, and now and then something nobody looked at. */
function answersOf(kind: UnitKind, chance: Chance): Record<string, Answer> {
  const given: Record<string, Answer> = {};
  for (const one of checklist(kind)) {
    const roll = chance.next();
    const never = one.effect === 'refused' || one.effect === 'not_core' || one.code === 'drained';
    if (never || roll < 0.9) given[one.code] = 'yes';
    else given[one.code] = roll < 0.96 || !one.mayBeUnknown ? 'no' : 'unknown';
  }
  return given;
}

const weighted = (all: readonly SeededSeller[], chance: Chance): SeededSeller => {
  let roll = chance.next() * all.reduce((sum, one) => sum + one.spec.weight, 0);
  for (const one of all) {
    roll -= one.spec.weight;
    if (roll < 0) return one;
  }
  return chance.pick(all);
};

async function addPictures(
  deps: Deps,
  actor: Actor,
  listing: { id: string; sellerId: string },
  kind: UnitKind,
  code: string,
  given: Answers,
  chance: Chance,
) {
  const needed = requiredShots(kind, 'pulled', given);
  for (const shot of shotList(kind)) {
    if (!needed.some((one) => one.code === shot.code)) continue;
    const bytes =
      shot.code === 'code' ? await drawCodePad(code) : await pictureOf(kind, shot.code, shot.number, chance);
    const photo = await storePhoto(deps, {
      bytes,
      ownerUserId: actor.userId,
      sellerId: listing.sellerId,
      purpose: 'listing',
      shot: shot.code,
      position: shot.number,
      drawn: true,
    });
    if (isRefusal(photo)) throw new Error(photo.detail);
    await deps.db.transaction(async (tx) => {
      await insertListingPhoto(tx, {
        listingId: listing.id,
        photoId: photo.id,
        shot: shot.code,
        position: shot.number,
      });
      await linkPhoto(tx, photo.id, 'listing', listing.id);
    });
  }
  await deps.db.transaction(async (tx) => {
    const row = await lockListing(tx, listing.id);
    if (row) await updateListing(tx, row, coverOf(await shotsOf(tx, listing.id)), deps.clock.now());
  });
}

const between = (from: string, to: string, chance: Chance): string => {
  const start = Date.parse(from);
  return new Date(start + Math.floor(chance.next() * (Date.parse(to) - start))).toISOString().slice(0, 10);
};

const freightOf = (family: Family) => ({
  weightLb: Math.round(family.dryWeightLb + 55),
  lengthIn: Math.min(96, Math.max(40, Math.ceil(family.lengthMm / 25.4) + 4)),
  widthIn: Math.max(24, Math.ceil(family.widthMm / 25.4) + 6),
  heightIn: Math.max(20, Math.ceil(family.heightMm / 25.4) + 8),
});

export interface SeededUnit {
  readonly listingId: string;
  readonly seller: SeededSeller;
  readonly familyId: string;
  readonly variantId: string;
  readonly kind: UnitKind;
  readonly code: string;
}

export interface UnitWish {
  readonly seller: SeededSeller;
  readonly variant: Variant;
  readonly family: Family;
}

/** Lists and publishes one unit the way a lister does. */
export async function seedUnit(deps: Deps, cast: Cast, wish: UnitWish, chance: Chance): Promise<SeededUnit> {
  const { seller, variant, family } = wish;
  const lister = seller.spec.members.find(([, duties]) => duties.includes('lister'));
  const actor = await cast.actor(lister?.[0] ?? '');
  const pattern = chance.pick(variant.codePatterns);
  const code = composeCode(pattern, {
    builtOn: between(variant.builtFrom, variant.builtTo, chance),
    pick: (choices) => chance.pick(choices),
  });
  const given = answersOf(family.kind, chance);
  const priceCents = Math.round((BASE_CENTS[family.kind] * (0.6 + chance.next() * 1.1)) / 1_000) * 1_000;
  const draft = await createDraft(deps, actor, {
    sellerId: seller.id,
    variantId: variant.id,
    kind: family.kind,
    caseCode: code,
    state: 'pulled',
    mileage: chance.next() < 0.15 ? null : chance.whole(42, 260) * 1_000,
    condition: given,
    priceCents,
    freight: freightOf(family),
    notes: chance.pick(NOTES),
  });
  if (isRefusal(draft))
    throw new Error(`draft of ${code}: ${draft.detail} ${JSON.stringify(draft.errors ?? [])}`);
  await addPictures(deps, actor, { id: draft.row.id, sellerId: seller.id }, family.kind, code, given, chance);
  const live = await publishDraft(deps, actor, draft.row.id, undefined);
  if (isRefusal(live))
    throw new Error(`publish ${code}: ${live.detail} ${JSON.stringify(live.errors ?? [])}`);
  return {
    listingId: draft.row.id,
    seller,
    familyId: family.id,
    variantId: variant.id,
    kind: family.kind,
    code,
  };
}

/** Every kind is on sale, automatics most. */
function wishOf(data: CatalogueData, cast: Cast, chance: Chance): UnitWish {
  const kind = chance.pick<UnitKind>([
    'automatic',
    'automatic',
    'automatic',
    'manual',
    'transfer_case',
    'axle',
  ]);
  const families = data.families.filter((family) => family.kind === kind);
  const family = chance.pick(families);
  const variants = data.variants.filter(
    (variant) => variant.familyId === family.id && variant.codePatterns.length > 0,
  );
  const variant = chance.pick(variants);
  return { family, variant, seller: weighted(cast.sellers, chance) };
}

export interface MovableClock {
  set(at: Date): void;
}

export async function seedUnits(
  deps: Deps,
  cast: Cast,
  data: CatalogueData,
  clock: MovableClock,
  now: Date,
): Promise<SeededUnit[]> {
  const chance = chanceOf(2026);
  const units: SeededUnit[] = [];
  for (let i = 0; i < UNITS; i += 1) {
    // Listed over the last three months, the newest minutes ago.
    const age = i === 0 ? 0 : ((UNITS - i) / UNITS) ** 2 * 90;
    clock.set(new Date(now.getTime() - age * DAY_MS - 4 * 60_000));
    units.push(await seedUnit(deps, cast, wishOf(data, cast, chance), chance));
  }
  return units;
}
