// The endpoints of the catalogue.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { idParams, line, page, pageQuery } from '../kernel/fields';
import { adapter } from './adapter';
import { family } from './family';
import { unitKind } from './kinds';
import { variant } from './variant';
import { vehicleModel } from './vehicle';

const familySummary = family
  .pick({
    id: true,
    kind: true,
    makerId: true,
    maker: true,
    designation: true,
    forwardRatios: true,
    reverseRatio: true,
    lowRange: true,
    control: true,
    dryWeightLb: true,
  })
  .extend({
    name: z.string(),
    variantCount: z.number().int(),
    /** Null where it has no variants yet. */
    years: z.object({ from: z.number().int(), to: z.number().int() }).nullable(),
  });
export type FamilySummary = z.infer<typeof familySummary>;

const familyPage = family.extend({ name: z.string(), variants: z.array(variant) });
export type FamilyPage = z.infer<typeof familyPage>;

const variantPage = z.object({
  ...variant.shape,
  family: family.extend({ name: z.string() }),
  /** Those that take one of its interfaces to another value. */
  adapters: z.array(adapter),
});

const search = z.strictObject({ ...pageQuery, kind: unitKind.optional(), q: line(80).optional() });

export const listFamilies = endpoint({
  method: 'GET',
  path: '/api/catalogue/families',
  summary: 'Families of units by kind and words, in order of maker and designation',
  access: 'public',
  query: search,
  answer: page(familySummary),
});

export const readFamily = endpoint({
  method: 'GET',
  path: '/api/catalogue/families/:id',
  summary: 'One family with its gears, ratios, variants, interfaces and code patterns',
  access: 'public',
  params: idParams,
  answer: familyPage,
});

export const readVariant = endpoint({
  method: 'GET',
  path: '/api/catalogue/variants/:id',
  summary: 'One variant with its family and the adapters that fit it',
  access: 'public',
  params: idParams,
  answer: variantPage,
});

export const listAdapters = endpoint({
  method: 'GET',
  path: '/api/catalogue/adapters',
  summary: 'Parts that join two values of one interface',
  access: 'public',
  query: z.strictObject(pageQuery),
  answer: page(adapter),
});

export const listVehicles = endpoint({
  method: 'GET',
  path: '/api/catalogue/vehicles',
  summary: 'Models of vehicles with the interfaces they present',
  access: 'public',
  query: z.strictObject({ ...pageQuery, q: line(80).optional() }),
  answer: page(vehicleModel),
});

export const catalogueCounts = endpoint({
  method: 'GET',
  path: '/api/catalogue/counts',
  summary: 'How much the catalogue holds',
  access: 'public',
  answer: z.object({
    makers: z.number().int(),
    families: z.number().int(),
    variants: z.number().int(),
    adapters: z.number().int(),
    vehicles: z.number().int(),
  }),
});

/** What a catalogue file holds: the form of an import. */
export const catalogueData = z.object({
  families: z.array(family),
  variants: z.array(variant),
  adapters: z.array(adapter),
  vehicles: z.array(vehicleModel),
});
export type CatalogueData = z.infer<typeof catalogueData>;
