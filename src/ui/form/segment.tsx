// A segmented control: one of two to four, side by side; real radios, so the arrow keys move between them.
import clsx from 'clsx';
import { useId, type ReactNode } from 'react';
import { ErrorMessage, fieldId } from './field';

export interface SegmentOption<Value extends string> {
  readonly value: Value;
  readonly label: ReactNode;
  /** Small words under the label: the amount this choice costs. */
  readonly note?: ReactNode;
  /** Amber when chosen: this answer takes money off. */
  readonly costs?: boolean;
}

interface SegmentProps<Value extends string> {
  readonly legend: string;
  readonly legendShown?: boolean;
  readonly options: readonly SegmentOption<Value>[];
  readonly value: Value | null;
  readonly onChange: (value: Value) => void;
  readonly name?: string;
  readonly error?: string | undefined;
  /** 56 px high and larger words, for the dock. */
  readonly yard?: boolean;
  /** 44 px high, for tools. */
  readonly tight?: boolean;
  readonly disabled?: boolean;
}

export function Segment<Value extends string>(props: SegmentProps<Value>) {
  const { legend, legendShown = false, options, value, onChange, name, error, yard, tight, disabled } = props;
  const own = useId();
  const groupName = name ?? own;
  const firstId = name ? fieldId(name) : own;
  const errorId = `${firstId}-error`;
  return (
    <fieldset className="f" data-field="" aria-describedby={error ? errorId : undefined} disabled={disabled}>
      <legend className={legendShown ? 'f-label mb-6' : 'vh'} data-field-label="">
        {legend}
      </legend>
      <div className={clsx('seg', yard && 'seg-yard', tight && 'seg-tight')}>
        {options.map((option, index) => (
          <label key={option.value} className={clsx(option.costs && 'seg-costs')}>
            <input
              type="radio"
              name={groupName}
              id={index === 0 ? firstId : undefined}
              value={option.value}
              checked={value === option.value}
              onChange={() => onChange(option.value)}
            />
            <span>
              {option.label}
              {option.note && <span className="seg-note">{option.note}</span>}
            </span>
          </label>
        ))}
      </div>
      {error && <ErrorMessage id={errorId}>{error}</ErrorMessage>}
    </fieldset>
  );
}
