// A box to tick, with its words as the target. Takes `{...register('name')}` as it is.
import { useId, type ComponentProps, type ReactNode } from 'react';
import { ErrorMessage, fieldId } from './field';

type CheckboxProps = Omit<ComponentProps<'input'>, 'className' | 'type'> & {
  readonly label: ReactNode;
  /** How many there are, for filters. */
  readonly count?: number;
  readonly error?: string | undefined;
};

export function Checkbox({ label, count, error, id, ...input }: CheckboxProps) {
  const own = useId();
  const controlId = id ?? (input.name ? fieldId(input.name) : own);
  const errorId = `${controlId}-error`;
  return (
    <div className="grid gap-6" data-field="">
      <label className="ck">
        <input
          {...input}
          type="checkbox"
          id={controlId}
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? errorId : undefined}
        />
        <span data-field-label="">{label}</span>
        {count !== undefined && <span className="ck-count">{count}</span>}
      </label>
      {error && <ErrorMessage id={errorId}>{error}</ErrorMessage>}
    </div>
  );
}
