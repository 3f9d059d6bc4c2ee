// Every address of the product, once, with a typed builder: renaming a URL is one edit here.

type Names<Pattern extends string> = Pattern extends `${string}:${infer Name}/${infer Rest}`
  ? Name | Names<`/${Rest}`>
  : Pattern extends `${string}:${infer Name}`
    ? Name
    : never;

type Params<Pattern extends string> = Readonly<Record<Names<Pattern>, string>>;

/** Left-out, null and empty values do not appear in the address. */
export type Query = Readonly<Record<string, string | number | boolean | null | undefined>>;

type ToArguments<Pattern extends string> = [Names<Pattern>] extends [never]
  ? [query?: Query]
  : [params: Params<Pattern>, query?: Query];

export interface Path<Pattern extends string> {
  /** For the router. */
  readonly pattern: Pattern;
  /** For links: `paths.order.to({ id })`, `paths.results.to({ q: 'K66A' })`. */
  readonly to: (...input: ToArguments<Pattern>) => string;
}

function search(query: Query): string {
  const text = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) {
    if (value !== null && value !== undefined && value !== '') text.set(key, String(value));
  }
  const joined = text.toString();
  return joined ? `?${joined}` : '';
}

function path<const Pattern extends string>(pattern: Pattern): Path<Pattern> {
  const hasParams = pattern.includes(':');
  return {
    pattern,
    to: (...input) => {
      const [first = {}, second = {}] = input;
      const params: Query = hasParams ? first : {};
      const filled = pattern.replace(/:(\w+)/g, (_, name: string) =>
        encodeURIComponent(String(params[name] ?? '')),
      );
      return filled + search(hasParams ? second : first);
    },
  };
}

export const paths = {
  home: path('/'),
  results: path('/units'),
  listing: path('/units/:id'),
  codeReader: path('/code'),
  tag: path('/t/:tag'),
  families: path('/catalogue'),
  family: path('/catalogue/:id'),

  signIn: path('/sign-in'),
  signUp: path('/sign-up'),
  checkMail: path('/check-mail'),
  verify: path('/verify/:token'),
  forgot: path('/forgot'),
  reset: path('/reset/:token'),
  invite: path('/invite/:token'),
  account: path('/account'),

  orders: path('/orders'),
  order: path('/orders/:id'),
  bookReturn: path('/orders/:id/return'),
  checkoutDone: path('/orders/:id/paid'),
  cases: path('/cases'),
  case: path('/cases/:id'),

  yard: path('/yard'),
  yardStock: path('/yard/stock'),
  yardListing: path('/yard/stock/:id'),
  newListing: path('/yard/list'),
  yardOrders: path('/yard/orders'),
  receiving: path('/yard/receiving'),
  receive: path('/yard/receiving/:orderId'),
  payouts: path('/yard/payouts'),
  team: path('/yard/team'),
  terms: path('/yard/terms'),

  admin: path('/admin'),
  adminCases: path('/admin/cases'),
  adminSellers: path('/admin/sellers'),
  adminCatalogue: path('/admin/catalogue'),
  adminLedger: path('/admin/ledger'),
  adminReconciliation: path('/admin/reconciliation'),
  adminAudit: path('/admin/audit'),
  adminHealth: path('/admin/health'),
} as const;

/** Where to go after signing in: only an address of this site, never one that leads away from it. */
export function safeNext(next: string | null): string {
  const isOurs = next !== null && /^\/(?![/\\])/.test(next);
  return isOurs ? next : paths.home.to();
}
