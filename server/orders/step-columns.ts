// Which columns of the order a step fills besides its states, and the note it leaves in the log.
import type { Decision } from '../../shared/orders/decide';
import type { Step } from '../../shared/orders/facts';
import type { OrderRow } from './load';

/** The rules give deductions as read-only; the row wants its own copy. */
const gradeColumns = (decision: Decision): Partial<OrderRow> => ({
  deductions: [...(decision.changes.deductions ?? [])],
});

export function columnsOf(step: Step, decision: Decision, now: Date): Partial<OrderRow> {
  switch (step.action) {
    case 'pay':
      return { paidAt: now };
    case 'hand_over':
      return {
        carrier: step.input.carrier ?? null,
        tracking: step.input.tracking ?? null,
        shippedAt: now,
        ...(decision.outbound === 'collected' ? { deliveredAt: now } : {}),
      };
    case 'deliver':
      return { deliveredAt: now };
    case 'book_return':
      return { coreCaseCode: step.input.caseCode };
    case 'send':
      return {
        coreSentAt: now,
        coreMethod: step.input.method,
        coreCarrier: step.input.carrier ?? null,
        coreTracking: step.input.tracking ?? null,
      };
    case 'receive':
      return { coreReceivedAt: now };
    case 'grade':
      return { coreGradedAt: now, grade: step.input.grade, ...gradeColumns(decision) };
    default:
      return {};
  }
}

export function noteOf(step: Step, finding: string | undefined): string | null {
  if (step.action === 'settle') return finding ?? null;
  if (!('input' in step)) return null;
  if ('reason' in step.input && step.input.reason) return step.input.reason;
  if ('note' in step.input && step.input.note) return step.input.note;
  if (step.action === 'hand_over' || step.action === 'send') {
    return [step.input.carrier, step.input.tracking].filter(Boolean).join(', ') || null;
  }
  return null;
}
