// What a seller account is called, what it is, and where it stands.
import type { UseFormRegisterReturn } from 'react-hook-form';
import { RadioGroup } from '../../ui/form/radio-group';
import { TextInput } from '../../ui/form/text-input';
import { KIND_OPTIONS } from '../words';

type Registered = Readonly<Record<'name' | 'kind' | 'zip', UseFormRegisterReturn>>;
type Messages = Readonly<Partial<Record<'name' | 'kind' | 'zip', string | undefined>>>;

export function SellerFields({
  registered,
  errors,
}: {
  readonly registered: Registered;
  readonly errors: Messages;
}) {
  return (
    <>
      <TextInput
        label="Name of the yard or shop"
        autoComplete="organization"
        hint="Buyers see it on each unit"
        error={errors.name}
        {...registered.name}
      />
      <RadioGroup legend="What it is" options={KIND_OPTIONS} error={errors.kind} {...registered.kind} />
      <TextInput
        label="ZIP code"
        inputMode="numeric"
        autoComplete="postal-code"
        maxLength={5}
        hint="Where units are picked up. Deadlines end at midnight there."
        error={errors.zip}
        {...registered.zip}
      />
    </>
  );
}
