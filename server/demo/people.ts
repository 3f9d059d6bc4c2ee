// Who is in the demo: five builders, an admin and six sellers in different regions. All invented; the ZIP codes are real.
import { eq } from 'drizzle-orm';
import type { Duty, SellerKind } from '../../shared/accounts/actor';
import { newId } from '../../shared/kernel/ids';
import { loadActor } from '../accounts/load-actor';
import { FIRST_TERMS } from '../accounts/first-terms';
import { hashPassword } from '../accounts/password';
import { sellerMembers, sellers, users } from '../accounts/tables';
import type { Actor } from '../../shared/accounts/actor';
import type { Deps } from '../deps';
import { locateZip } from '../geo/zip';

export const DEMO_PASSWORD = 'one-way-only-2026';

interface DemoPerson {
  readonly email: string;
  readonly name: string;
  readonly admin?: boolean;
}

const PEOPLE: readonly DemoPerson[] = [
  { email: 'builder@demo.example', name: 'Ines Abara' },
  { email: 'builder2@demo.example', name: 'Tobias Wrenfield' },
  { email: 'builder3@demo.example', name: 'Mara Oduya' },
  { email: 'builder4@demo.example', name: 'Pell Hardacre' },
  { email: 'private@demo.example', name: 'Jonah Cresswell' },
  { email: 'admin@demo.example', name: 'Sunniva Dahl', admin: true },
  { email: 'owner@demo.example', name: 'Walt Quenby' },
  { email: 'lister@demo.example', name: 'Rosa Quenby' },
  { email: 'dock@demo.example', name: 'Dev Marlow' },
  { email: 'hask@demo.example', name: 'Greta Hask' },
  { email: 'tillage@demo.example', name: 'Omar Tillage' },
  { email: 'lowbridge@demo.example', name: 'Kit Lowbridge' },
  { email: 'ironvale@demo.example', name: 'Bea Ironvale' },
];

interface DemoSeller {
  readonly name: string;
  readonly kind: SellerKind;
  readonly zip: string;
  readonly members: readonly (readonly [email: string, duties: Duty[]])[];
  readonly depositCents: number;
  readonly windowDays: number;
  /** Share of the stock. */
  readonly weight: number;
  readonly paidOut: boolean;
}

const ALL: Duty[] = ['owner', 'lister', 'dock'];

export const SELLERS: readonly DemoSeller[] = [
  {
    name: 'Quenby Dismantlers',
    kind: 'yard',
    zip: '83702',
    members: [
      ['owner@demo.example', ['owner']],
      ['lister@demo.example', ['lister']],
      ['dock@demo.example', ['dock']],
    ],
    depositCents: 60_000,
    windowDays: 45,
    weight: 34,
    paidOut: true,
  },
  {
    name: 'Hask & Daughter Salvage',
    kind: 'yard',
    zip: '73301',
    members: [['hask@demo.example', ALL]],
    depositCents: 50_000,
    windowDays: 60,
    weight: 26,
    paidOut: true,
  },
  {
    name: 'Tillage Road Auto Yard',
    kind: 'yard',
    zip: '43085',
    members: [['tillage@demo.example', ALL]],
    depositCents: 60_000,
    windowDays: 30,
    weight: 18,
    paidOut: true,
  },
  {
    name: 'Low Bridge Pullers',
    kind: 'yard',
    zip: '30303',
    members: [['lowbridge@demo.example', ALL]],
    depositCents: 55_000,
    windowDays: 45,
    weight: 14,
    paidOut: true,
  },
  {
    name: 'Ironvale Rebuilding',
    kind: 'rebuilder',
    zip: '97203',
    members: [['ironvale@demo.example', ALL]],
    depositCents: 75_000,
    windowDays: 90,
    weight: 7,
    paidOut: true,
  },
  {
    name: 'Cresswell’s garage',
    kind: 'private',
    zip: '05401',
    members: [['private@demo.example', ALL]],
    depositCents: 30_000,
    windowDays: 30,
    weight: 1,
    paidOut: false,
  },
];

