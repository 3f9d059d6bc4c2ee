// A family: one internal design, whatever case it sits in. Rebuild kits and hard parts follow the family.
import { z } from 'zod';
import { id, line, paragraph } from '../kernel/fields';
import { gears } from './gear-layout';
import { unitKind } from './kinds';

const ratio = z.number().min(-20).max(20);
const lengthMm = z.number().int().min(50).max(3000);
const hours = z.number().min(0.5).max(100);
const cents = z.number().int().min(0).max(10_000_000);

export const failurePoint = z.object({
  part: line(80),
  /** What is noticed on the road or on the bench. */
  sign: line(200),
});

export const hardPart = z.object({ name: line(80), lowCents: cents, highCents: cents });

export const benchHours = z
  .object({ optimistic: hours, likely: hours, pessimistic: hours })
  .refine((h) => h.optimistic <= h.likely && h.likely <= h.pessimistic, 'Three points in order');

export const family = z.object({
  id,
  kind: unitKind,
  makerId: id,
  maker: line(40),
  designation: line(40),
  gears,
  /** Input speed over output speed, three decimals, first gear first; for an axle the ratios offered. */
  forwardRatios: z.array(ratio).max(20),
  /** Negative: the output turns backwards. */
  reverseRatio: ratio.nullable(),
  lowRange: ratio.nullable(),
  control: z.enum(['hydraulic', 'electronic', 'none']),
  /** Drained, without converter. */
  dryWeightLb: z.number().int().min(20).max(900),
  lengthMm,
  widthMm: lengthMm,
  heightMm: lengthMm,
  fluid: line(80),
  fluidLitres: z.number().min(0.2).max(30),
  benchHours,
  failurePoints: z.array(failurePoint),
  hardParts: z.array(hardPart),
  source: paragraph(200).min(1),
});
export type Family = z.infer<typeof family>;

export const familyName = (one: Pick<Family, 'maker' | 'designation'>): string =>
  `${one.maker} ${one.designation}`;
