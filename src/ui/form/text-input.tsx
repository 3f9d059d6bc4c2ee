// Text, e-mail, password, number: one line. Takes `{...register('name')}` as it is.
import clsx from 'clsx';
import type { ComponentProps } from 'react';
import { Field, type FieldWords } from './field';

type TextInputProps = FieldWords &
  Omit<ComponentProps<'input'>, 'className'> & {
    /** Stamped letters: capitals of one width. */
    readonly code?: boolean;
    readonly fieldClassName?: string;
  };

export function TextInput({
  label,
  hint,
  error,
  optional,
  labelHidden,
  code,
  id,
  fieldClassName,
  ...input
}: TextInputProps) {
  return (
    <Field
      {...{ label, hint, error, optional, labelHidden, id }}
      name={input.name}
      className={fieldClassName}
    >
      {(control) => (
        <input
          type="text"
          {...(code ? { autoCapitalize: 'characters', autoComplete: 'off', spellCheck: false } : {})}
          {...input}
          {...control}
          className={clsx('in', code && 'in-code')}
        />
      )}
    </Field>
  );
}
