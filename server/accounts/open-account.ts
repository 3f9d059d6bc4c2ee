// Opening an account, and a seller account with its first owner.
import { newId } from '../../shared/kernel/ids';
import type { SellerKind } from '../../shared/accounts/actor';
import { isUniqueViolation, transaction } from '../db/transaction';
import type { Tx } from '../db/client';
import type { Deps } from '../deps';
import { locateZip } from '../geo/zip';
import { invalid, isRefusal, type Refusal } from '../http/refusal';
import { queueMail } from '../notices/for-others';
import { FIRST_TERMS } from './first-terms';
import { recordAudit } from './for-others';
import { hashPassword } from './password';
import type { SellerRow } from './present';
import { sellerMembers, sellers, users } from './tables';
import { issueToken } from './tokens';

export interface NewSeller {
  readonly name: string;
  readonly kind: SellerKind;
  readonly zip: string;
}

export async function insertSeller(
  tx: Tx,
  ownerId: string,
  input: NewSeller,
  now: Date,
  zipPath: string,
): Promise<SellerRow | Refusal> {
  const place = locateZip(input.zip);
  if (!place) return invalid(zipPath, 'We do not know this ZIP code. Check it');
  const [row] = await tx
    .insert(sellers)
    .values({
      id: newId('slr', now.getTime()),
      name: input.name,
      kind: input.kind,
      zip: input.zip,
      city: place.city,
      region: place.state,
      lat: place.lat,
      lon: place.lon,
      timeZone: place.timeZone,
      terms: FIRST_TERMS,
      createdAt: now,
    })
    .returning();
  if (!row) throw new Error('the new seller was not returned');
  await tx
    .insert(sellerMembers)
    .values({ sellerId: row.id, userId: ownerId, duties: ['owner', 'lister', 'dock'], createdAt: now });
  await recordAudit(tx, {
    at: now,
    actorUserId: ownerId,
    actorKind: 'owner',
    action: 'seller.open',
    objectKind: 'seller',
    objectId: row.id,
    detail: { kind: input.kind },
  });
  return row;
}

export async function mailCheckLink(
  deps: Deps,
  tx: Tx,
  user: { id: string; name: string; email: string },
  now: Date,
): Promise<void> {
  const token = await issueToken(tx, user.id, 'check_mail', now);
  await queueMail(tx, {
    to: user.email,
    mail: {
      template: 'check_mail',
      data: { name: user.name, link: `${deps.env.PUBLIC_URL}/verify/${token}` },
    },
    key: `mail:check:${user.id}:${now.getTime()}`,
    now,
  });
}

export interface NewAccount {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly seller?: NewSeller | undefined;
}

const TAKEN = 'This address already has an account. Sign in, or set a new password';

/** @returns the new user's id */
export async function openAccount(deps: Deps, input: NewAccount): Promise<string | Refusal> {
  const now = deps.clock.now();
  const passwordHash = await hashPassword(input.password);
  const id = newId('usr', now.getTime());
  try {
    return await transaction(deps.db, async (tx): Promise<string | Refusal> => {
      await tx
        .insert(users)
        .values({ id, name: input.name, email: input.email, passwordHash, createdAt: now });
      if (input.seller) {
        const opened = await insertSeller(tx, id, input.seller, now, 'seller.zip');
        if (isRefusal(opened)) return opened;
      }
      await mailCheckLink(deps, tx, { id, name: input.name, email: input.email }, now);
      await recordAudit(tx, {
        at: now,
        actorUserId: id,
        actorKind: 'visitor',
        action: 'account.open',
        objectKind: 'user',
        objectId: id,
        detail: {},
      });
      return id;
    });
  } catch (error) {
    if (isUniqueViolation(error, 'users_email')) return invalid('email', TAKEN);
    throw error;
  }
}
