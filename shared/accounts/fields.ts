// The fields that several contracts of accounts share: mail address, passwords, duties, links, what a seller is called.
import { z } from 'zod';
import { line, zip } from '../kernel/fields';
import { DUTIES, SELLER_KINDS } from './actor';
import { isCommonPassword } from './common-passwords';

export const email = z
  .string()
  .trim()
  .max(254, 'Use at most 254 characters')
  .regex(/^[^\s\p{Cc}@]+@[^\s\p{Cc}@]+\.[^\s\p{Cc}@]+$/u, 'Type a mail address, such as ines@example.com');

/** For a new password: long enough and not one that everybody tries first. */
export const newPassword = z
  .string()
  .min(12, 'Use at least 12 characters')
  .max(128, 'Use at most 128 characters')
  .refine(
    (text) => !isCommonPassword(text),
    'This password is one of the first that anybody tries. Choose another',
  );

/** The password that is in use, whatever the rules were when it was chosen. */
export const currentPassword = z.string().min(1, 'Type your password').max(128, 'Use at most 128 characters');

/** The random part of a link that was mailed. */
export const linkToken = z.string().min(20).max(100);

export const duties = z
  .array(z.enum(DUTIES))
  .min(1, 'Choose at least one duty')
  .max(3)
  .transform((list) => [...new Set(list)]);

export const sellerIdentity = z.strictObject({
  name: line(100),
  kind: z.enum(SELLER_KINDS),
  zip,
});
