// Seller accounts on the wire: opening one, its public face, its terms, its team and invitations.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, cents, id, idParams, line, zip } from '../kernel/fields';
import type { FieldError } from '../kernel/problem';
import {
  returnFreight,
  scheduleErrors,
  scheduleItem,
  WINDOW_DAYS_MAX,
  WINDOW_DAYS_MIN,
} from '../listings/terms';
import { DUTIES, SELLER_KINDS } from './actor';
import { duties, email, linkToken, sellerIdentity } from './fields';

const days = (least: number, most: number) =>
  z
    .number('Type a number of days')
    .int('Type whole days')
    .min(least, `At least ${least} days`)
    .max(most, `At most ${most} days`);

const termsFields = z.strictObject({
  windowDays: days(WINDOW_DAYS_MIN, WINDOW_DAYS_MAX),
  /** Null: new listings start without exchange. */
  depositCents: cents.nullable(),
  schedule: z.array(scheduleItem).max(40, 'At most 40 deductions'),
  returnFreight,
  /** Business days from payment to the carrier's pickup. */
  shipDays: days(1, 60),
  graceDays: days(0, 30),
  outright: z.boolean(),
});
export type SellerTerms = z.output<typeof termsFields>;

function termsErrors(terms: SellerTerms): readonly FieldError[] {
  const { depositCents } = terms;
  if (depositCents !== null) return scheduleErrors({ ...terms, depositCents }, '');
  return terms.outright ? [] : [{ path: 'outright', message: 'Offer exchange, outright, or both' }];
}

/** What new listings of a seller start from; a deduction above the deposit or named twice is refused. */
export const sellerTerms = termsFields.superRefine((terms, context) => {
  for (const { path, message } of termsErrors(terms)) {
    context.addIssue({ code: 'custom', path: path.split('.').filter(Boolean), message });
  }
});

export const seller = z.object({
  id,
  name: z.string(),
  kind: z.enum(SELLER_KINDS),
  city: z.string(),
  region: z.string(),
  zip: z.string(),
  timeZone: z.string(),
  verified: z.boolean(),
  createdAt: at,
  /** Only for members. */
  terms: termsFields.nullable(),
  payoutsEnabled: z.boolean().nullable(),
});

export type Seller = z.output<typeof seller>;

export const openSeller = endpoint({
  method: 'POST',
  path: '/api/sellers',
  summary: 'Open a seller account and become its owner',
  access: 'signed_in',
  idempotent: true,
  perMinute: 10,
  body: sellerIdentity,
  answer: seller,
  status: 201,
});

export const getSeller = endpoint({
  method: 'GET',
  path: '/api/sellers/:id',
  summary: 'A seller as everybody sees it; members see its terms too',
  access: 'public',
  params: idParams,
  answer: seller,
});

export const updateSeller = endpoint({
  method: 'PATCH',
  path: '/api/sellers/:id',
  summary: 'Change the name or the place of a seller account',
  access: 'owner',
  params: idParams,
  body: z.strictObject({ name: line(100).optional(), zip: zip.optional() }),
  answer: seller,
});

export const getTerms = endpoint({
  method: 'GET',
  path: '/api/sellers/:id/terms',
  summary: 'The terms that new listings start from',
  access: 'member',
  params: idParams,
  answer: termsFields,
});

export const putTerms = endpoint({
  method: 'PUT',
  path: '/api/sellers/:id/terms',
  summary: 'Set the terms that new listings start from',
  access: 'owner',
  params: idParams,
  body: sellerTerms,
  answer: seller,
});

const member = z.object({
  userId: id,
  name: z.string(),
  email: z.string(),
  duties: z.array(z.enum(DUTIES)),
  since: at,
});
const invite = z.object({ id, email: z.string(), duties: z.array(z.enum(DUTIES)), expiresAt: at });
const team = z.object({ members: z.array(member), invites: z.array(invite) });
export type Team = z.output<typeof team>;

export const getTeam = endpoint({
  method: 'GET',
  path: '/api/sellers/:id/team',
  summary: 'Members with their duties, and open invitations',
  access: 'member',
  params: idParams,
  answer: team,
});

export const inviteBody = z.strictObject({ email, duties });

export const inviteMember = endpoint({
  method: 'POST',
  path: '/api/sellers/:id/invites',
  summary: 'Invite somebody by mail',
  access: 'owner',
  perMinute: 20,
  params: idParams,
  body: inviteBody,
  answer: team,
  status: 201,
});

export const acceptInvite = endpoint({
  method: 'POST',
  path: '/api/invites/accept',
  summary: 'Join a seller account with the link that was mailed',
  access: 'signed_in',
  perMinute: 30,
  body: z.strictObject({ token: linkToken }),
  answer: z.object({ sellerId: id, sellerName: z.string() }),
});

export const cancelInvite = endpoint({
  method: 'DELETE',
  path: '/api/sellers/:id/invites/:inviteId',
  summary: 'Take an invitation back; its link stops working',
  access: 'owner',
  params: z.strictObject({ id, inviteId: id }),
  answer: team,
});

const memberParams = z.strictObject({ id, userId: id });

export const setDuties = endpoint({
  method: 'PATCH',
  path: '/api/sellers/:id/team/:userId',
  summary: 'Change what a member may do',
  access: 'owner',
  params: memberParams,
  body: z.strictObject({ duties }),
  answer: team,
});

export const removeMember = endpoint({
  method: 'DELETE',
  path: '/api/sellers/:id/team/:userId',
  summary: 'Remove a member; access ends at once',
  access: 'owner',
  params: memberParams,
  answer: team,
});
