// THE table of an order: both legs, who may do what from where, what it needs, what it does to the money, which clocks it
// starts and stops, and who is written to. The server enforces it, the page draws its buttons from it, the tests count it.
import type { ClockName } from './clocks';
import type { Action, CoreState, Leg, OutboundState, Who } from './states';

/** What must be true besides state and role; each is a function of the same name in guards.ts. */
export type GuardName =
  | 'amounts_match'
  | 'listing_still_live'
  | 'tag_scanned'
  | 'drained_and_plugged'
  | 'packing_photos'
  | 'carrier_or_pickup_code'
  | 'refusal_photos'
  | 'old_unit_photos'
  | 'same_internals_or_yes'
  | 'how_it_travels'
  | 'deductions_from_schedule'
  | 'contest_photos'
  | 'split_adds_up'
  | 'not_frozen';

/** What happens to the money; each is an entry of the ledger with the provider effect that follows from it. */
export type MoneyRule =
  | 'hold_everything'
  | 'refund_everything'
  | 'pay_unit'
  | 'deposit_to_seller'
  | 'settle_core'
  | 'release_core'
  | 'settle_case'
  | 'none';

export type MailTo = 'builder' | 'seller' | 'admin';

export type MailTemplate =
  | 'order_paid'
  | 'order_cancelled'
  | 'order_lapsed'
  | 'order_shipped'
  | 'pickup_ready'
  | 'order_delivered'
  | 'order_accepted'
  | 'order_refused'
  | 'case_settled'
  | 'core_due'
  | 'core_yes'
  | 'core_booked'
  | 'core_sent'
  | 'core_extended'
  | 'core_kept'
  | 'core_lapsed'
  | 'core_received'
  | 'core_graded'
  | 'core_released'
  | 'core_settled'
  | 'core_contested';

export interface FlowMail {
  readonly to: MailTo;
  readonly template: MailTemplate;
}

interface RowBase {
  readonly action: Action;
  readonly by: readonly Who[];
  readonly guards: readonly GuardName[];
  readonly money: MoneyRule;
  readonly starts: readonly (ClockName | 'core_clocks')[];
  readonly stops: readonly (ClockName | 'core_clocks')[];
  readonly mails: readonly FlowMail[];
  /** The button: what happens. */
  readonly label: string;
  /** The line in the log once it has happened. */
  readonly log: string;
}

export type OutboundRow = RowBase & {
  readonly leg: 'outbound';
  readonly from: readonly OutboundState[];
  readonly to: OutboundState;
};

export type CoreRow = RowBase & {
  readonly leg: 'core';
  readonly from: readonly CoreState[];
  /** `same` = the state stays, something else of the leg changes. */
  readonly to: CoreState | 'same';
};

export type FlowRow = OutboundRow | CoreRow;

const to = (...pairs: readonly [MailTo, MailTemplate][]): FlowMail[] =>
  pairs.map(([who, template]) => ({ to: who, template }));

