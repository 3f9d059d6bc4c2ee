// One of a few, each on a line of its own. Takes `{...register('name')}` as it is, or `value` and `onChange`.
import { useId, type ComponentProps, type ReactNode } from 'react';
import { ErrorMessage, fieldId } from './field';

export interface RadioOption<Value extends string = string> {
  readonly value: Value;
  readonly label: ReactNode;
  readonly count?: number;
}

type RadioGroupProps = Omit<ComponentProps<'input'>, 'className' | 'type' | 'value' | 'defaultValue'> & {
  readonly legend: ReactNode;
  readonly hint?: ReactNode;
  readonly error?: string | undefined;
  readonly options: readonly RadioOption[];
  /** Controlled; leave out with `register`. */
  readonly value?: string | null;
};

export function RadioGroup({ legend, hint, error, options, value, id, name, ...input }: RadioGroupProps) {
  const own = useId();
  const groupId = id ?? (name ? fieldId(name) : own);
  const hintId = `${groupId}-hint`;
  const errorId = `${groupId}-error`;
  const described = [hint ? hintId : '', error ? errorId : ''].filter(Boolean).join(' ');
  return (
    <fieldset className="f" data-field="" aria-describedby={described || undefined}>
      <legend className="f-label" data-field-label="">
        {legend}
      </legend>
      {hint && (
        <span className="f-hint" id={hintId}>
          {hint}
        </span>
      )}
      <div className="ck-list">
        {options.map((option, index) => (
          <label className="ck" key={option.value}>
            <input
              {...input}
              type="radio"
              name={name ?? own}
              id={index === 0 ? groupId : undefined}
              value={option.value}
              {...(value === undefined ? {} : { checked: value === option.value })}
            />
            <span>{option.label}</span>
            {option.count !== undefined && <span className="ck-count">{option.count}</span>}
          </label>
        ))}
      </div>
      {error && <ErrorMessage id={errorId}>{error}</ErrorMessage>}
    </fieldset>
  );
}
