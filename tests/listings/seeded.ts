// Several hundred made-up units in a database, from a fixed seed, with ties in every order that search knows.
import type { Pool } from 'pg';
import type { Row } from './oracle';

/** A small generator with a fixed start (mulberry32), so that a failure comes back. */
export function random(seed: number): {
  below(n: number): number;
  pick<T>(list: readonly T[]): T;
  chance(p: number): boolean;
} {
  let state = seed >>> 0;
  const next = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4_294_967_296;
  };
  const below = (n: number): number => Math.floor(next() * n);
  return {
    below,
    chance: (p) => next() < p,
    pick: (list) => {
      const item = list[below(list.length)];
      if (item === undefined) throw new Error('nothing to pick from');
      return item;
    },
  };
}

const KINDS = ['automatic', 'manual', 'transfer_case', 'axle'] as const;
const MAKERS = ['Keld', 'Corvane', 'Brandt', 'Ostrow', 'Tillage'];
const STATUSES = ['live', 'live', 'live', 'live', 'reserved', 'sold', 'withdrawn', 'draft'];
const NOTES = ['runs good', 'pulled for engine', 'low miles', 'surface rust', 'towed in rust', ''];

export interface Seeded {
  readonly rows: Row[];
  readonly families: readonly string[];
  readonly variants: readonly string[];
  readonly sellers: readonly { id: string; lat: number; lon: number }[];
}

const pad = (value: number, size: number): string => String(value).padStart(size, '0');

async function seedCatalogue(
  pool: Pool,
): Promise<{ familyId: string; variantId: string; kind: string; title: string; words: string }[]> {
  const made = [];
  for (let i = 0; i < 20; i += 1) {
    const kind = KINDS[i % 4] ?? 'axle';
    const maker = MAKERS[i % 5] ?? 'Keld';
    const family = { id: `fam_s${pad(i, 3)}`, maker, designation: `${60 + i}A` };
    await pool.query(
      `insert into families (id, kind, maker_id, maker, designation, gears, forward_ratios, control, dry_weight_lb, length_mm,
         width_mm, height_mm, fluid, fluid_litres, bench_hours, failure_points, hard_parts, source)
       values ($1, $2, $3, $4, $5, '{}', '[]', 'none', 200, 700, 400, 400, 'gear oil', 2, '{}', '[]', '[]', 'made for a test')`,
      [family.id, kind, `mak_${maker.toLowerCase()}`, maker, family.designation],
    );
    for (const drive of ['4x4', '4x2']) {
      const variantId = `var_s${pad(i, 3)}_${drive}`;
      await pool.query(
        `insert into variants (id, family_id, label, year_from, year_to, built_from, built_to, interfaces, code_patterns, source)
         values ($1, $2, $3, 1990, 2010, '1990-01-01', '2010-12-31', '{}', '[]', 'made for a test')`,
        [variantId, family.id, drive],
      );
      const title = `${maker} ${family.designation} ${drive}`;
      made.push({ familyId: family.id, variantId, kind, title, words: kind.replace('_', ' ') });
    }
  }
  return made;
}

async function seedSellers(pool: Pool, count: number, seed: number): Promise<Seeded['sellers']> {
  const dice = random(seed);
  const sellers = Array.from({ length: count }, (_, i) => ({
    id: `slr_s${pad(i, 4)}`,
    lat: 30 + dice.below(18_000_000) / 1_000_000,
    lon: -120 + dice.below(45_000_000) / 1_000_000,
  }));
  for (const seller of sellers) {
    await pool.query(
      `insert into sellers (id, name, kind, zip, city, region, lat, lon, time_zone, terms, created_at)
       values ($1, $2, 'yard', '83702', 'Town', 'ID', $3, $4, 'America/Boise', '{}', now())`,
      [seller.id, `Yard ${seller.id}`, seller.lat, seller.lon],
    );
  }
  return sellers;
}

/** @param count how many listings; about half of them are on offer */
export async function seedListings(pool: Pool, count: number, sellerCount = 40, seed = 7): Promise<Seeded> {
  const dice = random(seed);
  const units = await seedCatalogue(pool);
  const sellers = await seedSellers(pool, sellerCount, seed + 1);
  await pool.query(
    `insert into users (id, name, email, password_hash, created_at) values ('usr_seed', 'Seed', 'seed@test.example', 'x', now())`,
  );
  await pool.query(
    `insert into photos (id, owner_user_id, purpose, sha256, stored_sha256, width_px, height_px, bytes, created_at)
     values ('pho_seed', 'usr_seed', 'listing', repeat('a', 64), repeat('b', 64), 4, 3, 9, now())`,
  );
  const start = Date.UTC(2026, 0, 1);
  const rows = Array.from({ length: count }, (_, i): Row & { priceCents: number; depositCents: number } => {
    const unit = dice.pick(units);
    const seller = dice.pick(sellers);
    const priceCents = 20_000 + 5_000 * dice.below(30);
    const depositCents = 10_000 * (1 + dice.below(4));
    const exchange = dice.chance(0.75);
    const outright = !exchange || dice.chance(0.4);
    return {
      id: `lst_s${pad(dice.below(10_000_000), 7)}_${pad(i, 6)}`,
      sellerId: seller.id,
      ...unit,
      notes: dice.pick(NOTES),
      caseCode: `${dice.pick(['K66A', 'K66B', 'C7R', 'BX40'])} ${dice.pick(['4X', '2X'])} D${dice.below(4)} ${pad(dice.below(400), 5)}`,
      grade: dice.pick(['A', 'B', 'B', 'C', 'D']),
      state: dice.pick(['pulled', 'pulled', 'in_vehicle']),
      status: dice.pick(STATUSES),
      exchange,
      outright,
      priceCents,
      depositCents,
      totalCents: exchange ? priceCents + depositCents : priceCents + 40_000,
      // Few distinct days: many units share one instant.
      listedAt: new Date(start + dice.below(60) * 86_400_000).toISOString(),
      lat: seller.lat,
      lon: seller.lon,
    };
  });
  for (const row of rows) await insertListing(pool, row);
  await pool.query('analyze listings, sellers, families');
  return {
    rows,
    families: [...new Set(units.map((unit) => unit.familyId))],
    variants: units.map((unit) => unit.variantId),
    sellers,
  };
}

export async function insertListing(
  pool: Pool,
  row: Row & { priceCents: number; depositCents: number },
): Promise<void> {
  await pool.query(
    `insert into listings (id, seller_id, variant_id, family_id, kind, title, words, case_code, code_key, tag_code, grade, state,
       status, price_cents, exchange, deposit_cents, outright, outright_cents, total_cents, window_days, return_freight, freight,
       notes, zip, lat, lon, photo_count, cover_photo_id, created_at, updated_at, published_at, listed_at)
     values ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15, $16, $17, $18, $19, 45, 'seller',
       '{"weightLb":200,"lengthIn":40,"widthIn":32,"heightIn":30}', $20, '83702', $21, $22, 1, 'pho_seed', $23, $23, $23, $23)`,
    [
      row.id,
      row.sellerId,
      row.variantId,
      row.familyId,
      row.kind,
      row.title,
      row.words,
      row.caseCode,
      row.caseCode.replaceAll(' ', ''),
      row.id,
      row.grade,
      row.state,
      row.status,
      row.priceCents,
      row.exchange,
      row.exchange ? row.depositCents : null,
      row.outright,
      row.outright ? row.priceCents + 40_000 : null,
      row.totalCents,
      row.notes,
      row.lat,
      row.lon,
      row.listedAt,
    ],
  );
}
