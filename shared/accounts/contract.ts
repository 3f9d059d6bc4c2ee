// Accounts on the wire: signing up and in, mail check and reset, sessions, seller accounts with their team and terms.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, cents, id, idParams, line, page, pageQuery, zip } from '../kernel/fields';
import { DUTIES, SELLER_KINDS } from './actor';
import { isCommonPassword } from './common-passwords';

const email = z
  .string()
  .trim()
  .max(254, 'Use at most 254 characters')
  .regex(/^[^\s@]+@[^\s@]+\.[^\s@]+$/, 'Type a mail address, such as ines@example.com');

/** For a new password: long enough and not one that everybody tries first. */
export const newPassword = z
  .string()
  .min(12, 'Use at least 12 characters')
  .max(128, 'Use at most 128 characters')
  .refine(
    (text) => !isCommonPassword(text),
    'This password is one of the first that anybody tries. Choose another',
  );

export const duties = z
  .array(z.enum(DUTIES))
  .min(1, 'Choose at least one duty')
  .max(3)
  .transform((list) => [...new Set(list)]);

const sellerIdentity = {
  name: line(100),
  kind: z.enum(SELLER_KINDS),
  zip,
};

export const me = z.object({
  user: z
    .object({
      id,
      name: z.string(),
      email: z.string(),
      mailChecked: z.boolean(),
      roles: z.array(z.enum(['builder', 'seller', 'admin'])),
      sellers: z.array(
        z.object({ id, name: z.string(), kind: z.enum(SELLER_KINDS), duties: z.array(z.enum(DUTIES)) }),
      ),
    })
    .nullable(),
  csrfToken: z.string(),
});
export type Me = z.output<typeof me>;

export const getMe = endpoint({
  method: 'GET',
  path: '/api/auth/me',
  summary: 'Who is signed in, and the token for unsafe requests',
  access: 'public',
  answer: me,
});

export const signUp = endpoint({
  method: 'POST',
  path: '/api/auth/sign-up',
  summary: 'Open an account, with a seller account if wished',
  access: 'public',
  perMinute: 30,
  body: z.strictObject({
    name: line(100),
    email,
    password: newPassword,
    seller: z.strictObject(sellerIdentity).optional(),
  }),
  answer: me,
  status: 201,
});

export const signIn = endpoint({
  method: 'POST',
  path: '/api/auth/sign-in',
  summary: 'Sign in',
  access: 'public',
  body: z.strictObject({
    email: z.string().trim().min(1, 'Type your mail address').max(254),
    password: z.string().min(1, 'Type your password').max(128),
    code: z.string().trim().max(20).optional(),
  }),
  answer: me,
});

export const signOut = endpoint({
  method: 'POST',
  path: '/api/auth/sign-out',
  summary: 'End this session on the server',
  access: 'public',
});

const token = z.string().min(20).max(100);

export const checkMail = endpoint({
  method: 'POST',
  path: '/api/auth/check-mail',
  summary: 'Prove that the address is yours with the link that was mailed',
  access: 'public',
  perMinute: 30,
  body: z.strictObject({ token }),
  answer: z.object({ email: z.string() }),
});

export const resendCheck = endpoint({
  method: 'POST',
  path: '/api/auth/check-mail/resend',
  summary: 'Mail the link again',
  access: 'signed_in',
  perMinute: 5,
});

export const forgot = endpoint({
  method: 'POST',
  path: '/api/auth/forgot',
  summary: 'Mail a link to set a new password; the same answer whether or not there is such an account',
  access: 'public',
  perMinute: 10,
  body: z.strictObject({ email }),
});

export const resetPassword = endpoint({
  method: 'POST',
  path: '/api/auth/reset',
  summary: 'Set a new password with the link that was mailed; every session ends',
  access: 'public',
  perMinute: 30,
  body: z.strictObject({ token, password: newPassword }),
});

export const changePassword = endpoint({
  method: 'POST',
  path: '/api/account/password',
  summary: 'Change the password; every other session ends',
  access: 'signed_in',
  perMinute: 10,
  body: z.strictObject({ current: z.string().min(1, 'Type your password').max(128), password: newPassword }),
  answer: me,
});

export const listSessions = endpoint({
  method: 'GET',
  path: '/api/account/sessions',
  summary: 'Where this account is signed in',
  access: 'signed_in',
  answer: z.object({
    items: z.array(
      z.object({ id, agent: z.string(), startedAt: at.nullable(), endsAt: at, current: z.boolean() }),
    ),
  }),
});

export const endSession = endpoint({
  method: 'DELETE',
  path: '/api/account/sessions/:id',
  summary: 'Sign a session out',
  access: 'signed_in',
  params: idParams,
});

/** Default terms that new listings start from. */
export const sellerTerms = z.strictObject({
  windowDays: z.number().int().min(7).max(180),
  depositCents: cents.nullable(),
  schedule: z
    .array(z.strictObject({ code: z.string().regex(/^[a-z0-9_]{2,40}$/), label: line(80), cents }))
    .max(30)
    .refine(
      (list) => new Set(list.map((one) => one.code)).size === list.length,
      'Each deduction stands once',
    ),
  returnFreight: z.enum(['seller', 'builder']),
  shipDays: z.number().int().min(1).max(60),
  graceDays: z.number().int().min(0).max(30),
  outright: z.boolean(),
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
  terms: sellerTerms.nullable(),
  payoutsEnabled: z.boolean().nullable(),
});

export const openSeller = endpoint({
  method: 'POST',
  path: '/api/sellers',
  summary: 'Open a seller account and become its owner',
  access: 'signed_in',
  idempotent: true,
  perMinute: 10,
  body: z.strictObject(sellerIdentity),
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

export const getTeam = endpoint({
  method: 'GET',
  path: '/api/sellers/:id/team',
  summary: 'Members with their duties, and open invitations',
  access: 'member',
  params: idParams,
  answer: team,
});

export const inviteMember = endpoint({
  method: 'POST',
  path: '/api/sellers/:id/invites',
  summary: 'Invite somebody by mail',
  access: 'owner',
  perMinute: 20,
  params: idParams,
  body: z.strictObject({ email, duties }),
  answer: team,
  status: 201,
});

export const acceptInvite = endpoint({
  method: 'POST',
  path: '/api/invites/accept',
  summary: 'Join a seller account with the link that was mailed',
  access: 'signed_in',
  perMinute: 30,
  body: z.strictObject({ token }),
  answer: z.object({ sellerId: id, sellerName: z.string() }),
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

export const adminSellers = endpoint({
  method: 'GET',
  path: '/api/admin/sellers',
  summary: 'Seller accounts, those that wait for a look first',
  access: 'admin',
  query: z.object(pageQuery),
  answer: page(seller.extend({ members: z.number().int(), liveListings: z.number().int() })),
});

export const verifySeller = endpoint({
  method: 'POST',
  path: '/api/admin/sellers/:id/verify',
  summary: 'Say that a seller was looked at, or take it back',
  access: 'admin',
  params: idParams,
  body: z.strictObject({ verified: z.boolean() }),
  answer: seller,
});

export const adminAudit = endpoint({
  method: 'GET',
  path: '/api/admin/audit',
  summary: 'Who did what to what, newest first',
  access: 'admin',
  query: z.object({ ...pageQuery, objectId: z.string().max(64).optional() }),
  answer: page(
    z.object({
      id: z.string(),
      at,
      actorName: z.string().nullable(),
      actorKind: z.string(),
      action: z.string(),
      objectKind: z.string(),
      objectId: z.string(),
      detail: z.record(z.string(), z.unknown()),
    }),
  ),
});
