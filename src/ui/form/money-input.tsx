// Dollars as a person types them, whole cents to the form: "1450", "1,450.5" and "$1,450.00" are all 145000 or so.
import { useState, type FocusEvent, type Ref } from 'react';
import { formatCents, parseDollars, type Cents } from '../../../shared/kernel/money';
import { Field, type FieldWords } from './field';

export interface MoneyInputProps extends FieldWords {
  /** Whole cents; `null` is an empty field or one that is no amount. */
  readonly value: Cents | null | undefined;
  readonly onChange: (cents: Cents | null) => void;
  readonly onBlur?: () => void;
  readonly name?: string;
  readonly id?: string;
  readonly ref?: Ref<HTMLInputElement>;
  /** 24 px figures, right aligned: for sums that are being split. */
  readonly big?: boolean;
  readonly disabled?: boolean;
}

/** "1,450.00", without the sign that stands in front of the field. */
const written = (cents: Cents | null | undefined): string =>
  cents === null || cents === undefined ? '' : formatCents(cents).replace('$', '');

const NOT_AN_AMOUNT = 'Type an amount, such as 1450.00';

export function MoneyInput(props: MoneyInputProps) {
  const { value, onChange, onBlur, name, id, ref, big = false, disabled, error, ...words } = props;
  // What is being typed; null while nobody types, and then the value itself is shown.
  const [draft, setDraft] = useState<string | null>(null);
  const [unreadable, setUnreadable] = useState<string | null>(null);
  // A value from elsewhere (a reset, the linked field) wins over words that are no amount.
  const broken = unreadable !== null && (value === null || value === undefined);
  const shown = draft ?? (broken ? unreadable : written(value));

  function type(text: string) {
    setDraft(text);
    onChange(parseDollars(text));
  }
  function leave() {
    const text = draft?.trim() ?? '';
    if (draft !== null) setUnreadable(text !== '' && parseDollars(text) === null ? text : null);
    setDraft(null);
    onBlur?.();
  }
  return (
    <Field
      {...words}
      name={name}
      id={id}
      error={error ?? (broken && draft === null ? NOT_AN_AMOUNT : undefined)}
    >
      {(control) => (
        <span className={big ? 'in-money in-money-big' : 'in-money'}>
          <span aria-hidden="true">$</span>
          <input
            {...control}
            ref={ref}
            name={name}
            disabled={disabled}
            className="in"
            type="text"
            inputMode="decimal"
            autoComplete="off"
            value={shown}
            onChange={(event) => type(event.target.value)}
            onFocus={(event: FocusEvent<HTMLInputElement>) => event.target.select()}
            onBlur={leave}
          />
        </span>
      )}
    </Field>
  );
}
