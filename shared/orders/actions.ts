// What each action a person takes must say: one zod schema per action, used by the form, the route and the rules.
import { z } from 'zod';
import { line, paragraph, version } from '../kernel/fields';
import type { Action } from './states';

const confirmed = z.literal(true, 'Confirm this first');
const reason = line(1000);

/** A tag as typed or scanned: the code itself or the address behind its QR. */
export const tagCode = z
  .string()
  .trim()
  .max(300)
  .transform((text) => (text.split('/').pop() ?? '').toUpperCase().replaceAll(/[^A-Z0-9]/g, ''));

export const deduction = z.strictObject({
  code: z.string().min(1).max(60),
  photoId: z.string('Take a photo that shows it').min(3, 'Take a photo that shows it').max(64),
  note: paragraph(300).optional(),
});

export const GRADES = ['A', 'B', 'C', 'D'] as const;
export type Grade = (typeof GRADES)[number];

export const ACTION_INPUT = {
  abandon: z.strictObject({ version }),
  cancel: z.strictObject({
    version,
    reason: reason.optional(),
    /** The seller only: the unit can't be supplied, so the listing is withdrawn instead of going live again. */
    cannotSupply: z.boolean().optional(),
  }),
  pack: z.strictObject({
    version,
    tagCode,
    drained: confirmed,
    plugged: confirmed,
    note: paragraph(300).optional(),
  }),
  hand_over: z.strictObject({
    version,
    carrier: line(80).optional(),
    tracking: line(80).optional(),
    pickupCode: z.string().trim().max(12).optional(),
  }),
  deliver: z.strictObject({ version, note: paragraph(300).optional() }),
  accept: z.strictObject({ version }),
  refuse: z.strictObject({ version, reason }),
  allow_other_core: z.strictObject({ version, note: paragraph(300).optional() }),
  book_return: z.strictObject({
    version,
    caseCode: line(40),
    /** Where the stamp can't be read whole: which unit the builder says it is. */
    variantId: z.string().max(80).optional(),
    note: paragraph(300).optional(),
  }),
  send: z.strictObject({
    version,
    method: z.enum(['carrier', 'drop_off']),
    carrier: line(80).optional(),
    tracking: line(80).optional(),
  }),
  extend: z.strictObject({
    version,
    days: z.number().int().min(1, 'At least one day').max(90, 'At most 90 days'),
  }),
  keep_unit: z.strictObject({ version }),
  receive: z.strictObject({ version, tagCode: tagCode.optional() }),
  grade: z.strictObject({
    version,
    grade: z.enum(GRADES),
    deductions: z.array(deduction).max(30),
    note: paragraph(1000).optional(),
  }),
  agree: z.strictObject({ version }),
  contest: z.strictObject({ version, reason }),
} as const satisfies Partial<Record<Action, z.ZodType>>;

export type PersonAction = keyof typeof ACTION_INPUT;
export type ActionInput<A extends PersonAction> = z.output<(typeof ACTION_INPUT)[A]>;

export const PERSON_ACTIONS: readonly PersonAction[] = Object.keys(ACTION_INPUT).filter(
  (key): key is PersonAction => key in ACTION_INPUT,
);