export interface SeededSeller {
  readonly id: string;
  readonly spec: DemoSeller;
}

async function insertPeople(deps: Deps, now: Date): Promise<Map<string, string>> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const ids = new Map<string, string>();
  for (const person of PEOPLE) {
    const id = newId('usr', now.getTime());
    ids.set(person.email, id);
    await deps.db.insert(users).values({
      id,
      name: person.name,
      email: person.email,
      passwordHash,
      mailCheckedAt: now,
      isAdmin: person.admin ?? false,
      createdAt: now,
    });
  }
  return ids;
}

/** Signs the seller up at the payment stand-in, as a person would on its page. */
async function signUpForPayouts(deps: Deps, sellerId: string, email: string): Promise<string> {
  const { accountId } = await deps.payments.openAccount({ sellerId, email }, `account:${sellerId}`);
  const host = deps.env.STRIPE_HOST;
  if (!host) throw new Error('the demo runs on the payment stand-in: set STRIPE_HOST');
  const answer = await fetch(`${host}/_onboard/${accountId}`, { method: 'POST' });
  if (!answer.ok) throw new Error(`the payment stand-in did not sign ${accountId} up`);
  return accountId;
}

/** A line that takes the whole deposit takes the whole of this seller's too. */
const FIRST_TERMS_DEPOSIT = FIRST_TERMS.depositCents ?? 0;

function termsOf(spec: DemoSeller): typeof FIRST_TERMS {
  return {
    ...FIRST_TERMS,
    depositCents: spec.depositCents,
    windowDays: spec.windowDays,
    // A deduction never exceeds the deposit.
    schedule: FIRST_TERMS.schedule.map((line) => ({
      ...line,
      cents: line.cents >= FIRST_TERMS_DEPOSIT ? spec.depositCents : Math.min(line.cents, spec.depositCents),
    })),
  };
}

async function insertSeller(
  deps: Deps,
  spec: DemoSeller,
  ids: Map<string, string>,
  now: Date,
): Promise<SeededSeller> {
  const place = locateZip(spec.zip);
  if (!place) throw new Error(`no place for ${spec.zip}`);
  const id = newId('slr', now.getTime());
  const [first] = spec.members;
  const accountId = spec.paidOut ? await signUpForPayouts(deps, id, first?.[0] ?? '') : null;
  await deps.db.insert(sellers).values({
    id,
    name: spec.name,
    kind: spec.kind,
    zip: spec.zip,
    city: place.city,
    region: place.state,
    lat: place.lat,
    lon: place.lon,
    timeZone: place.timeZone,
    verifiedAt: spec.kind === 'private' ? null : now,
    payoutAccountId: accountId,
    payoutsEnabled: spec.paidOut,
    terms: termsOf(spec),
    createdAt: now,
  });
  for (const [email, duties] of spec.members) {
    const userId = ids.get(email);
    if (!userId) throw new Error(`nobody is ${email}`);
    await deps.db.insert(sellerMembers).values({ sellerId: id, userId, duties: [...duties], createdAt: now });
  }
  return { id, spec };
}

export interface Cast {
  readonly sellers: readonly SeededSeller[];
  actor(email: string): Promise<Actor>;
}

export async function seedPeople(deps: Deps, now: Date): Promise<Cast> {
  const ids = await insertPeople(deps, now);
  const seeded: SeededSeller[] = [];
  for (const spec of SELLERS) seeded.push(await insertSeller(deps, spec, ids, now));
  return {
    sellers: seeded,
    actor: async (email) => {
      const actor = await loadActor(deps, ids.get(email) ?? '');
      if (!actor) throw new Error(`nobody is ${email}`);
      return actor;
    },
  };
}

export const hasPeople = async (deps: Deps): Promise<boolean> =>
  (await deps.db.select({ id: users.id }).from(users).where(eq(users.email, 'admin@demo.example'))).length >
  0;
