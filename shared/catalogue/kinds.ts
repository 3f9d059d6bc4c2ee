// The four kinds of unit, and what each is called in a sentence.
import { z } from 'zod';

export const UNIT_KINDS = ['automatic', 'manual', 'transfer_case', 'axle'] as const;
export type UnitKind = (typeof UNIT_KINDS)[number];
export const unitKind = z.enum(UNIT_KINDS);

export const KIND_WORDS: Readonly<Record<UnitKind, { one: string; many: string }>> = {
  automatic: { one: 'automatic', many: 'Automatics' },
  manual: { one: 'manual', many: 'Manuals' },
  transfer_case: { one: 'transfer case', many: 'Transfer cases' },
  axle: { one: 'axle', many: 'Axles' },
};
