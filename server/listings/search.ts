// Search over units on offer: statements composed of only the filters present, named so that each is planned once, pages by
// row comparison. Sellers' names and places come from their table by join: it is the one read that crosses features.
import { createHash } from 'node:crypto';
import type { Pool, QueryResultRow } from 'pg';
import type { SearchQuery } from '../../shared/listings/card';
import { writeCursor, type Mode, type Order, type Place } from './search-cursor';
import {
  conditions,
  keyset,
  looksLikeCode,
  newValues,
  sellersNear,
  type Ask,
  type Point,
  type Values,
} from './search-parts';

export interface CardRow extends QueryResultRow {
  readonly id: string;
  readonly title: string;
  readonly kind: string;
  readonly family_id: string;
  readonly variant_id: string;
  readonly case_code: string;
  readonly code_key: string;
  readonly grade: string;
  readonly state: string;
  readonly price_cents: number;
  readonly exchange: boolean;
  readonly deposit_cents: number | null;
  readonly outright: boolean;
  readonly outright_cents: number | null;
  readonly total_cents: number;
  readonly seller_id: string;
  readonly zip: string;
  readonly lat: number | null;
  readonly lon: number | null;
  readonly cover_photo_id: string | null;
  readonly photo_count: number;
  readonly listed_at: Date;
  readonly seller_name: string;
  readonly city: string;
  readonly region: string;
  /** Miles, only where the statement measured them. */
  readonly d?: number;
}

const COLUMNS = `l.id, l.title, l.kind, l.family_id, l.variant_id, l.case_code, l.code_key, l.grade, l.state, l.price_cents,
  l.exchange, l.deposit_cents, l.outright, l.outright_cents, l.total_cents, l.seller_id, l.zip, l.lat, l.lon,
  l.cover_photo_id, l.photo_count, l.listed_at`;

export interface Statement {
  readonly name: string;
  readonly text: string;
  readonly values: unknown[];
}

/** Named after its text: the server then keeps one plan for each form on each connection. */
export const named = (text: string, values: unknown[]): Statement => ({
  name: `ls_${createHash('sha256').update(text).digest('hex').slice(0, 24)}`,
  text,
  values,
});

/** The order a question is answered in. Words come newest first: ranking a common word would read every match. */
export function orderOf(query: SearchQuery, mode: Mode): Order {
  switch (query.sort ?? 'best') {
    case 'price':
      return 'total';
    case 'newest':
      return 'newest';
    case 'distance':
      return 'distance';
    case 'best':
      if (mode === 'code') return 'code';
      return mode === 'none' ? 'total' : 'newest';
  }
}

const withNames = (page: string, orderBy: string): string =>
  `select c.*, s.name as seller_name, s.city, s.region from (${page}) c join sellers s on s.id = c.seller_id
   order by ${orderBy}`;

/** Each seller gives at most a page of its own; the inner order is the outer one, so nothing can be lost between pages. */
function nearPage(ask: Ask, order: Order, keys: Place['keys'], limit: number, values: Values): string {
  const where = conditions(ask, values);
  const byDistance = order === 'distance';
  const [lastMiles, lastSeller, ...lastRow] = byDistance ? keys : [];
  const inner = keyset(order, byDistance ? [] : keys, 'l', values);
  const sellers = sellersNear(ask, values) ?? '';
  const take = values.take(limit);
  const outerOrder = byDistance
    ? 'd, seller_id, total_cents, id'
    : keyset(order, [], 'c', newValues()).orderBy;
  let outer = '';
  if (byDistance && lastMiles !== undefined && lastSeller !== undefined) {
    const at = `(${values.take(lastMiles)}::float8, ${values.take(lastSeller)}::text)`;
    outer = `where (n.d, n.id) >= ${at}`;
    const after = lastRow.map((key) => values.take(key)).join(', ');
    where.push(`((n.d, n.id) > ${at} or (l.total_cents, l.id) > (${after}))`);
  } else if (inner.after) where.push(inner.after);
  const page = `select c.*, n.d from (select * from (${sellers}) n ${outer} order by n.d, n.id) n
    cross join lateral (select ${COLUMNS} from listings l where l.seller_id = n.id and ${where.join(' and ')}
      order by ${inner.orderBy} limit ${take}) c
    order by ${byDistance ? 'n.d, n.id, c.total_cents, c.id' : outerOrder} limit ${take}`;
  return withNames(page, byDistance ? 'c.d, c.seller_id, c.total_cents, c.id' : outerOrder);
}

