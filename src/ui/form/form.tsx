// A form with its error summary: checks by the contract's schema first, then asks the server, and shows what either says.
import { zodResolver } from '@hookform/resolvers/zod';
import type { ReactNode } from 'react';
import { useForm, type DefaultValues, type FieldValues, type UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import { ErrorSummary } from './error-summary';
import { listErrors, showProblem } from './form-problems';

/** A form whose values are checked by a zod schema (the contract's own, where there is one). */
export function useZodForm<Input extends FieldValues, Output>(
  schema: z.ZodType<Output, Input>,
  defaultValues: DefaultValues<Input>,
): UseFormReturn<Input, unknown, Output> {
  // The summary takes focus, so the first wrong field must not.
  return useForm({
    resolver: zodResolver(schema),
    defaultValues,
    shouldFocusError: false,
    mode: 'onTouched',
  });
}

interface FormProps<Input extends FieldValues, Output> {
  readonly form: UseFormReturn<Input, unknown, Output>;
  /** May throw what the client throws; the form shows it. */
  readonly onSubmit: (values: Output) => Promise<void> | void;
  /** What the errors stop: "this listing". */
  readonly stops: string;
  readonly label?: string;
  readonly className?: string;
  readonly children: ReactNode;
}

export function Form<Input extends FieldValues, Output>(props: FormProps<Input, Output>) {
  const { form, onSubmit, stops, label, className = 'grid gap-20', children } = props;
  const { errors, submitCount } = form.formState;
  const submit = form.handleSubmit(async (values) => {
    try {
      await onSubmit(values);
    } catch (error) {
      showProblem(form, error);
    }
  });
  return (
    <form className={className} aria-label={label} noValidate onSubmit={(event) => void submit(event)}>
      <ErrorSummary
        errors={submitCount > 0 ? listErrors(errors) : []}
        stops={stops}
        refusal={errors.root?.refusal?.message}
        attempt={submitCount}
      />
      {children}
    </form>
  );
}
