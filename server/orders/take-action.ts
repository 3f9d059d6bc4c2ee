// One function for every action a person takes: who are they here, and what does the code of an old unit say.
import type { Actor } from '../../shared/accounts/actor';
import { PERSON_ACTIONS, type PersonAction } from '../../shared/orders/actions';
import type { CoreMatch, Step } from '../../shared/orders/facts';
import type { Deps } from '../deps';
import { notFound, type Refusal } from '../http/refusal';
import { familyOfCode, familyOfVariant } from '../reading/for-others';
import { actOnOrder } from './act';
import type { OrderRow } from './load';
import { findHead } from './queries';
import { rolesOf, sideOf } from './roles';

/** Has the old unit the same internals as the one bought? What the stamp says beats what the builder says. */
async function matchOf(deps: Deps, order: OrderRow, step: Step): Promise<CoreMatch | null> {
  if (step.action !== 'book_return') return null;
  const read = await familyOfCode(deps, step.input.caseCode);
  const familyId = read ?? (step.input.variantId ? await familyOfVariant(deps, step.input.variantId) : null);
  if (familyId === null) return 'unknown';
  return familyId === order.familyId ? 'same' : 'different';
}

export type PersonStep = Extract<Step, { action: PersonAction }>;

export async function takeAction(
  deps: Deps,
  actor: Actor,
  orderId: string,
  step: PersonStep,
): Promise<OrderRow | Refusal> {
  const head = await findHead(deps.db, orderId);
  if (!head || sideOf(actor, head.order) === null) return notFound('order');
  const coreMatch = await matchOf(deps, head.order, step);
  const result = await actOnOrder(deps, {
    orderId,
    roles: rolesOf(actor, head.order),
    step,
    actorUserId: actor.userId,
    ...(coreMatch ? { coreMatch } : {}),
  });
  return result;
}

export const isPersonAction = (text: string): text is PersonAction =>
  PERSON_ACTIONS.some((one) => one === text);