function plainPage(ask: Ask, order: Order, keys: Place['keys'], limit: number, values: Values): string {
  const where = conditions(ask, values);
  const inner = keyset(order, keys, 'l', values);
  if (inner.after) where.push(inner.after);
  const near = ask.query.withinMiles === undefined ? null : sellersNear(ask, values);
  const from = near ? `(${near}) n join listings l on l.seller_id = n.id` : 'listings l';
  const page = `select ${COLUMNS}${near ? ', n.d' : ''} from ${from} where ${where.join(' and ')}
    order by ${inner.orderBy} limit ${values.take(limit)}`;
  return withNames(page, keyset(order, [], 'c', newValues()).orderBy);
}

/** The statement of one page; one row more than asked for, to know whether there is a next page. */
export function pageStatement(ask: Ask, order: Order, keys: Place['keys']): Statement {
  const values = newValues();
  const limit = ask.query.limit + 1;
  const matching = ask.mode !== 'none';
  const perSeller = order === 'distance' || (ask.query.withinMiles !== undefined && !matching);
  const text = perSeller
    ? nearPage(ask, order, keys, limit, values)
    : plainPage(ask, order, keys, limit, values);
  return named(text, values.list);
}

function keysOf(row: CardRow, order: Order): (string | number)[] {
  switch (order) {
    case 'total':
      return [row.total_cents, row.id];
    case 'newest':
      return [row.listed_at.toISOString(), row.id];
    case 'code':
      return [row.code_key, row.total_cents, row.id];
    case 'distance':
      return [row.d ?? 0, row.seller_id, row.total_cents, row.id];
  }
}

/** Trigrams in common that make two words nearly the same; the server's own 0.6 misses one swapped letter in four. */
const NEAR_ENOUGH = 0.45;

/** Runs one statement; nearly-the-same words need their threshold set, which must not outlive the statement. */
export async function run<T extends QueryResultRow>(
  pool: Pool,
  mode: Mode,
  statement: Statement,
): Promise<T[]> {
  if (mode !== 'near') return (await pool.query<T>(statement)).rows;
  const client = await pool.connect();
  try {
    await client.query('begin read only');
    await client.query(`set local pg_trgm.word_similarity_threshold = ${NEAR_ENOUGH}`);
    const { rows } = await client.query<T>(statement);
    await client.query('commit');
    client.release();
    return rows;
  } catch (error) {
    client.release(true);
    throw error;
  }
}

/** Is there any unit on offer that the words match, whatever the other filters? */
async function matchesAny(pool: Pool, query: SearchQuery, mode: Mode): Promise<boolean> {
  const values = newValues();
  const bare: SearchQuery = { q: query.q, limit: 1 };
  const where = conditions({ query: bare, mode, from: null }, values).join(' and ');
  const statement = named(`select 1 from listings l where ${where} limit 1`, values.list);
  return (await run(pool, mode, statement)).length > 0;
}

export interface Found {
  readonly rows: CardRow[];
  readonly next: string | null;
  readonly ask: Ask;
}

async function pageOf(pool: Pool, ask: Ask, order: Order, keys: Place['keys']): Promise<Found> {
  const rows = await run<CardRow>(pool, ask.mode, pageStatement(ask, order, keys));
  const shown = rows.slice(0, ask.query.limit);
  const last = shown.at(-1);
  const more = rows.length > shown.length && last !== undefined;
  return {
    rows: shown,
    ask,
    next: more ? writeCursor({ mode: ask.mode, order, keys: keysOf(last, order) }) : null,
  };
}

/**
 * One page of results. A first page decides how the words are meant: as a case code or its beginning, else as words, else
 * as nearly these words; the cursor keeps that decision for the pages after it.
 */
export async function findListings(
  pool: Pool,
  query: SearchQuery,
  from: Point | null,
  place: Place | null,
): Promise<Found> {
  if (place) return pageOf(pool, { query, mode: place.mode, from }, place.order, place.keys);
  const firstPage = (mode: Mode): Promise<Found> =>
    pageOf(pool, { query, mode, from }, orderOf(query, mode), []);
  if (!query.q) return firstPage('none');
  const modes: Mode[] = looksLikeCode(query.q) ? ['code', 'words'] : ['words'];
  for (const mode of modes) {
    const found = await firstPage(mode);
    // Matched but filtered away is an honest nothing, not a reason to show something else.
    if (found.rows.length > 0 || (await matchesAny(pool, query, mode))) return found;
  }
  return firstPage('near');
}
