// The core leaves the builder: with a carrier, or dropped off at the yard. On time is judged by this day.
import { ACTION_INPUT } from '../../../shared/orders/actions';
import { actionEndpoints } from '../../../shared/orders/contract';
import { Segment } from '../../ui/form/segment';
import { useZodForm } from '../../ui/form/form';
import { TextInput } from '../../ui/form/text-input';
import { useOrderAction } from '../api';
import { CAUTIONS } from '../view/next-step';
import type { ActionProps } from './action-props';
import { FormDialog } from './form-dialog';

const WAYS = [
  { value: 'carrier', label: 'Carrier' },
  { value: 'drop_off', label: 'I bring it' },
] as const;

export function SendDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.send, order.id);
  const form = useZodForm(ACTION_INPUT.send, {
    version: order.version,
    method: 'carrier',
    carrier: '',
    tracking: '',
  });
  const { errors } = form.formState;
  const method = form.watch('method');
  const payer = order.returnFreight === 'seller' ? `${order.sellerName} pays` : 'You pay';
  return (
    <FormDialog
      onClose={onClose}
      title="The core is on its way"
      description={`${payer} the return freight, as in the terms. On time is judged by today.`}
      cautions={CAUTIONS.send ?? []}
      form={form}
      onSubmit={({ carrier, tracking, ...values }) =>
        action.mutateAsync(values.method === 'carrier' ? { ...values, carrier, tracking } : values)
      }
      stops="the sending"
      submitWords={method === 'carrier' ? 'The carrier has it' : 'I am bringing it'}
    >
      <Segment
        legend="How it travels"
        legendShown
        options={WAYS}
        value={method}
        onChange={(value) => {
          form.setValue('method', value);
          // Fields that are not asked for may not hold the form up.
          const blank = value === 'carrier' ? '' : undefined;
          form.setValue('carrier', blank);
          form.setValue('tracking', blank);
        }}
      />
      {method === 'carrier' && (
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
