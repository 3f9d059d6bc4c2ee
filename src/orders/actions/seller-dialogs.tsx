// What a seller may do besides packing and grading: give more time, or cancel with a reason.
import { ACTION_INPUT } from '../../../shared/orders/actions';
import { actionEndpoints } from '../../../shared/orders/contract';
import { formatCents } from '../../../shared/kernel/money';
import { formatDay } from '../../ui/dates';
import { Checkbox } from '../../ui/form/checkbox';
import { useZodForm } from '../../ui/form/form';
import { TextArea } from '../../ui/form/text-area';
import { TextInput } from '../../ui/form/text-input';
import { useOrderAction } from '../api';
import { buttonWords } from '../view/next-step';
import type { ActionProps } from './action-props';
import { FormDialog } from './form-dialog';

const DAY_MS = 86_400_000;
const USUAL_DAYS = 14;

export function ExtendDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.extend, order.id);
  const form = useZodForm(ACTION_INPUT.extend, { version: order.version, days: USUAL_DAYS });
  const days = form.watch('days');
  const dueAt = order.core?.dueAt ?? null;
  const moved =
    dueAt && Number.isInteger(days) && days > 0
      ? `New date: ${formatDay(new Date(Date.parse(dueAt) + days * DAY_MS).toISOString(), order.zone)}`
      : 'Whole days, 1 to 90';
  return (
    <FormDialog
      onClose={onClose}
      title="Give more time"
      description={`${order.builderName} gets a mail with the new date.`}
      form={form}
      onSubmit={(values) => action.mutateAsync(values)}
      stops="the new date"
      submitWords="Give more time"
    >
      <TextInput
        label="Days more"
        type="number"
        min={1}
        max={90}
        hint={<span aria-live="polite">{moved}</span>}
        error={form.formState.errors.days?.message}
        {...form.register('days', { valueAsNumber: true })}
      />
    </FormDialog>
  );
}

export function CancelDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.cancel, order.id);
  const bySeller = order.role === 'seller';
  const form = useZodForm(ACTION_INPUT.cancel, {
    version: order.version,
    ...(bySeller ? { reason: '', cannotSupply: false } : {}),
  });
  const { errors } = form.formState;
  return (
    <FormDialog
      onClose={onClose}
      title={`Cancel order ${order.number}?`}
      description={`All of the ${formatCents(order.money.totalCents)} goes back to the card it came from. This cannot be called back.`}
      form={form}
      onSubmit={(values) => action.mutateAsync(values)}
      stops="the cancellation"
      submitWords={buttonWords(order, 'cancel')}
    >
      {bySeller && (
        <>
          <TextArea
            label="Why"
            hint={`${order.builderName} reads this.`}
            rows={3}
            error={errors.reason?.message}
            {...form.register('reason')}
          />
          <Checkbox
            label="I cannot supply this unit: take it off sale"
            error={errors.cannotSupply?.message}
            {...form.register('cannotSupply')}
          />
        </>
      )}
    </FormDialog>
  );
}
