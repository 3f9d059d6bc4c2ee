// Form bodies and queries with brackets (`line_items[0][price_data][currency]=usd`) to nested values and back to names.
import { z } from 'zod';
import { badParam } from './errors';

type FormValue = string | FormValue[] | { [key: string]: FormValue };
type Branch = Map<string, string | Branch>;

const NAME = /^([^[\]]+)((?:\[[^[\]]*\])*)$/;

function pathOf(name: string): string[] {
  const parts = NAME.exec(name);
  if (parts === null) throw badParam(`Invalid parameter name: ${name}`, 'parameter_unknown', name);
  const [, head = '', tail = ''] = parts;
  return [head, ...Array.from(tail.matchAll(/\[([^[\]]*)\]/g), (part) => part[1] ?? '')];
}

function place(root: Branch, path: readonly string[], value: string): void {
  let at = root;
  for (const [depth, raw] of path.entries()) {
    // `expand[]=x` appends.
    const key = raw === '' ? String(at.size) : raw;
    if (depth === path.length - 1) {
      at.set(key, value);
      return;
    }
    const found = at.get(key);
    const next = typeof found === 'object' ? found : new Map<string, string | Branch>();
    at.set(key, next);
    at = next;
  }
}

/** A branch whose keys are 0, 1, 2 … is a list. */
function listed(value: string | Branch): FormValue {
  if (typeof value === 'string') return value;
  const keys = Array.from(value.keys());
  if (keys.length > 0 && keys.every((key) => /^\d+$/.test(key))) {
    keys.sort((left, right) => Number(left) - Number(right));
    return keys.map((key) => listed(value.get(key) ?? ''));
  }
  return entriesOf(value);
}

const entriesOf = (branch: Branch): { [key: string]: FormValue } =>
  Object.fromEntries(Array.from(branch, ([key, value]) => [key, listed(value)]));

export function decodeForm(encoded: string): { [key: string]: FormValue } {
  const root: Branch = new Map();
  for (const [name, value] of new URLSearchParams(encoded)) place(root, pathOf(name), value);
  return entriesOf(root);
}

const bracketed = (path: readonly PropertyKey[]): string =>
  path.map((part, depth) => (depth === 0 ? String(part) : `[${String(part)}]`)).join('');

/**
 * Parses decoded parameters.
 * @throws ProviderError naming the first parameter that is unknown, missing or malformed
 */
export function readParams<T>(shape: z.ZodType<T>, form: unknown): T {
  const parsed = shape.safeParse(form, { reportInput: true });
  if (parsed.success) return parsed.data;
  const issue = parsed.error.issues[0];
  const name = bracketed(issue?.path ?? []);
  if (issue?.code === 'unrecognized_keys') {
    const unknown = bracketed([...issue.path, issue.keys[0] ?? '']);
    throw badParam(`Received unknown parameter: ${unknown}`, 'parameter_unknown', unknown);
  }
  if (issue !== undefined && issue.input === undefined)
    throw badParam(`Missing required param: ${name}.`, 'parameter_missing', name);
  throw badParam(`Invalid ${name}: ${issue?.message ?? 'malformed'}`, 'parameter_invalid', name);
}

export const integer = z
  .string()
  .regex(/^-?\d{1,15}$/, 'must be an integer')
  .transform(Number);

export const positive = integer.refine((value) => value > 0, 'must be at least 1');

export const currency = z
  .string()
  .regex(/^[A-Za-z]{3}$/, 'must be a currency')
  .transform((value) => value.toLowerCase());

/** Up to 50 keys; a list arises where every key is a number, and is turned back. */
export const metadata = z
  .preprocess(
    (value) => (Array.isArray(value) ? Object.fromEntries(value.entries()) : value === '' ? {} : value),
    z.record(z.string().max(40), z.string().max(500)),
  )
  .refine((value) => Object.keys(value).length <= 50, 'has more than 50 keys')
  .transform((value) => Object.fromEntries(Object.entries(value).filter(([, text]) => text !== '')));

export const webUrl = z.string().regex(/^https?:\/\/[^\s]+$/, 'not a valid URL');

export const expandParam = z.array(z.string()).default([]);
