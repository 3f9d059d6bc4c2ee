// Refusing a unit or contesting a grade: why, in words both sides and an admin read, and at least one photo.
import { ACTION_INPUT } from '../../../shared/orders/actions';
import { actionEndpoints } from '../../../shared/orders/contract';
import { PROOF_PHOTOS_MIN } from '../../../shared/orders/guards';
import { formatCents } from '../../../shared/kernel/money';
import { useZodForm } from '../../ui/form/form';
import { TextArea } from '../../ui/form/text-area';
import { useOrderAction } from '../api';
import { PhotoShelf } from '../photos/photo-shelf';
import type { ActionProps } from './action-props';
import { FormDialog } from './form-dialog';

export function RefuseDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.refuse, order.id);
  const form = useZodForm(ACTION_INPUT.refuse, { version: order.version, reason: '' });
  return (
    <FormDialog
      onClose={onClose}
      title="Refuse the unit"
      description={`All of the ${formatCents(order.money.heldCents)} stays held and a case opens. Leave the unit as it came until the case is settled.`}
      form={form}
      onSubmit={(values) => action.mutateAsync(values)}
      stops="the refusal"
      submitWords="Refuse it, open a case"
    >
      <TextArea
        label="What is wrong"
        hint="Both sides and an admin read this."
        error={form.formState.errors.reason?.message}
        {...form.register('reason')}
      />
      <PhotoShelf
        order={order}
        purpose="refuse"
        title="Photos of what is wrong"
        hint="The code, and the spot itself. Freight damage with the packing around it."
        needed={PROOF_PHOTOS_MIN}
      />
    </FormDialog>
  );
}

export function ContestDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.contest, order.id);
  const form = useZodForm(ACTION_INPUT.contest, { version: order.version, reason: '' });
  return (
    <FormDialog
      onClose={onClose}
      title="Contest the grade"
      description={`The deposit of ${formatCents(order.money.heldCoreCents)} stays held and a case opens.`}
      form={form}
      onSubmit={(values) => action.mutateAsync(values)}
      stops="the contest"
      submitWords="Contest it, open a case"
    >
      <TextArea
        label="What is wrong with the grade"
        hint="Name the deduction you mean. Both sides and an admin read this."
        error={form.formState.errors.reason?.message}
        {...form.register('reason')}
      />
      <PhotoShelf
        order={order}
        purpose="contest"
        title="Photos that show it"
        hint="The same spot as it left you."
        needed={PROOF_PHOTOS_MIN}
      />
    </FormDialog>
  );
}
