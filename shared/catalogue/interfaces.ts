// The interfaces of a unit: what each measures, what makes two of them the same, and how one is said in words.
import { z } from 'zod';

const pattern = z.string().regex(/^[A-Z0-9][A-Z0-9-]{0,11}$/);
const mm = z.number().min(1).max(4000);
const bolts = z.number().int().min(1).max(24);
const side = z.enum(['left', 'right', 'top']);

const boltPattern = z.strictObject({ pattern, bolts, dowels: z.number().int().min(0).max(4) });
const bolted = z.strictObject({ bolts, circleMm: mm, pilotMm: mm });
const spline = z.strictObject({ count: z.number().int().min(4).max(60), diameterMm: mm });

/** Every interface there is; one that is left out isn't known. */
export const interfaces = z.strictObject({
  enginePattern: boltPattern.optional(),
  crankFlange: bolted.optional(),
  inputSpline: spline.optional(),
  outputSpline: spline.extend({ form: z.enum(['male', 'female']) }).optional(),
  rearPattern: z.strictObject({ pattern, bolts, clockingDeg: z.number().min(-180).max(180) }).optional(),
  control: z
    .strictObject({
      by: z.enum(['hydraulic', 'electronic', 'none']),
      controller: pattern.nullable(),
      pins: z.number().int().min(0).max(60),
    })
    .optional(),
  speedometer: z
    .strictObject({ by: z.enum(['cable', 'sensor', 'none']), teeth: z.number().int().nullable() })
    .optional(),
  mount: z.strictObject({ bolts, spacingMm: mm, fromFaceMm: mm }).optional(),
  length: z.strictObject({ mm }).optional(),
  shiftLinkage: z.strictObject({ by: z.enum(['cable', 'rod', 'lever', 'motor']), side }).optional(),
  kickdown: z.strictObject({ by: z.enum(['cable', 'vacuum', 'none']) }).optional(),
  cooler: z
    .strictObject({ fitting: z.enum(['flare', 'push', 'banjo', 'none']), lineMm: z.number().min(0).max(30) })
    .optional(),
  clutch: z
    .strictObject({ by: z.enum(['cable', 'slave_outside', 'slave_inside', 'rod']), discMm: mm })
    .optional(),
  dropSide: z.strictObject({ side: z.enum(['left', 'right', 'centre']) }).optional(),
  frontOutput: z.strictObject({ form: z.enum(['yoke', 'flange']), joint: pattern }).optional(),
  rearOutput: z.strictObject({ form: z.enum(['yoke', 'flange', 'slip']), joint: pattern }).optional(),
  housingWidth: z.strictObject({ mm }).optional(),
  perches: z.strictObject({ spacingMm: mm, form: z.enum(['leaf_under', 'leaf_over', 'coil']) }).optional(),
  wheelBolts: bolted.optional(),
  brake: z.strictObject({ by: z.enum(['drum', 'disc']), sizeMm: mm }).optional(),
  shaftSpline: spline.optional(),
  axleRatio: z.strictObject({ ring: z.number().int(), pinion: z.number().int() }).optional(),
});
export type Interfaces = z.infer<typeof interfaces>;
export type InterfaceName = keyof Interfaces;
export type InterfaceValue<N extends InterfaceName> = NonNullable<Interfaces[N]>;

export const INTERFACE_NAMES: readonly InterfaceName[] = interfaces.keyof().options;
export const interfaceName = interfaces.keyof();
