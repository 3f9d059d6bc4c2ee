// One of many, in the browser's own list. Takes `{...register('name')}` as it is.
import type { ComponentProps } from 'react';
import { Field, type FieldWords } from './field';

export interface Option<Value extends string = string> {
  readonly value: Value;
  readonly label: string;
}

type SelectProps = FieldWords &
  Omit<ComponentProps<'select'>, 'className' | 'children'> & {
    readonly options: readonly Option[];
    /** A first line that stands for no choice yet: "Choose a kind". */
    readonly placeholder?: string;
  };

export function Select({
  label,
  hint,
  error,
  optional,
  labelHidden,
  id,
  options,
  placeholder,
  ...input
}: SelectProps) {
  return (
    <Field {...{ label, hint, error, optional, labelHidden, id }} name={input.name}>
      {(control) => (
        <select {...input} {...control} className="in">
          {placeholder !== undefined && <option value="">{placeholder}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}
