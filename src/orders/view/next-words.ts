// The words of the next panel: what comes next in a few words, and what is waited for where nothing is the reader's to do.
import type { PersonAction } from '../../../shared/orders/actions';
import type { Order } from '../../../shared/orders/contract';
import type { CoreState, OutboundState } from '../../../shared/orders/states';
import type { NextButton } from './next-step';

const TITLES: Readonly<Record<PersonAction, string>> = {
  pack: 'pack it',
  hand_over: 'hand it over',
  deliver: 'say it has arrived',
  accept: 'check the unit',
  receive: 'take the core in',
  grade: 'grade the core',
  agree: 'answer the grade',
  send: 'send the core back',
  book_return: 'send the core back',
  cancel: 'cancel',
  abandon: 'give it up',
  refuse: 'refuse it',
  allow_other_core: 'answer the builder',
  extend: 'give more time',
  keep_unit: 'keep the old unit',
  contest: 'contest the grade',
};

const yard = (order: Order): string => (order.role === 'builder' ? order.sellerName : 'the yard');

function waitedOut(order: Order, state: OutboundState): string {
  switch (state) {
    case 'awaiting_payment':
      return 'the builder pays';
    case 'paid':
      return `${yard(order)} packs it`;
    case 'packed':
      return order.outbound.delivery.method === 'pickup'
        ? 'the builder collects it'
        : `the carrier picks it up`;
    case 'in_transit':
      return 'the carrier brings it';
    case 'delivered':
    case 'collected':
      return 'the builder checks it';
    default:
      return 'nothing';
  }
}

function waitedBack(order: Order, state: CoreState | null): string | null {
  switch (state) {
    case 'due':
    case 'booked':
      return 'the core comes back';
    case 'coming_back':
      return `the core reaches ${yard(order)}`;
    case 'at_dock':
      return `${yard(order)} grades the core`;
    case 'graded':
      return 'the builder answers the grade';
    default:
      return null;
  }
}

const awaited = (order: Order): string | null => {
  const out = waitedOut(order, order.outbound.state);
  return out === 'nothing' ? waitedBack(order, order.core?.state ?? null) : out;
};

const CLOSED: Readonly<Partial<Record<OutboundState, string>>> = {
  cancelled: 'Cancelled',
  settled: 'Settled',
  accepted: 'All done',
};

export function titleOf(order: Order, red: NextButton | null): string {
  if (red?.move.kind === 'pay') return 'Next: pay';
  if (red?.move.kind === 'case') return 'Next: settle the case';
  if (order.frozen) return 'Held still';
  if (red?.move.kind === 'action') return `Next: ${TITLES[red.move.action]}`;
  if (red?.move.kind === 'book_return' || red?.move.kind === 'grade') return `Next: ${TITLES[red.move.kind]}`;
  const wait = awaited(order);
  return wait ? `Next: ${wait}` : (CLOSED[order.outbound.state] ?? 'Nothing to do');
}

/** A sentence on what the reader waits for, or how it ended. */
export function waitingOf(order: Order): string {
  if (order.frozen) return 'The card payment is disputed at the bank. Nothing moves until that is decided.';
  if (awaited(order)) return 'Nothing for you to do now. A mail comes when it moves.';
  switch (order.outbound.state) {
    case 'cancelled':
      return order.outbound.paidAt === null
        ? 'Nothing was taken. The unit went back on sale.'
        : 'Everything that was paid went back to the builder.';
    case 'settled':
      return 'The case is settled. Nothing is held any more.';
    default:
      return 'Every sum has reached its owner. Nothing is held any more.';
  }
}
