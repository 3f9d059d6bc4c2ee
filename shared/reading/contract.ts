// The endpoints that read codes and vehicle numbers.
import { z } from 'zod';
import { unitKind } from '../catalogue/kinds';
import { endpoint } from '../kernel/endpoint';
import { id } from '../kernel/fields';

const readSegment = z.object({ name: z.string(), value: z.string(), meaning: z.string() });

const assumed = z.object({ index: z.number().int(), read: z.string(), took: z.string(), why: z.string() });

const candidate = z.object({
  variantId: id,
  familyId: id,
  label: z.string(),
  probability: z.number().min(0).max(1),
  segments: z.array(readSegment).readonly(),
  builtOn: z.iso.date().nullable(),
  assumed: z.array(assumed).readonly(),
  conflicts: z.array(z.string()).readonly(),
});

export const readCodeAnswer = z.object({
  candidates: z.array(candidate).readonly(),
  verdict: z.enum(['sure', 'likely', 'cannot_tell']),
});

export const readCodes = endpoint({
  method: 'POST',
  path: '/api/codes/read',
  summary: 'Read a case code: the variants it can be, each segment with its meaning',
  access: 'public',
  body: z.strictObject({
    text: z.string().trim().min(1, 'Type what is stamped on the case').max(64, 'No code is that long'),
    kind: unitKind.optional(),
    donorYear: z.number().int().min(1900).max(2100).optional(),
  }),
  answer: readCodeAnswer,
});

const vinProblem = z.object({
  code: z.enum([
    'wrong_length',
    'illegal_character',
    'illegal_year',
    'wrong_check_digit',
    'illegal_check_digit',
  ]),
  message: z.string(),
  position: z.number().int().nullable(),
});

const vinVehicle = z.object({
  maker: z.string(),
  lowVolume: z.boolean(),
  region: z.string(),
  plant: z.string(),
  serial: z.string(),
});

export const decodeVins = endpoint({
  method: 'POST',
  path: '/api/vin/decode',
  summary: 'Check a vehicle number and tell its model year, per 49 CFR 565',
  access: 'public',
  body: z.strictObject({
    vin: z.string().trim().min(1, 'Type the number on the dash').max(40, 'A VIN has 17 characters'),
  }),
  answer: z.object({
    vin: z.string(),
    valid: z.boolean(),
    problems: z.array(vinProblem).readonly(),
    modelYear: z.number().int().nullable(),
    modelYears: z.array(z.number().int()).readonly(),
    checkDigit: z.string().nullable(),
    suggestion: z.string().nullable(),
    vehicle: vinVehicle.nullable(),
  }),
});
