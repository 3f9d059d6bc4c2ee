// A money input tied to a form: `<MoneyField control={form.control} name="priceCents" label="Exchange price" />`.
import { useController, type Control, type FieldPathByValue, type FieldValues } from 'react-hook-form';
import type { FieldWords } from './field';
import { MoneyInput } from './money-input';

interface MoneyFieldProps<Values extends FieldValues, Output extends FieldValues> extends Omit<
  FieldWords,
  'error'
> {
  readonly control: Control<Values, unknown, Output>;
  readonly name: FieldPathByValue<Values, number | null | undefined>;
  readonly disabled?: boolean;
}

export function MoneyField<Values extends FieldValues, Output extends FieldValues>(
  props: MoneyFieldProps<Values, Output>,
) {
  const { control, name, ...words } = props;
  const { field, fieldState } = useController({ control, name });
  return <MoneyInput {...words} {...field} error={fieldState.error?.message} />;
}
