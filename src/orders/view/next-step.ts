// What the reader does next on an order: the one red step, what stands beside it, the deadline, and what to mind.
import { formatCents } from '../../../shared/kernel/money';
import type { PersonAction } from '../../../shared/orders/actions';
import { PERSON_ACTIONS } from '../../../shared/orders/actions';
import type { Order } from '../../../shared/orders/contract';
import { builderTo, sellerTo } from './sides';
import { titleOf, waitingOf } from './next-words';
import { clockOf, type NextClockView } from './next-clock';

/** What a button of an order does: take an action, or go where it is taken. */
export type NextMove =
  | { readonly kind: 'action'; readonly action: PersonAction }
  | { readonly kind: 'pay' }
  | { readonly kind: 'book_return' }
  | { readonly kind: 'grade' }
  | { readonly kind: 'case'; readonly caseId: string };

export interface NextButton {
  readonly label: string;
  readonly move: NextMove;
}

export interface NextView {
  readonly title: string;
  /** What the reader waits for, where nothing is theirs to do. */
  readonly waiting: string | null;
  readonly clock: NextClockView | null;
  readonly steps: readonly string[];
  readonly red: NextButton | null;
  /** Other things the reader may do now, none of which moves the order on its way. */
  readonly plain: readonly NextButton[];
  readonly cautions: readonly string[];
}

/** Actions that move an order on its way, in the order in which one of them is the next; the rest stand aside. */
export const FORWARD: readonly PersonAction[] = [
  'pack',
  'hand_over',
  'deliver',
  'accept',
  'receive',
  'grade',
  'agree',
  'send',
  'book_return',
];

const isPersonAction = (text: string): text is PersonAction => PERSON_ACTIONS.some((one) => one === text);

function unitOut(order: Order): number {
  return order.money.heldUnitCents;
}

/** The words on the button of an action: what happens, and how much money moves. */
export function buttonWords(order: Order, action: PersonAction): string {
  const { money, outbound } = order;
  switch (action) {
    case 'accept':
      return `Accept it, release ${formatCents(unitOut(order))}`;
    case 'keep_unit':
      return `Keep the old unit, give up ${formatCents(money.heldCoreCents)}`;
    case 'agree':
      return `Agree, ${formatCents(order.core?.toBuilderCents ?? 0)} back to ${builderTo(order)}`;
    case 'cancel':
      return `Cancel, ${formatCents(money.totalCents)} back to ${builderTo(order)}`;
    case 'abandon':
      return 'Give the unit up';
    case 'pack':
      return 'Packed and tagged';
    case 'hand_over':
      return outbound.delivery.method === 'pickup' ? 'Hand it to the builder' : 'Hand it to the carrier';
    case 'deliver':
      return order.role === 'admin' ? 'Enter proof of delivery' : 'It has arrived';
    case 'refuse':
      return 'Refuse the unit';
    case 'allow_other_core':
      return 'Take a different unit as the core';
    case 'book_return':
      return 'Book the core return';
    case 'send':
      return 'The core is on its way';
    case 'extend':
      return 'Give more time';
    case 'receive':
      return 'The core is at the dock';
    case 'grade':
      return 'Grade the core';
    case 'contest':
      return 'Contest the grade';
  }
}

const moveOf = (action: PersonAction): NextMove => {
  if (action === 'book_return') return { kind: 'book_return' };
  return action === 'grade' ? { kind: 'grade' } : { kind: 'action', action };
};

const buttonOf = (order: Order, action: PersonAction): NextButton => ({
  label: buttonWords(order, action),
  move: moveOf(action),
});

function redOf(order: Order, actions: readonly PersonAction[]): NextButton | null {
  if (order.role === 'builder' && order.outbound.state === 'awaiting_payment') {
    return { label: `Pay ${formatCents(order.money.totalCents)}`, move: { kind: 'pay' } };
  }
  if (order.caseId !== null) {
    return {
      label: order.role === 'admin' ? 'Settle the case' : 'Open the case',
      move: { kind: 'case', caseId: order.caseId },
    };
  }
  const forward = FORWARD.find((action) => actions.includes(action));
  return forward ? buttonOf(order, forward) : null;
}

