// Packing: the tag of the unit scanned, drained and plugged confirmed, three photos of the pallet.
import { ACTION_INPUT } from '../../../shared/orders/actions';
import { actionEndpoints } from '../../../shared/orders/contract';
import { PACKING_PHOTOS_MIN } from '../../../shared/orders/guards';
import { Checkbox } from '../../ui/form/checkbox';
import { useZodForm } from '../../ui/form/form';
import { TextArea } from '../../ui/form/text-area';
import { useOrderAction } from '../api';
import { PhotoShelf } from '../photos/photo-shelf';
import { TagField } from '../scan/tag-field';
import { CAUTIONS } from '../view/next-step';
import type { ActionProps } from './action-props';
import { FormDialog } from './form-dialog';

export function PackDialog({ order, onClose }: ActionProps) {
  const action = useOrderAction(actionEndpoints.pack, order.id);
  const form = useZodForm(ACTION_INPUT.pack, { version: order.version, tagCode: '' });
  const { errors } = form.formState;
  return (
    <FormDialog
      onClose={onClose}
      title={`Pack order ${order.number}`}
      cautions={CAUTIONS.pack ?? []}
      form={form}
      onSubmit={(values) => action.mutateAsync(values)}
      stops="the packing"
      submitWords="Packed and tagged"
    >
      <TagField control={form.control} name="tagCode" label="Tag wired to the unit" />
      <Checkbox label="Drained" error={errors.drained?.message} {...form.register('drained')} />
      <Checkbox label="Every opening plugged" error={errors.plugged?.message} {...form.register('plugged')} />
      <PhotoShelf
        order={order}
        purpose="pack"
        title="Packing photos"
        hint="Whole pallet, straps, tag. They prove how it left."
        needed={PACKING_PHOTOS_MIN}
        yard
      />
      <TextArea
        label="Note for the builder"
        optional
        rows={2}
        error={errors.note?.message}
        {...form.register('note')}
      />
    </FormDialog>
  );
}
