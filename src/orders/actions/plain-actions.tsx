// Actions that need no form, only a yes; those that move money say how much and that it cannot be called back.
import { formatCents } from '../../../shared/kernel/money';
import { actionEndpoints } from '../../../shared/orders/contract';
import { useOrderAction } from '../api';
import { Cautions } from '../cautions';
import { CAUTIONS, buttonWords } from '../view/next-step';
import { builderTo, sellerTo } from '../view/sides';
import type { ActionProps } from './action-props';
import { ConfirmAction } from './confirm-action';

const FOR_GOOD = 'Once it has moved it cannot be called back.';

export function AcceptDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.accept, order.id);
  const { heldUnitCents, heldCoreCents } = order.money;
  const kept = heldCoreCents > 0 ? ` The core deposit of ${formatCents(heldCoreCents)} stays held.` : '';
  return (
    <ConfirmAction
      onClose={onClose}
      title={`Release ${formatCents(heldUnitCents)} to ${order.sellerName}?`}
      description={`Accepting says that this is the unit that was sold. Price and freight, ${formatCents(heldUnitCents)}, are released. ${FOR_GOOD}${kept}`}
      confirmWords={buttonWords(order, 'accept')}
      onConfirm={() => action.mutateAsync({ version: order.version })}
    />
  );
}

export function KeepUnitDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.keep_unit, order.id);
  const deposit = formatCents(order.money.heldCoreCents);
  return (
    <ConfirmAction
      onClose={onClose}
      title={`Give up the deposit of ${deposit}?`}
      description={`The old unit stays with you and nothing has to be sent. ${deposit} is released to ${order.sellerName}. ${FOR_GOOD}`}
      confirmWords={buttonWords(order, 'keep_unit')}
      onConfirm={() => action.mutateAsync({ version: order.version })}
    />
  );
}

export function AgreeDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.agree, order.id);
  const back = formatCents(order.core?.toBuilderCents ?? 0);
  const kept = formatCents(order.core?.toSellerCents ?? 0);
  return (
    <ConfirmAction
      onClose={onClose}
      title={`Agree to grade ${order.core?.grade ?? ''}?`}
      description={`${back} goes back to ${builderTo(order)}, ${kept} goes to ${sellerTo(order)}. ${FOR_GOOD}`}
      confirmWords={buttonWords(order, 'agree')}
      onConfirm={() => action.mutateAsync({ version: order.version })}
    />
  );
}

export function AbandonDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.abandon, order.id);
  return (
    <ConfirmAction
      onClose={onClose}
      title="Give this unit up?"
      description="Nothing was taken. The unit goes back on sale at once."
      confirmWords="Give the unit up"
      onConfirm={() => action.mutateAsync({ version: order.version })}
    />
  );
}

export function DeliverDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.deliver, order.id);
  const proof = order.role === 'admin';
  return (
    <ConfirmAction
      onClose={onClose}
      title={proof ? 'Did the carrier deliver it?' : 'Has it arrived?'}
      description={
        proof
          ? 'Enter this only with the carrier’s proof of delivery. It starts the inspection time and the return window.'
          : 'Five business days to look it over begin now, and so does the return window of your old unit. Write freight damage on the carrier’s paper before you sign it.'
      }
      confirmWords={proof ? 'Enter proof of delivery' : 'Yes, it has arrived'}
      onConfirm={() => action.mutateAsync({ version: order.version })}
    />
  );
}

export function ReceiveDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.receive, order.id);
  return (
    <ConfirmAction
      onClose={onClose}
      title="Is the core on the dock?"
      description={`Five business days to grade it begin now. Not graded by then, the deposit goes back to ${order.builderName} whole.`}
      confirmWords="Yes, it is here"
      onConfirm={() => action.mutateAsync({ version: order.version })}
    >
      <Cautions lines={CAUTIONS.receive ?? []} />
    </ConfirmAction>
  );
}

export function AllowOtherCoreDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.allow_other_core, order.id);
  return (
    <ConfirmAction
      onClose={onClose}
      title="Take a different unit as the core?"
      description={`${order.builderName} may then send back a unit with other internals than the one you sold. The deposit and the schedule stay as they are.`}
      confirmWords="Yes, take it"
      onConfirm={() => action.mutateAsync({ version: order.version })}
    />
  );
}
