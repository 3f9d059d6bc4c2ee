// A model of vehicle, and the interfaces it presents to each kind of unit.
import { z } from 'zod';
import { id, line, paragraph } from '../kernel/fields';
import { interfaces } from './interfaces';

const year = z.number().int().min(1940).max(2100);

export const vehicleModel = z
  .object({
    id,
    make: line(40),
    model: line(40),
    yearFrom: year,
    yearTo: year,
    engine: line(60),
    drive: z.enum(['4x2', '4x4']),
    /** What the vehicle presents to each kind of unit; left out where it takes none of that kind. */
    joints: z.object({
      automatic: interfaces.optional(),
      manual: interfaces.optional(),
      transfer_case: interfaces.optional(),
      axle: interfaces.optional(),
    }),
    /** Variants that the plant fitted. */
    unitIds: z.array(id),
    axleRatio: z.number().min(2).max(8),
    tyre: line(24),
    source: paragraph(200).min(1),
  })
  .refine((v) => v.yearFrom <= v.yearTo, 'The years are the wrong way round');
export type VehicleModel = z.infer<typeof vehicleModel>;

export const vehicleName = (v: Pick<VehicleModel, 'make' | 'model' | 'engine' | 'drive'>): string =>
  `${v.make} ${v.model}, ${v.engine}, ${v.drive}`;
