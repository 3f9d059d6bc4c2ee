// Where an order stands, in three words and a flag, for lists.
import type { OrderSummary } from '../../../shared/orders/contract';
import { OUTBOUND_FINAL, type CoreState, type OutboundState } from '../../../shared/orders/states';
import type { FlagTone } from '../../ui/flag';

export interface StateWords {
  readonly words: string;
  readonly tone: FlagTone;
}

const OUT: Readonly<Record<OutboundState, string>> = {
  awaiting_payment: 'Not paid yet',
  paid: 'Paid, to pack',
  packed: 'Packed',
  in_transit: 'On its way',
  collected: 'Collected, to check',
  delivered: 'Delivered, to check',
  accepted: 'Accepted',
  refused: 'Refused, case open',
  settled: 'Settled',
  cancelled: 'Cancelled',
};

const BACK: Readonly<Record<CoreState, string>> = {
  held: 'Accepted',
  due: 'Core due',
  booked: 'Core booked',
  coming_back: 'Core on its way',
  at_dock: 'Core at the dock',
  graded: 'Graded',
  contested: 'Contested, case open',
  kept: 'Old unit kept',
  lapsed: 'Return lapsed',
  settled: 'Deposit settled',
  released: 'Settled',
};

type Placed = Pick<OrderSummary, 'outboundState' | 'coreState' | 'heldCents' | 'caseId'>;

const wordsOf = ({ outboundState, coreState }: Placed): string =>
  outboundState === 'accepted' && coreState ? BACK[coreState] : OUT[outboundState];

export function stateOf(order: Placed): StateWords {
  const words = wordsOf(order);
  if (order.caseId !== null) return { words, tone: 'stop' };
  if (order.heldCents > 0) return { words, tone: 'held' };
  const done = OUTBOUND_FINAL.includes(order.outboundState);
  return { words, tone: done ? 'fits' : 'plain' };
}
