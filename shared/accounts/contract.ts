// A person's account on the wire: signing up and in, mail check and reset, name, password, sessions, closing.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, id, idParams, line } from '../kernel/fields';
import { DUTIES, SELLER_KINDS } from './actor';
import { currentPassword, email, linkToken, newPassword, sellerIdentity } from './fields';

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

export const signUpBody = z
  .strictObject({
    name: line(100),
    email,
    password: newPassword,
    seller: sellerIdentity.optional(),
  })
  .refine((input) => input.password.toLowerCase() !== input.email.toLowerCase(), {
    path: ['password'],
    message: 'Do not use your mail address as the password',
  });

export const signUp = endpoint({
  method: 'POST',
  path: '/api/auth/sign-up',
  summary: 'Open an account, with a seller account if wished',
  access: 'public',
  perMinute: 20,
  body: signUpBody,
  answer: me,
  status: 201,
});

export const signInBody = z.strictObject({
  email: z.string().trim().min(1, 'Type your mail address').pipe(email),
  password: currentPassword,
  code: z.string().trim().max(20).optional(),
});

export const signIn = endpoint({
  method: 'POST',
  path: '/api/auth/sign-in',
  summary: 'Sign in',
  access: 'public',
  body: signInBody,
  answer: me,
});

export const signOut = endpoint({
  method: 'POST',
  path: '/api/auth/sign-out',
  summary: 'End this session on the server',
  access: 'public',
});

export const checkMail = endpoint({
  method: 'POST',
  path: '/api/auth/check-mail',
  summary: 'Prove that the address is yours with the link that was mailed',
  access: 'public',
  perMinute: 30,
  body: z.strictObject({ token: linkToken }),
  answer: z.object({ email: z.string() }),
});

export const resendCheck = endpoint({
  method: 'POST',
  path: '/api/auth/check-mail/resend',
  summary: 'Mail the link again',
  access: 'signed_in',
  perMinute: 5,
});

export const forgotBody = z.strictObject({ email });

export const forgot = endpoint({
  method: 'POST',
  path: '/api/auth/forgot',
  summary: 'Mail a link to set a new password; the same answer whether or not there is such an account',
  access: 'public',
  perMinute: 10,
  body: forgotBody,
});

export const resetPassword = endpoint({
  method: 'POST',
  path: '/api/auth/reset',
  summary: 'Set a new password with the link that was mailed; every session ends',
  access: 'public',
  perMinute: 30,
  body: z.strictObject({ token: linkToken, password: newPassword }),
});

export const passwordChange = z.strictObject({ current: currentPassword, password: newPassword });

export const changePassword = endpoint({
  method: 'POST',
  path: '/api/account/password',
  summary: 'Change the password; every other session ends',
  access: 'signed_in',
  perMinute: 10,
  body: passwordChange,
  answer: me,
});

export const renameBody = z.strictObject({ name: line(100) });

export const renameAccount = endpoint({
  method: 'PATCH',
  path: '/api/account',
  summary: 'Change the name that others see',
  access: 'signed_in',
  body: renameBody,
  answer: me,
});

export const closeBody = z.strictObject({ password: currentPassword });

export const closeAccount = endpoint({
  method: 'POST',
  path: '/api/account/close',
  summary:
    'Close the account; refused while an order is open or a seller account would be left without an owner',
  access: 'signed_in',
  perMinute: 10,
  body: closeBody,
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
