// What a member may do: one box for each duty, with what it covers.
import type { UseFormRegisterReturn } from 'react-hook-form';
import { DUTIES } from '../../../shared/accounts/actor';
import { Checkbox } from '../../ui/form/checkbox';
import { ErrorMessage, fieldId } from '../../ui/form/field';
import { DUTY_WORDS } from '../words';

interface DutiesFieldProps {
  readonly registered: UseFormRegisterReturn;
  readonly error?: string | undefined;
}

export function DutiesField({ registered, error }: DutiesFieldProps) {
  const first = fieldId(registered.name);
  const errorId = `${first}-error`;
  return (
    <fieldset className="f" data-field="" aria-describedby={error ? errorId : undefined}>
      <legend className="f-label" data-field-label="">
        Duties
      </legend>
      <div className="ck-list">
        {DUTIES.map((duty, index) => (
          <Checkbox
            key={duty}
            id={index === 0 ? first : `${first}-${duty}`}
            value={duty}
            label={
              <>
                <b className="b">{DUTY_WORDS[duty].name}</b> {DUTY_WORDS[duty].does}
              </>
            }
            {...registered}
          />
        ))}
      </div>
      {error && <ErrorMessage id={errorId}>{error}</ErrorMessage>}
    </fieldset>
  );
}
