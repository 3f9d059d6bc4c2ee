// A variant: a family in one case, with its interfaces, its years and its codes.
import { z } from 'zod';
import { id, line, paragraph } from '../kernel/fields';
import { codePattern } from './code-pattern';
import { interfaces } from './interfaces';

const year = z.number().int().min(1940).max(2100);

export const variant = z
  .object({
    id,
    familyId: id,
    /** What sets it apart from its sisters: "4x4, D9 bell, 16-pin". */
    label: line(80),
    modelYears: z.object({ from: year, to: year }),
    builtFrom: z.iso.date(),
    builtTo: z.iso.date(),
    interfaces,
    codePatterns: z.array(codePattern).max(6),
    source: paragraph(200).min(1),
  })
  .refine((v) => v.modelYears.from <= v.modelYears.to, 'The years are the wrong way round')
  .refine((v) => v.builtFrom <= v.builtTo, 'The build dates are the wrong way round');
export type Variant = z.infer<typeof variant>;
