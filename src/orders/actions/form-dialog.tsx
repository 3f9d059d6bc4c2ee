// A dialog with the form of one action: cautions first, then fields, then the button that says what it does.
import type { ReactNode } from 'react';
import type { FieldValues, UseFormReturn } from 'react-hook-form';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Form } from '../../ui/form/form';
import { hasMovedOn } from '../api';
import { Cautions } from '../cautions';

interface FormDialogProps<Input extends FieldValues, Output> {
  readonly onClose: () => void;
  readonly title: string;
  readonly description?: string;
  readonly cautions?: readonly string[];
  readonly form: UseFormReturn<Input, unknown, Output>;
  readonly onSubmit: (values: Output) => Promise<unknown>;
  /** What the errors stop: "the packing". */
  readonly stops: string;
  readonly submitWords: string;
  readonly children?: ReactNode;
}

export function FormDialog<Input extends FieldValues, Output>(props: FormDialogProps<Input, Output>) {
  const { onClose, title, description, cautions = [], form, onSubmit, stops, submitWords, children } = props;
  async function submit(values: Output) {
    try {
      await onSubmit(values);
      onClose();
    } catch (error) {
      // The page says that the order moved on, and the form of a step that is past is of no use.
      if (hasMovedOn(error)) onClose();
      else throw error;
    }
  }
  return (
    <Dialog open onClose={onClose} title={title} {...(description ? { description } : {})}>
      <Form form={form} onSubmit={submit} stops={stops}>
        <Cautions lines={cautions} />
        {children}
        <div className="dialog-actions">
          <Button
            type="submit"
            look="go"
            size="big"
            busy={form.formState.isSubmitting}
            busyWords="Sending it"
          >
            {submitWords}
          </Button>
          <Button size="big" onClick={onClose}>
            Go back
          </Button>
        </div>
      </Form>
    </Dialog>
  );
}