const OUTBOUND: readonly OutboundRow[] = [
  {
    leg: 'outbound',
    from: ['awaiting_payment'],
    action: 'pay',
    by: ['provider'],
    to: 'paid',
    guards: ['amounts_match'],
    money: 'hold_everything',
    starts: ['ship_by'],
    stops: ['reserve_lapse'],
    mails: to(['builder', 'order_paid'], ['seller', 'order_paid']),
    label: 'Pay',
    log: 'Paid; everything is held',
  },
  {
    leg: 'outbound',
    from: ['cancelled'],
    action: 'pay',
    by: ['provider'],
    to: 'paid',
    guards: ['amounts_match', 'listing_still_live'],
    money: 'hold_everything',
    starts: ['ship_by'],
    stops: [],
    mails: to(['builder', 'order_paid'], ['seller', 'order_paid']),
    label: 'Pay',
    log: 'A late payment took the unit again; everything is held',
  },
  {
    leg: 'outbound',
    from: ['awaiting_payment'],
    action: 'abandon',
    by: ['builder', 'provider'],
    to: 'cancelled',
    guards: [],
    money: 'none',
    starts: [],
    stops: ['reserve_lapse'],
    mails: [],
    label: 'Give the unit up',
    log: 'Checkout given up; the unit is on sale again',
  },
  {
    leg: 'outbound',
    from: ['awaiting_payment'],
    action: 'expire',
    by: ['clock'],
    to: 'cancelled',
    guards: [],
    money: 'none',
    starts: [],
    stops: ['reserve_lapse'],
    mails: to(['builder', 'order_lapsed']),
    label: 'Let the reservation lapse',
    log: 'Not paid in 30 minutes; the unit is on sale again',
  },
  {
    leg: 'outbound',
    from: ['paid'],
    action: 'cancel',
    by: ['builder', 'seller', 'clock'],
    to: 'cancelled',
    guards: ['not_frozen'],
    money: 'refund_everything',
    starts: [],
    stops: ['ship_by'],
    mails: to(['builder', 'order_cancelled'], ['seller', 'order_cancelled']),
    label: 'Cancel the order',
    log: 'Cancelled; everything goes back to the builder',
  },
  {
    leg: 'outbound',
    from: ['paid'],
    action: 'pack',
    by: ['dock'],
    to: 'packed',
    guards: ['tag_scanned', 'drained_and_plugged', 'packing_photos', 'not_frozen'],
    money: 'none',
    starts: [],
    stops: [],
    mails: to(['builder', 'pickup_ready']),
    label: 'Packed and tagged',
    log: 'Drained, plugged, strapped and photographed',
  },
  {
    leg: 'outbound',
    from: ['packed'],
    action: 'hand_over',
    by: ['dock'],
    to: 'in_transit',
    guards: ['carrier_or_pickup_code', 'not_frozen'],
    money: 'none',
    starts: ['transit_nudge'],
    stops: ['ship_by'],
    mails: to(['builder', 'order_shipped']),
    label: 'Hand over to the carrier',
    log: 'Handed to the carrier',
  },
  {
    leg: 'outbound',
    from: ['packed'],
    action: 'hand_over',
    by: ['dock'],
    to: 'collected',
    guards: ['carrier_or_pickup_code', 'not_frozen'],
    money: 'none',
    starts: ['inspection'],
    stops: ['ship_by'],
    mails: to(['builder', 'order_delivered'], ['seller', 'order_delivered']),
    label: 'Hand over to the builder',
    log: 'Collected by the builder',
  },
  {
    leg: 'outbound',
    from: ['in_transit'],
    action: 'deliver',
    by: ['builder', 'carrier'],
    to: 'delivered',
    guards: [],
    money: 'none',
    starts: ['inspection'],
    stops: ['transit_nudge'],
    mails: to(['builder', 'order_delivered'], ['seller', 'order_delivered']),
    label: 'It has arrived',
    log: 'Delivered; five business days to look it over',
  },
  {
    leg: 'outbound',
    from: ['delivered', 'collected'],
    action: 'accept',
    by: ['builder', 'clock'],
    to: 'accepted',
    guards: ['not_frozen'],
    money: 'pay_unit',
    starts: [],
    stops: ['inspection'],
    mails: to(['builder', 'order_accepted'], ['seller', 'order_accepted']),
    label: 'Accept the unit',
    log: 'Accepted; price and freight released to the seller',
  },
  {
    leg: 'outbound',
    from: ['delivered', 'collected'],
    action: 'refuse',
    by: ['builder'],
    to: 'refused',
    guards: ['refusal_photos', 'not_frozen'],
    money: 'none',
    starts: [],
    stops: ['inspection', 'core_clocks', 'grade_by', 'agree_by'],
    mails: to(['seller', 'order_refused'], ['builder', 'order_refused'], ['admin', 'order_refused']),
    label: 'Refuse the unit',
    log: 'Refused; what is held is held still and a case is open',
  },
  {
    leg: 'outbound',
    from: ['refused'],
    action: 'settle',
    by: ['both', 'admin'],
    to: 'settled',
    guards: ['split_adds_up'],
    money: 'settle_case',
    starts: [],
    stops: [],
    mails: to(['builder', 'case_settled'], ['seller', 'case_settled']),
    label: 'Settle',
    log: 'Settled',
  },
];

