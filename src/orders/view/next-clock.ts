// The deadline that the next panel counts down to, when its time began, and what happens then.
import type { ClockName } from '../../../shared/orders/clocks';
import type { Order } from '../../../shared/orders/contract';
import type { Instant } from '../../ui/dates';
import { strikesAt } from './moments';
import type { NextButton } from './next-step';

export interface NextClockView {
  readonly dueAt: Instant;
  readonly startedAt: Instant;
  /** Stands before the date: "Pickup by". */
  readonly lead: string;
  /** Minutes matter, not days. */
  readonly short: boolean;
}

interface Running {
  readonly clock: ClockName;
  readonly startedAt: Instant | null;
  readonly lead: string;
}

function coreRunning(order: Order): Running | null {
  const { core } = order;
  switch (core?.state) {
    case 'at_dock':
      return { clock: 'grade_by', startedAt: core.receivedAt, lead: 'Grade by' };
    case 'graded':
      return { clock: 'agree_by', startedAt: core.gradedAt, lead: 'Answer by' };
    default:
      return null;
  }
}

function outboundRunning(order: Order): Running | null {
  const { outbound } = order;
  switch (outbound.state) {
    case 'awaiting_payment':
      return { clock: 'reserve_lapse', startedAt: order.createdAt, lead: 'Pay by' };
    case 'paid':
    case 'packed':
      return { clock: 'ship_by', startedAt: outbound.paidAt, lead: 'Ship by' };
    case 'delivered':
    case 'collected':
      return { clock: 'inspection', startedAt: outbound.deliveredAt, lead: 'Accepted by itself on' };
    default:
      return null;
  }
}

export function clockOf(order: Order, red: NextButton | null): NextClockView | null {
  if (order.frozen || red?.move.kind === 'case') return null;
  const running = outboundRunning(order) ?? coreRunning(order);
  const dueAt = running ? strikesAt(order, running.clock) : null;
  if (running && dueAt) {
    return {
      dueAt,
      startedAt: running.startedAt ?? order.createdAt,
      lead: running.lead,
      short: running.clock === 'reserve_lapse',
    };
  }
  const { core } = order;
  if (!core?.dueAt || (core.state !== 'due' && core.state !== 'booked')) return null;
  return {
    dueAt: core.dueAt,
    startedAt: order.outbound.deliveredAt ?? order.createdAt,
    lead: 'Send it by',
    short: false,
  };
}
