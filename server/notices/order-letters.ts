// Letters about an order: what happened, what is held or released to the cent, what to do next and by when.
import { TZDate } from '@date-fns/tz';
import { format } from 'date-fns';
import { formatCents } from '../../shared/kernel/money';
import type { ClockName } from '../../shared/orders/clocks';
import type { MailTemplate, MailTo } from '../../shared/orders/flow';
import { isSettlementFault, settleCore } from '../../shared/orders/settlement';
import { CORE_FINAL } from '../../shared/orders/states';
import type { OrderRow } from '../orders/load';
import type { Letter } from './letter';

export type ReminderTemplate = Extract<
  ClockName,
  'core_reminder_21' | 'core_reminder_7' | 'core_reminder_1' | 'transit_nudge'
>;
export type OrderTemplate = MailTemplate | ReminderTemplate;

export interface OrderMailFacts {
  readonly order: OrderRow;
  readonly to: MailTo;
  readonly url: string;
  readonly now: Date;
}

/** "Wed 25 Mar 2026, end of the day (America/Chicago)". */
export const dayIn = (at: Date, zone: string): string =>
  `${format(new TZDate(at.getTime(), zone), 'EEE d MMM yyyy')}, end of the day (${zone})`;

const unit = (order: OrderRow): string => `${order.title} (${order.caseCode})`;
const total = (order: OrderRow): number =>
  order.priceCents + order.depositCents + order.freightCents + order.taxCents;
const due = (order: OrderRow): string =>
  order.dueAt ? dayIn(order.dueAt, order.zone) : 'the date on the order';

const DRAIN =
  'Drain it, plug every opening, hold the converter in place and strap it to a pallet. It is heavy: use a hoist or a transmission jack, and follow the carrier’s and your local rules.';

interface Core {
  readonly subject: string;
  readonly lines: readonly string[];
  readonly label?: string;
  readonly foot?: string;
}

function gradeLines(order: OrderRow): string[] {
  const split = settleCore(order.depositCents, order.schedule, order.deductions ?? []);
  if (isSettlementFault(split)) return [];
  const taken = split.lines.map((line) => `${line.label}: ${formatCents(-line.cents)}`);
  return [
    `Grade ${order.grade ?? ''}. ${taken.length > 0 ? taken.join('; ') + '.' : 'Nothing is deducted.'}`,
    `${formatCents(split.toBuilderCents)} goes back to the builder, ${formatCents(split.toSellerCents)} to the seller.`,
  ];
}

const outbound = (template: OrderTemplate, { order, to }: OrderMailFacts): Core | null => {
  const forBuilder = to === 'builder';
  switch (template) {
    case 'order_paid':
      return forBuilder
        ? {
            subject: `Order ${order.number}: paid, ${formatCents(total(order))} held`,
            lines: [
              `You paid ${formatCents(total(order))} for ${unit(order)}. It is held until you have looked the unit over.`,
              `The yard has ${order.shipDays} business days to ship it. If it does not, everything comes back to you.`,
            ],
          }
        : {
            subject: `Order ${order.number}: paid, pack ${order.title}`,
            lines: [
              `${unit(order)} is sold and paid. Pack and hand it over within ${order.shipDays} business days.`,
              DRAIN,
            ],
            label: 'Open the order',
          };
    case 'order_cancelled':
      return {
        subject: `Order ${order.number}: cancelled`,
        lines: [
          `The order for ${unit(order)} is cancelled.`,
          forBuilder
            ? `All of ${formatCents(total(order))} is on its way back to your card.`
            : 'Everything goes back to the builder. Look at the listing: it is on sale again unless you withdrew it.',
        ],
      };
    case 'order_lapsed':
      return {
        subject: `Order ${order.number}: the reservation lapsed`,
        lines: [`${unit(order)} was held for you for 30 minutes and is on sale again. Nothing was charged.`],
      };
    case 'pickup_ready':
      return {
        subject: `Order ${order.number}: packed, bring your pickup code`,
        lines: [
          `${unit(order)} is packed and tagged. Your pickup code is ${order.pickupCode}: give it only when the unit is in front of you.`,
          'It is heavy. Bring a hoist, a pallet jack or two people and straps.',
        ],
      };
    case 'order_shipped':
      return {
        subject: `Order ${order.number}: on its way`,
        lines: [
          `${unit(order)} went out with ${order.carrier ?? 'the carrier'}, number ${order.tracking ?? 'not given'}.`,
          'Look the pallet over before you sign, and note any damage on the delivery receipt.',
        ],
      };
    case 'order_delivered':
      return forBuilder
        ? {
            subject: `Order ${order.number}: look the unit over`,
            lines: [
              `${unit(order)} is with you. You have five business days to accept or refuse it; after that it counts as accepted.`,
              'Once accepted, price and freight are released to the seller and cannot be called back.',
            ],
          }
        : {
            subject: `Order ${order.number}: delivered`,
            lines: [`${unit(order)} has arrived. The builder has five business days to look it over.`],
          };
    case 'order_accepted':
      return {
        subject: `Order ${order.number}: accepted`,
        lines: [
          `${unit(order)} is accepted. ${formatCents(order.priceCents + order.freightCents - order.feeCents)} is released to the seller.`,
          ...(order.core !== null && !CORE_FINAL.includes(order.core)
            ? [`The core deposit of ${formatCents(order.depositCents)} is still held.`]
            : []),
        ],
      };
    case 'order_refused':
      return {
        subject: `Order ${order.number}: refused, a case is open`,
        lines: [
          `The builder refused ${unit(order)}. Everything held stays held until both sides agree or it is settled.`,
          'Put photos and your view in the case, and make a proposal.',
        ],
        label: 'Open the case',
      };
    case 'case_settled':
      return {
        subject: `Order ${order.number}: settled`,
        lines: [`The case about ${unit(order)} is settled. The order shows where each dollar went.`],
      };
    case 'transit_nudge':
      return {
        subject: `Order ${order.number}: has it arrived?`,
        lines: [
          `${unit(order)} has been on its way for ten days (${order.carrier ?? 'carrier not given'}, ${order.tracking ?? 'no number'}).`,
          forBuilder ? 'If it is with you, say so on the order.' : 'Ask the carrier where it is.',
        ],
      };
    default:
      return null;
  }
};

