// Tax calculations from the invented rates: one rate for the state that the goods go to, rounded line by line.
import { z } from 'zod';
import { badParam, missing } from '../errors';
import { currency, expandParam, integer, metadata, readParams } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { TaxCalculation } from '../model/delivery';
import { idOf, type Call, type Routes } from '../router';
import { INVENTED_RATES_BPS } from '../tax-rates';
import { newId } from '../world';

const QUOTE_SECONDS = 90 * 24 * 60 * 60;

const behaviour = z.enum(['exclusive', 'inclusive']).default('exclusive');

const createParams = z.strictObject({
  currency,
  line_items: z
    .array(
      z.strictObject({
        amount: integer,
        quantity: integer.default(1),
        reference: z.string().optional(),
        tax_behavior: behaviour,
        tax_code: z.string().optional(),
        metadata: metadata.optional(),
      }),
    )
    .min(1),
  shipping_cost: z
    .strictObject({ amount: integer, tax_behavior: behaviour, tax_code: z.string().optional() })
    .optional(),
  customer_details: z.strictObject({
    address: z.strictObject({
      country: z.literal('US', 'only US addresses are known here'),
      state: z.string().optional(),
      postal_code: z.string().optional(),
      city: z.string().optional(),
      line1: z.string().optional(),
      line2: z.string().optional(),
    }),
    address_source: z.enum(['billing', 'shipping']).default('shipping'),
  }),
  ship_from_details: z.unknown().optional(),
  tax_date: integer.optional(),
  expand: expandParam,
});

type Behaviour = 'exclusive' | 'inclusive';

type CreateParams = z.output<typeof createParams>;

/** Cents of tax on (or inside) an amount, half a cent rounded away from zero. */
export function taxOn(amount: number, rateBps: number, kind: Behaviour): number {
  const base = kind === 'exclusive' ? 10_000 : 10_000 + rateBps;
  const tax = Math.round((Math.abs(amount) * rateBps) / base);
  return amount < 0 ? -tax : tax;
}

function rateFor(params: CreateParams): { state: string; rateBps: number } {
  const state = params.customer_details.address.state?.toUpperCase();
  const rateBps = state === undefined ? undefined : INVENTED_RATES_BPS[state];
  if (state === undefined || rateBps === undefined) {
    throw badParam(
      "We could not determine the customer's tax location from the address.",
      'customer_tax_location_invalid',
      'customer_details[address]',
    );
  }
  return { state, rateBps };
}

const rateDetails = (state: string, rateBps: number): object => ({
  country: 'US',
  flat_amount: null,
  percentage_decimal: (rateBps / 100).toString(),
  rate_type: 'percentage',
  state,
  tax_type: 'sales_tax',
});

interface Taxed {
  readonly amount: number;
  readonly tax: number;
  readonly kind: Behaviour;
}

/** Every charged line with its tax; the shipping, where there is any, comes last. */
function taxed(params: CreateParams, rateBps: number): Taxed[] {
  const charged = params.shipping_cost ? [...params.line_items, params.shipping_cost] : params.line_items;
  if (new Set(charged.map((line) => line.tax_behavior)).size > 1)
    throw badParam('Give every line the same tax_behavior.', 'parameter_invalid', 'line_items');
  return charged.map(({ amount, tax_behavior: kind }) => ({
    amount,
    kind,
    tax: taxOn(amount, rateBps, kind),
  }));
}

const lineItemsOf = (params: CreateParams, taxes: readonly Taxed[]): TaxCalculation['lineItems'] =>
  params.line_items.map((line, index) => ({
    id: newId('tax_li'),
    object: 'tax.calculation_line_item',
    amount: line.amount,
    amount_tax: taxes[index]?.tax ?? 0,
    livemode: false,
    quantity: line.quantity,
    reference: line.reference ?? null,
    tax_behavior: line.tax_behavior,
    tax_code: line.tax_code ?? null,
  }));

function shippingOf(params: CreateParams, taxes: readonly Taxed[]): object | null {
  if (params.shipping_cost === undefined) return null;
  const { amount, tax_behavior: kind, tax_code: code } = params.shipping_cost;
  return {
    amount,
    amount_tax: taxes.at(-1)?.tax ?? 0,
    tax_behavior: kind,
    tax_code: code ?? 'txcd_92010001',
  };
}

function create({ world, form }: Call): object {
  const params = readParams(createParams, form);
  const { state, rateBps } = rateFor(params);
  const taxes = taxed(params, rateBps);
  const tax = taxes.reduce((sum, line) => sum + line.tax, 0);
  const amount = taxes.reduce((sum, line) => sum + line.amount, 0);
  const inclusive = taxes[0]?.kind === 'inclusive';
  const id = newId('taxcalc');
  const { address, address_source } = params.customer_details;
  const answer = {
    id,
    object: 'tax.calculation',
    amount_total: inclusive ? amount : amount + tax,
    currency: params.currency,
    customer: null,
    customer_details: { address, address_source, ip_address: null, tax_ids: [], taxability_override: 'none' },
    expires_at: world.seconds() + QUOTE_SECONDS,
    livemode: false,
    ship_from_details: null,
    shipping_cost: shippingOf(params, taxes),
    tax_amount_exclusive: inclusive ? 0 : tax,
    tax_amount_inclusive: inclusive ? tax : 0,
    tax_breakdown: [
      {
        amount: tax,
        inclusive,
        tax_rate_details: rateDetails(state, rateBps),
        taxability_reason: rateBps === 0 ? 'not_collecting' : 'standard_rated',
        taxable_amount: rateBps === 0 ? 0 : inclusive ? amount - tax : amount,
      },
    ],
    tax_date: params.tax_date ?? world.seconds(),
  };
  const calculation = { id, answer, lineItems: lineItemsOf(params, taxes) };
  world.state.taxCalculations.put(id, calculation);
  return params.expand.includes('line_items') ? { ...answer, line_items: linesOf(calculation) } : answer;
}

const linesOf = (calculation: TaxCalculation): object => ({
  object: 'list',
  data: calculation.lineItems,
  has_more: false,
  url: `/v1/tax/calculations/${calculation.id}/line_items`,
});

function find(call: Call): TaxCalculation {
  const calculation = call.world.state.taxCalculations.get(idOf(call));
  if (calculation === undefined) throw missing('tax calculation', idOf(call));
  return calculation;
}

export const taxRoutes: Routes = {
  'POST /v1/tax/calculations': create,
  'GET /v1/tax/calculations/:id': (call) => {
    const { expand } = readParams(z.strictObject({ expand: expandParam }), call.form);
    const calculation = find(call);
    return expand.includes('line_items')
      ? { ...calculation.answer, line_items: linesOf(calculation) }
      : calculation.answer;
  },
  'GET /v1/tax/calculations/:id/line_items': (call) =>
    pageOf(find(call).lineItems.toReversed(), readParams(z.strictObject(listParams), call.form), call.path),
};