const STEPS: Readonly<Partial<Record<PersonAction, readonly string[]>>> = {
  pack: ['Drain it, plug every opening.', 'Strap it to the pallet, tag on.', 'Shoot it three times, packed.'],
  accept: [
    'Compare the code with the listing.',
    'Look for freight damage first.',
    'Turn it by hand before it goes in.',
  ],
  book_return: ['Drain it and plug the lines.', 'Type its case code.', 'Take the same nine shots.'],
  send: ['Print the core tag, wire it to an ear.', 'Strap it to the pallet.', 'Keep the tracking number.'],
  agree: ['Look at each photo.', 'Compare with the terms.', 'Agree, or say what is wrong.'],
  receive: ['Scan the core tag.', 'Look it over before signing.'],
  grade: ['Work through the checks.', 'Photo for each deduction.'],
};

const LIFT = 'Heavy and off balance. Use a hoist or a transmission jack with its strap, and two people.';
const FLUID = 'Fluid may be left inside. Catch it, hand it in as used oil, keep it off the ground.';
const MANUAL = 'The service manual, local rules and licensed practice come first.';

/** What can hurt somebody, beside the action where it can. */
export const CAUTIONS: Readonly<Partial<Record<PersonAction, readonly string[]>>> = {
  pack: [LIFT, 'The converter can slide out of the bell. Strap it before it moves.', FLUID],
  hand_over: [LIFT, 'Nobody stands behind or under the load while it is lifted.'],
  receive: [LIFT, 'It may have shifted on the pallet. Cut the straps from the side.', FLUID],
  grade: [LIFT, 'Chock it before you turn it by hand.'],
  send: [LIFT, FLUID, MANUAL],
  book_return: [LIFT, FLUID, MANUAL],
  accept: [LIFT, MANUAL],
};

/** An aside nobody looks for first: it gives something up. */
const LAST: readonly PersonAction[] = ['keep_unit', 'cancel', 'abandon'];

function asides(actions: readonly PersonAction[], red: NextButton | null): PersonAction[] {
  const taken = actions.filter((action) => {
    const move = moveOf(action);
    return (
      !red ||
      move.kind !== red.move.kind ||
      (move.kind === 'action' && red.move.kind === 'action' && move.action !== red.move.action)
    );
  });
  return [...taken.filter((one) => !LAST.includes(one)), ...taken.filter((one) => LAST.includes(one))];
}

/** The action whose steps, clock and cautions the panel shows. */
function leading(red: NextButton | null): PersonAction | null {
  if (!red) return null;
  if (red.move.kind === 'action') return red.move.action;
  return red.move.kind === 'book_return' || red.move.kind === 'grade' ? red.move.kind : null;
}

export function nextOf(order: Order): NextView {
  const actions = order.next.map((one) => one.action).filter(isPersonAction);
  const red = redOf(order, actions);
  const lead = leading(red);
  return {
    title: titleOf(order, red),
    waiting: red ? null : waitingOf(order),
    clock: clockOf(order, red),
    steps: (lead && STEPS[lead]) ?? [],
    red,
    plain: asides(actions, red).map((action) => buttonOf(order, action)),
    cautions: (lead && CAUTIONS[lead]) ?? [],
  };
}

/** Where the deposit goes when nothing is done, for the panel's small print. */
export function silenceOf(order: Order): string | null {
  const deposit = formatCents(order.money.depositCents);
  switch (order.core?.state) {
    case 'due':
    case 'booked':
      return `Seven days after that date the ${deposit} goes to ${sellerTo(order)}.`;
    case 'at_dock':
      return `Not graded by then, the ${deposit} goes back to ${builderTo(order)} whole.`;
    case 'graded':
      return `Silence counts as yes: then the money moves and cannot be called back.`;
    default:
      return null;
  }
}
