// An adapter: a part that joins two values of one interface, with what it adds in length and cost.
import { z } from 'zod';
import { id, line, paragraph } from '../kernel/fields';
import { interfaceName, interfaces, type InterfaceName } from './interfaces';

export const adapter = z
  .object({
    id,
    label: line(100),
    interface: interfaceName,
    /** Both hold the one interface that the adapter joins: what the unit has, and what the vehicle has. */
    from: interfaces,
    to: interfaces,
    addsMm: z.number().int().min(0).max(600),
    costCents: z.number().int().min(0).max(1_000_000),
    source: paragraph(200).min(1),
  })
  .refine(
    (a) => holdsOnly(a.from, a.interface) && holdsOnly(a.to, a.interface),
    'Both sides hold that interface',
  );
export type Adapter = z.infer<typeof adapter>;

const holdsOnly = (side: object, name: InterfaceName): boolean => {
  const keys = Object.keys(side);
  return keys.length === 1 && keys[0] === name;
};
