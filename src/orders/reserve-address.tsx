// The address of an order, with the ZIP code first: the freight quote hangs on it.
import type { UseFormReturn } from 'react-hook-form';
import { z } from 'zod';
import { id, zip as zipField } from '../../shared/kernel/fields';
import { delivery } from '../../shared/orders/contract';
import { TextInput } from '../ui/form/text-input';

/** The reserve endpoint's own body. */
export const reserveBody = z.strictObject({
  listingId: id,
  terms: z.enum(['exchange', 'outright']),
  delivery,
});
export type ReserveInput = z.input<typeof reserveBody>;

interface AddressFieldsProps {
  readonly form: UseFormReturn<ReserveInput, unknown, z.output<typeof reserveBody>>;
  readonly method: 'freight' | 'pickup';
  readonly sellerPlace: string;
  readonly onZip: (zip: string) => void;
}

export function AddressFields({ form, method, sellerPlace, onZip }: AddressFieldsProps) {
  const errors = form.formState.errors.delivery;
  const zip = form.register('delivery.zip', {
    onChange: (event: { readonly target: { readonly value: string } }) => {
      if (zipField.safeParse(event.target.value).success) onZip(event.target.value);
    },
  });
  return (
    <div className="grid gap-14">
      {method === 'pickup' && (
        <p className="sm">
          Collect it in {sellerPlace}. Bring a hoist or two people and a truck that may carry it; the yard
          hands it over against your pickup code.
        </p>
      )}
      <TextInput
        label={method === 'freight' ? 'ZIP code it goes to' : 'Your ZIP code'}
        inputMode="numeric"
        autoComplete="postal-code"
        maxLength={5}
        error={errors?.zip?.message}
        {...zip}
      />
      <TextInput
        label="Name or shop"
        autoComplete="name"
        error={errors?.name?.message}
        {...form.register('delivery.name')}
      />
      <TextInput
        label="Street and number"
        hint={method === 'freight' ? 'With a dock or a forklift where there is one' : undefined}
        autoComplete="address-line1"
        error={errors?.line1?.message}
        {...form.register('delivery.line1')}
      />
      <div className="grid gap-14 grid-cols-[minmax(0,1fr)_6rem]">
        <TextInput
          label="City"
          autoComplete="address-level2"
          error={errors?.city?.message}
          {...form.register('delivery.city')}
        />
        <TextInput
          label="State"
          autoComplete="address-level1"
          error={errors?.region?.message}
          {...form.register('delivery.region')}
        />
      </div>
    </div>
  );
}
