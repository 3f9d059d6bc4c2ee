// From the server's refusal to the form: a 422 problem's `errors` land on their fields, anything else stands over the form.
import type { FieldValues, Path, UseFormReturn } from 'react-hook-form';
import type { FieldError } from '../../../shared/kernel/problem';
import { ProblemError } from '../../http/client';
import { errorWords } from '../error-state';

/** Where a refusal that belongs to no field is kept. */
export const REFUSAL = 'root.refusal';

/** All messages of a form's errors with their dotted paths, in the order of the form's values. */
export function listErrors(errors: object, prefix = ''): FieldError[] {
  return Object.entries(errors).flatMap(([key, value]: [string, unknown]): FieldError[] => {
    if (typeof value !== 'object' || value === null || key === 'root' || value instanceof Element) return [];
    const path = prefix + key;
    // A leaf says what kind of fault it is; anything else is a group of fields.
    if (!('type' in value)) return listErrors(value, `${path}.`);
    const message = 'message' in value && typeof value.message === 'string' ? value.message : '';
    return [{ path, message: message || 'Check this' }];
  });
}

function hasField(values: unknown, path: string): boolean {
  let at: unknown = values;
  for (const key of path.split('.')) {
    if (typeof at !== 'object' || at === null || !(key in at)) return false;
    at = Object.entries(at).find(([name]) => name === key)?.[1];
  }
  return true;
}

const isPathOf = <Values extends FieldValues>(path: string, values: Values): path is Path<Values> =>
  hasField(values, path);

/**
 * Puts an error on the form. Messages for fields the form doesn't have are joined into the refusal over it, so that
 * nothing the server said is lost.
 */
export function showProblem<Values extends FieldValues, Context, Output>(
  form: UseFormReturn<Values, Context, Output>,
  error: unknown,
): void {
  const errors = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
  const values = form.getValues();
  const homeless: string[] = [];
  for (const { path, message } of errors) {
    if (isPathOf(path, values)) form.setError(path, { type: 'server', message });
    else homeless.push(message);
  }
  if (errors.length === 0) {
    const { title, detail } = errorWords(error);
    form.setError(REFUSAL, { type: 'server', message: `${title}. ${detail}` });
  } else if (homeless.length > 0) {
    form.setError(REFUSAL, { type: 'server', message: homeless.join('. ') });
  }
}