const CORE: readonly CoreRow[] = [
  {
    leg: 'core',
    from: ['due'],
    action: 'allow_other_core',
    by: ['seller'],
    to: 'same',
    guards: [],
    money: 'none',
    starts: [],
    stops: [],
    mails: to(['builder', 'core_yes']),
    label: 'Take a different unit as the core',
    log: 'The seller takes a different unit as the core',
  },
  {
    leg: 'core',
    from: ['due'],
    action: 'book_return',
    by: ['builder'],
    to: 'booked',
    guards: ['old_unit_photos', 'same_internals_or_yes', 'not_frozen'],
    money: 'none',
    starts: [],
    stops: [],
    mails: to(['seller', 'core_booked']),
    label: 'Book the core return',
    log: 'Return booked; the tag is ready to print',
  },
  {
    leg: 'core',
    from: ['booked'],
    action: 'send',
    by: ['builder'],
    to: 'coming_back',
    guards: ['how_it_travels'],
    money: 'none',
    starts: [],
    stops: ['core_clocks'],
    mails: to(['seller', 'core_sent']),
    label: 'The core is on its way',
    log: 'Sent back',
  },
  {
    leg: 'core',
    from: ['due', 'booked'],
    action: 'extend',
    by: ['seller'],
    to: 'same',
    guards: ['not_frozen'],
    money: 'none',
    starts: ['core_clocks'],
    stops: ['core_clocks'],
    mails: to(['builder', 'core_extended']),
    label: 'Give more time',
    log: 'The return date was moved',
  },
  {
    leg: 'core',
    from: ['due', 'booked'],
    action: 'keep_unit',
    by: ['builder'],
    to: 'kept',
    guards: ['not_frozen'],
    money: 'deposit_to_seller',
    starts: [],
    stops: ['core_clocks'],
    mails: to(['seller', 'core_kept'], ['builder', 'core_kept']),
    label: 'Keep the old unit',
    log: 'The builder keeps the old unit; the deposit goes to the seller',
  },
  {
    leg: 'core',
    from: ['due', 'booked'],
    action: 'lapse',
    by: ['clock'],
    to: 'lapsed',
    guards: ['not_frozen'],
    money: 'deposit_to_seller',
    starts: [],
    stops: ['core_clocks'],
    mails: to(['builder', 'core_lapsed'], ['seller', 'core_lapsed']),
    label: 'Let the return lapse',
    log: 'Not sent back in time; the deposit goes to the seller',
  },
  {
    leg: 'core',
    from: ['coming_back'],
    action: 'receive',
    by: ['dock'],
    to: 'at_dock',
    guards: [],
    money: 'none',
    starts: ['grade_by'],
    stops: [],
    mails: to(['builder', 'core_received']),
    label: 'Received at the dock',
    log: 'Received at the dock',
  },
  {
    leg: 'core',
    from: ['at_dock'],
    action: 'grade',
    by: ['dock'],
    to: 'graded',
    guards: ['deductions_from_schedule', 'not_frozen'],
    money: 'none',
    starts: ['agree_by'],
    stops: ['grade_by'],
    mails: to(['builder', 'core_graded']),
    label: 'Grade the core',
    log: 'Graded',
  },
  {
    leg: 'core',
    from: ['at_dock'],
    action: 'release',
    by: ['clock'],
    to: 'settled',
    guards: ['not_frozen'],
    money: 'release_core',
    starts: [],
    stops: ['grade_by'],
    mails: to(['builder', 'core_released'], ['seller', 'core_released']),
    label: 'Release the deposit whole',
    log: 'Not graded in five business days; the deposit goes back whole',
  },
  {
    leg: 'core',
    from: ['graded'],
    action: 'agree',
    by: ['builder', 'clock'],
    to: 'settled',
    guards: ['not_frozen'],
    money: 'settle_core',
    starts: [],
    stops: ['agree_by'],
    mails: to(['builder', 'core_settled'], ['seller', 'core_settled']),
    label: 'Agree',
    log: 'Settled by the grade',
  },
  {
    leg: 'core',
    from: ['graded'],
    action: 'contest',
    by: ['builder'],
    to: 'contested',
    guards: ['contest_photos', 'not_frozen'],
    money: 'none',
    starts: [],
    stops: ['agree_by'],
    mails: to(['seller', 'core_contested'], ['builder', 'core_contested'], ['admin', 'core_contested']),
    label: 'Contest the grade',
    log: 'Contested; the deposit is held still and a case is open',
  },
  {
    leg: 'core',
    from: ['contested'],
    action: 'settle',
    by: ['both', 'admin'],
    to: 'settled',
    guards: ['split_adds_up'],
    money: 'settle_case',
    starts: [],
    stops: [],
    mails: to(['builder', 'case_settled'], ['seller', 'case_settled']),
    label: 'Settle',
    log: 'Settled',
  },
];

export const FLOW: readonly FlowRow[] = [...OUTBOUND, ...CORE];

export interface Places {
  readonly outbound: OutboundState;
  readonly core: CoreState | null;
}

const startsHere = (row: FlowRow, places: Places): boolean =>
  row.leg === 'outbound'
    ? row.from.includes(places.outbound)
    : places.core !== null && row.from.includes(places.core);

/** The core leg stands still while the unit itself is refused; only what happens to the iron is still recorded. */
const coreRests = (row: FlowRow, places: Places): boolean =>
  row.leg === 'core' && places.outbound === 'refused' && row.action !== 'receive' && row.action !== 'send';

/** Rows that lead on from where an order is. */
export const rowsFrom = (places: Places): readonly FlowRow[] =>
  FLOW.filter((row) => startsHere(row, places) && !coreRests(row, places));

/** The rows of an action that one of these roles may take. */
export const rowsOf = (action: Action, roles: readonly Who[]): readonly FlowRow[] =>
  FLOW.filter((row) => row.action === action && row.by.some((who) => roles.includes(who)));

/** The leg an action belongs to (`settle` belongs to both). */
export const legsOf = (action: Action): readonly Leg[] => [
  ...new Set(FLOW.filter((row) => row.action === action).map((row) => row.leg)),
];
