// Several lines. Takes `{...register('name')}` as it is.
import type { ComponentProps } from 'react';
import { Field, type FieldWords } from './field';

type TextAreaProps = FieldWords & Omit<ComponentProps<'textarea'>, 'className'>;

export function TextArea({
  label,
  hint,
  error,
  optional,
  labelHidden,
  id,
  rows = 4,
  ...input
}: TextAreaProps) {
  return (
    <Field {...{ label, hint, error, optional, labelHidden, id }} name={input.name}>
      {(control) => <textarea rows={rows} {...input} {...control} className="in" />}
    </Field>
  );
}
