// A field: label above, control, hint, and the error as a black block. Every control of a form is built on it.
import { OctagonX } from 'lucide-react';
import { useId, type ReactNode } from 'react';
import { Icon } from '../icon';

/** The id of a field by its name, so that an error summary and a problem's `path` find it. */
export const fieldId = (name: string): string => `field-${name}`;

export interface FieldWords {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  /** What to do about it: "Type a price, such as 1450.00". */
  readonly error?: string | undefined;
  /** Writes "if you like" behind the label. */
  readonly optional?: boolean;
  /** The label is for a reader only. */
  readonly labelHidden?: boolean;
}

/** To spread onto the control. */
export interface ControlProps {
  readonly id: string;
  readonly 'aria-describedby': string | undefined;
  readonly 'aria-invalid': true | undefined;
}

interface FieldProps extends FieldWords {
  readonly name?: string | undefined;
  readonly id?: string | undefined;
  readonly className?: string | undefined;
  readonly children: (control: ControlProps) => ReactNode;
}

export function ErrorMessage({ id, children }: { readonly id: string; readonly children: string }) {
  return (
    <span className="f-message" id={id}>
      <Icon of={OctagonX} />
      {children}
    </span>
  );
}

export function Field({
  label,
  hint,
  error,
  optional,
  labelHidden,
  name,
  id,
  className,
  children,
}: FieldProps) {
  const own = useId();
  const controlId = id ?? (name ? fieldId(name) : own);
  const hintId = `${controlId}-hint`;
  const errorId = `${controlId}-error`;
  const described = [hint ? hintId : '', error ? errorId : ''].filter(Boolean).join(' ');
  return (
    <div className={className ? `f ${className}` : 'f'} data-field="">
      <label className={labelHidden ? 'vh' : 'f-label'} htmlFor={controlId}>
        <span data-field-label="">{label}</span>
        {optional && <span className="f-optional"> if you like</span>}
      </label>
      {children({
        id: controlId,
        'aria-describedby': described || undefined,
        'aria-invalid': error ? true : undefined,
      })}
      {hint && (
        <span className="f-hint" id={hintId}>
          {hint}
        </span>
      )}
      {error && <ErrorMessage id={errorId}>{error}</ErrorMessage>}
    </div>
  );
}
