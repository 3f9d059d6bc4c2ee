// Handing over: carrier and tracking number, or the code that the builder who collects it shows.
import { ACTION_INPUT } from '../../../shared/orders/actions';
import { actionEndpoints } from '../../../shared/orders/contract';
import { useZodForm } from '../../ui/form/form';
import { TextInput } from '../../ui/form/text-input';
import { useOrderAction } from '../api';
import { CAUTIONS, buttonWords } from '../view/next-step';
import type { ActionProps } from './action-props';
import { FormDialog } from './form-dialog';

export function HandOverDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.hand_over, order.id);
  const pickup = order.outbound.delivery.method === 'pickup';
  const empty = pickup ? { pickupCode: '' } : { carrier: '', tracking: '' };
  const form = useZodForm(ACTION_INPUT.hand_over, { version: order.version, ...empty });
  const { errors } = form.formState;
  return (
    <FormDialog
      onClose={onClose}
      title={pickup ? `Hand it to ${order.builderName}` : 'Hand it to the carrier'}
      cautions={CAUTIONS.hand_over ?? []}
      form={form}
      onSubmit={(values) => action.mutateAsync(values)}
      stops="the hand-over"
      submitWords={buttonWords(order, 'hand_over')}
    >
      {pickup ? (
        <TextInput
          label="Pickup code"
          hint="Six digits. The builder has it on the order page."
          inputMode="numeric"
          autoComplete="off"
          error={errors.pickupCode?.message}
          {...form.register('pickupCode')}
        />
      ) : (
        <>
          <TextInput
            label="Carrier"
            hint="The name on the truck"
            error={errors.carrier?.message}
            {...form.register('carrier')}
          />
          <TextInput
            label="Tracking or PRO number"
            autoComplete="off"
            error={errors.tracking?.message}
            {...form.register('tracking')}
          />
        </>
      )}
    </FormDialog>
  );
}