const coreBack = (template: OrderTemplate, { order, to }: OrderMailFacts): Core => {
  const deposit = formatCents(order.depositCents);
  switch (template) {
    case 'core_due':
      return {
        subject: `Order ${order.number}: your old unit is due by ${due(order)}`,
        lines: [
          `${deposit} is held for your old unit. Send it back by ${due(order)} and it is graded by the schedule you saw.`,
          DRAIN,
        ],
      };
    case 'core_reminder_21':
    case 'core_reminder_7':
    case 'core_reminder_1': {
      const days = { core_reminder_21: 21, core_reminder_7: 7, core_reminder_1: 1 }[template];
      return {
        subject: `Order ${order.number}: ${days} ${days === 1 ? 'day' : 'days'} left for your old unit`,
        lines: [
          `${deposit} is held. Send the old unit by ${due(order)}, ask the seller for more time, or keep it.`,
          'Seven days after that date the deposit goes to the seller.',
        ],
      };
    }
    case 'core_yes':
      return {
        subject: `Order ${order.number}: the seller takes your unit`,
        lines: ['The seller takes a different unit as the core. You can book its return now.'],
      };
    case 'core_booked':
      return {
        subject: `Order ${order.number}: a core is coming`,
        lines: [
          `The builder booked the return of ${order.coreCaseCode ?? 'the old unit'}. It carries the tag ${order.coreTagCode}.`,
        ],
      };
    case 'core_sent':
      return {
        subject: `Order ${order.number}: the core is on its way`,
        lines: [
          order.coreMethod === 'drop_off'
            ? 'The builder brings the core to your dock.'
            : `The core went out with ${order.coreCarrier ?? 'a carrier'}, number ${order.coreTracking ?? 'not given'}.`,
          'Scan its tag when it arrives. It must be graded within five business days, or the deposit is released whole.',
        ],
      };
    case 'core_extended':
      return {
        subject: `Order ${order.number}: more time`,
        lines: [`Your old unit is now due by ${due(order)}.`],
      };
    case 'core_kept':
      return {
        subject: `Order ${order.number}: the old unit is kept`,
        lines: [`The builder keeps the old unit; the deposit of ${deposit} goes to the seller.`],
      };
    case 'core_lapsed':
      return {
        subject: `Order ${order.number}: the return lapsed`,
        lines: [
          `The old unit was not sent by ${due(order)} nor in the seven days after it. The deposit of ${deposit} goes to the seller.`,
        ],
      };
    case 'core_received':
      return {
        subject: `Order ${order.number}: your core is at the dock`,
        lines: [
          'It will be graded within five business days; otherwise the whole deposit comes back to you.',
        ],
      };
    case 'core_graded':
      return {
        subject: `Order ${order.number}: graded ${order.grade ?? ''}`,
        lines: [
          ...gradeLines(order),
          'You have three business days to agree or contest it with photos; after that it counts as agreed.',
        ],
        label: 'See the photos and decide',
      };
    case 'core_released':
      return {
        subject: `Order ${order.number}: the deposit is released whole`,
        lines: [
          `The core was not graded in five business days, so all of ${deposit} goes back to the builder.`,
        ],
      };
    case 'core_settled':
      return {
        subject: `Order ${order.number}: the deposit is settled`,
        lines: [
          ...gradeLines(order),
          to === 'builder' ? 'Money back to a card takes a few days to show.' : 'Your part is on its way.',
        ],
      };
    case 'core_contested':
      return {
        subject: `Order ${order.number}: the grade is contested`,
        lines: [
          `The builder contests the grade. The deposit of ${deposit} stays held until both sides agree or it is settled.`,
        ],
        label: 'Open the case',
      };
    default:
      throw new Error(`no letter for ${template}`);
  }
};

export function orderLetter(template: OrderTemplate, facts: OrderMailFacts): Letter {
  const core = outbound(template, facts) ?? coreBack(template, facts);
  return {
    subject: core.subject,
    lines: core.lines,
    link: { label: core.label ?? 'Open the order', url: facts.url },
    ...(core.foot ? { foot: core.foot } : {}),
  };
}
