// A yard's work as a queue: first what frees money or holds up a carrier, the nearest deadline first.
import { formatCents } from '../../../shared/kernel/money';
import type { OrderSummary } from '../../../shared/orders/contract';
import type { Action } from '../../../shared/orders/states';
import { paths } from '../../paths';
import type { Instant } from '../../ui/dates';

export type JobKind = 'grade' | 'hand_over' | 'pack' | 'case' | 'receive' | 'answer';

export interface Job {
  readonly key: string;
  readonly kind: JobKind;
  readonly title: string;
  readonly detail: string;
  readonly dueAt: Instant | null;
  readonly startedAt: Instant;
  readonly button: string;
  readonly to: string;
}

/** Graded money and a waiting carrier come first; a core still on its way can only be waited for. */
const RANK: readonly JobKind[] = ['grade', 'hand_over', 'pack', 'case', 'answer', 'receive'];

const can = (order: OrderSummary, action: Action): boolean =>
  order.next.some((step) => step.action === action);

function jobOf(order: OrderSummary): Omit<Job, 'dueAt' | 'startedAt' | 'key'> | null {
  const page = paths.order.to({ id: order.id });
  const held = formatCents(order.heldCents);
  if (order.caseId !== null) {
    return {
      kind: 'case',
      title: `Settle the case on order ${order.number}`,
      detail: `${order.title}, ${order.builderName}. ${held} is held still.`,
      button: 'Open it',
      to: paths.case.to({ id: order.caseId }),
    };
  }
  if (can(order, 'grade')) {
    return {
      kind: 'grade',
      title: `Grade core ${order.number}, on the dock`,
      detail: `${order.title} from ${order.builderName}. Deposit waits on you.`,
      button: 'Grade it',
      to: paths.receive.to({ orderId: order.id }),
    };
  }
  if (can(order, 'hand_over')) {
    return {
      kind: 'hand_over',
      title: `Load order ${order.number}`,
      detail: `${order.title} for ${order.builderName}. ${held} waits for it.`,
      button: 'Hand it over',
      to: page,
    };
  }
  if (can(order, 'pack')) {
    return {
      kind: 'pack',
      title: `Pack order ${order.number}`,
      detail: `${order.title} for ${order.builderName}. Drain, plug, strap.`,
      button: 'Pack it',
      to: page,
    };
  }
  if (can(order, 'receive')) {
    return {
      kind: 'receive',
      title: `Core ${order.number} is on its way`,
      detail: `${order.title} from ${order.builderName}. Scan it when it comes.`,
      button: 'Take it in',
      to: paths.receive.to({ orderId: order.id }),
    };
  }
  return null;
}

const dueOf = (order: OrderSummary, kind: JobKind): Instant | null =>
  kind === 'receive' ? null : order.deadlineAt;

const timeOf = (job: Job): number => (job.dueAt ? Date.parse(job.dueAt) : Infinity);

const DAY_MS = 86_400_000;

/**
 * The queue at an instant: what falls due within a day first, then by kind, then by deadline.
 * @param now the server's time, ISO 8601
 */
export function workQueue(orders: readonly OrderSummary[], now: Instant): Job[] {
  const jobs = orders.flatMap((order): Job[] => {
    const job = jobOf(order);
    if (!job) return [];
    return [{ ...job, key: order.id, dueAt: dueOf(order, job.kind), startedAt: order.updatedAt }];
  });
  const urgent = (job: Job): number => (timeOf(job) - Date.parse(now) < DAY_MS ? 0 : 1);
  return jobs.sort(
    (a, b) => urgent(a) - urgent(b) || RANK.indexOf(a.kind) - RANK.indexOf(b.kind) || timeOf(a) - timeOf(b),
  );
}
