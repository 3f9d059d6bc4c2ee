// `expand[]`: puts whole objects in the place of their ids, as deep as the path says.
import { badParam } from './errors';
import type { State } from './state';

type Lookup = (id: string) => unknown;

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const FIELDS = new Set([
  'balance_transaction',
  'charge',
  'destination',
  'failure_balance_transaction',
  'latest_charge',
  'line_items',
  'payment_intent',
  'source',
  'source_transaction',
  'transfer',
  'data',
]);

export function createLookup(state: State): Lookup {
  return (id) => {
    const prefix = id.split('_')[0] ?? '';
    if (prefix === 'cs') return state.sessions.get(id);
    if (prefix === 'pi') return state.paymentIntents.get(id);
    if (prefix === 'ch') return state.charges.get(id);
    if (prefix === 're') return state.refunds.get(id);
    if (prefix === 'tr') return state.transfers.get(id);
    if (prefix === 'trr') return state.transferReversals.get(id);
    if (prefix === 'acct') return state.accounts.get(id);
    if (prefix === 'du') return state.disputes.get(id);
    if (prefix === 'po') return state.payouts.get(id);
    if (prefix === 'txn') return state.balanceTransactions.get(id);
    return undefined;
  };
}

function expandOne(value: unknown, path: readonly string[], whole: string, lookup: Lookup): unknown {
  const [field, ...rest] = path;
  if (field === undefined) return value;
  if (Array.isArray(value)) return value.map((item: unknown) => expandOne(item, path, whole, lookup));
  if (!isRecord(value)) return value;
  if (!FIELDS.has(field) || (!(field in value) && field !== 'line_items')) {
    throw badParam(`This property cannot be expanded (${whole}).`, 'parameter_invalid', `expand[]`);
  }
  const held = value[field];
  if (field === 'data' && Array.isArray(held))
    return { ...value, data: expandOne(held, rest, whole, lookup) };
  const found = typeof held === 'string' ? lookup(held) : held;
  return { ...value, [field]: expandOne(found ?? held, rest, whole, lookup) };
}

/** @throws ProviderError 400 for a path that leads nowhere */
export const expand = (value: unknown, paths: readonly string[], lookup: Lookup): unknown =>
  paths.reduce((current, path) => expandOne(current, path.split('.'), path, lookup), value);
