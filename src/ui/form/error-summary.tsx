// The black block at the top of a form: counts what stops it, takes focus, and links to each field.
import { useEffect, useRef, type MouseEvent } from 'react';
import type { FieldError } from '../../../shared/kernel/problem';
import { fieldId } from './field';

interface ErrorSummaryProps {
  readonly errors: readonly FieldError[];
  /** "this listing": "2 things stop this listing". */
  readonly stops: string;
  /** Something that belongs to no field: the refusal of the whole. */
  readonly refusal?: string | undefined;
  /** Changes with each try, so that focus comes back each time: the form's `submitCount`. */
  readonly attempt: number;
}

const COUNTS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six'];

function title(count: number, stops: string): string {
  return `${COUNTS[count] ?? count} ${count === 1 ? 'thing stops' : 'things stop'} ${stops}`;
}

/** The field's own words, so that "Type something here" says where. */
function labelOf(path: string): string {
  const field = document.getElementById(fieldId(path))?.closest('[data-field]');
  return field?.querySelector('[data-field-label]')?.textContent?.trim() ?? '';
}

function goTo(event: MouseEvent, path: string): void {
  const control = document.getElementById(fieldId(path));
  if (!control) return;
  event.preventDefault();
  control.focus();
  control.scrollIntoView({ block: 'center' });
}

export function ErrorSummary({ errors, stops, refusal, attempt }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const shown = errors.length > 0 || refusal !== undefined;
  useEffect(() => {
    if (shown) box.current?.focus();
  }, [shown, attempt]);
  if (!shown) return null;
  return (
    <div className="stopbox" role="alert" tabIndex={-1} ref={box}>
      <span className="stopbox-title">{errors.length > 0 ? title(errors.length, stops) : refusal}</span>
      {errors.length > 0 && refusal && <p>{refusal}</p>}
      {errors.length > 0 && (
        <ul>
          {errors.map(({ path, message }) => {
            const label = labelOf(path);
            return (
              <li key={path}>
                <a href={`#${fieldId(path)}`} onClick={(event) => goTo(event, path)}>
                  {label ? `${label}: ${message}` : message}
                </a>
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
}
