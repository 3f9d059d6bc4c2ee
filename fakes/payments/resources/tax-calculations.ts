// Tax calculations from the invented rates: one rate for the state that the goods go to, rounded line by line.
import { z } from 'zod';
import { badParam, missing, refused } from '../errors';
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

type CreateParams = z.output<typeof createParams>;

/** Cents of tax on (or inside) an amount, half a cent rounded away from zero. */
export function taxOn(amount: number, rateBps: number, kind: 'exclusive' | 'inclusive'): number {
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

function create({ world, form }: Call): object {
  const params = readParams(createParams, form);
  const { state, rateBps } = rateFor(params);
  const id = newId('taxcalc');
  const lineItems = params.line_items.map((line) => ({
    id: newId('tax_li'),
    object: 'tax.calculation_line_item',
    amount: line.amount,
    amount_tax: taxOn(line.amount, rateBps, line.tax_behavior),
    livemode: false,
    quantity: line.quantity,
    reference: line.reference ?? null,
    tax_behavior: line.tax_behavior,
    tax_code: line.tax_code ?? null,
  }));
  const shipping = params.shipping_cost;
  const charged = [
    ...lineItems.map((line) => ({ amount: line.amount, tax: line.amount_tax, kind: line.tax_behavior })),
    ...(shipping
      ? [
          {
            amount: shipping.amount,
            tax: taxOn(shipping.amount, rateBps, shipping.tax_behavior),
            kind: shipping.tax_behavior,
          },
        ]
      : []),
  ];
  if (new Set(charged.map((line) => line.kind)).size > 1)
    throw refused('Give every line the same tax_behavior.', 'parameter_invalid', 'line_items');
  const sumOf = (kind: 'exclusive' | 'inclusive'): number =>
    charged.filter((line) => line.kind === kind).reduce((sum, line) => sum + line.tax, 0);
  const [exclusive, inclusive] = [sumOf('exclusive'), sumOf('inclusive')];
  const amount = charged.reduce((sum, line) => sum + line.amount, 0);
  const answer = {
    id,
    object: 'tax.calculation',
    amount_total: amount + exclusive,
    currency: params.currency,
    customer: null,
    customer_details: {
      address: params.customer_details.address,
      address_source: params.customer_details.address_source,
      ip_address: null,
      tax_ids: [],
      taxability_override: 'none',
    },
    expires_at: world.seconds() + QUOTE_SECONDS,
    livemode: false,
    ship_from_details: null,
    shipping_cost: shipping
      ? {
          amount: shipping.amount,
          amount_tax: charged.at(-1)?.tax ?? 0,
          tax_behavior: shipping.tax_behavior,
          tax_code: shipping.tax_code ?? 'txcd_92010001',
        }
      : null,
    tax_amount_exclusive: exclusive,
    tax_amount_inclusive: inclusive,
    tax_breakdown: [
      {
        amount: exclusive + inclusive,
        inclusive: inclusive !== 0,
        tax_rate_details: rateDetails(state, rateBps),
        taxability_reason: rateBps === 0 ? 'not_collecting' : 'standard_rated',
        taxable_amount: rateBps === 0 ? 0 : amount - inclusive,
      },
    ],
    tax_date: params.tax_date ?? world.seconds(),
  };
  world.state.taxCalculations.put(id, { id, answer, lineItems });
  return params.expand.includes('line_items')
    ? { ...answer, line_items: linesOf({ id, answer, lineItems }) }
    : answer;
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
