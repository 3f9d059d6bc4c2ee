// The deduction schedule: what is taken off a deposit for each fault, line by line, as buyers will read it.
import { Plus, Trash2 } from 'lucide-react';
import { useState } from 'react';
import { useFieldArray, useWatch, type UseFormReturn } from 'react-hook-form';
import type { z } from 'zod';
import type { SellerTerms, sellerTerms } from '../../../shared/accounts/seller-contract';
import { Button } from '../../ui/button';
import { MoneyField } from '../../ui/form/money-field';
import { Select } from '../../ui/form/select';
import { TextInput } from '../../ui/form/text-input';
import { KNOWN_FAULTS } from './known-faults';

export type TermsFormState = UseFormReturn<z.input<typeof sellerTerms>, unknown, SellerTerms>;

const OWN_WORDS = 'own';

/** A line in the seller's own words needs a code that no checklist uses. */
const ownCode = (): string => `own_${crypto.randomUUID().slice(0, 8)}`;

const isOwn = (code: string): boolean => code.startsWith('own_');

function AddLine({
  form,
  onAdd,
}: {
  readonly form: TermsFormState;
  readonly onAdd: (line: SellerTerms['schedule'][number]) => void;
}) {
  const schedule = useWatch({ control: form.control, name: 'schedule' });
  const [choice, setChoice] = useState(OWN_WORDS);
  const taken = new Set(schedule.map((line) => line.code));
  const open = KNOWN_FAULTS.filter((fault) => !taken.has(fault.code));
  const chosen = open.find((fault) => fault.code === choice);
  return (
    <div className="grid items-end gap-14 tablet:grid-cols-[minmax(0,1fr)_auto]">
      <Select
        label="Another fault"
        value={chosen?.code ?? OWN_WORDS}
        options={[
          ...open.map((fault) => ({ value: fault.code, label: fault.label })),
          { value: OWN_WORDS, label: 'In your own words' },
        ]}
        onChange={(event) => setChoice(event.target.value)}
      />
      <Button
        icon={Plus}
        onClick={() => {
          onAdd(chosen ? { ...chosen, cents: 0 } : { code: ownCode(), label: '', cents: 0 });
          setChoice(OWN_WORDS);
        }}
      >
        Add the line
      </Button>
    </div>
  );
}

export function ScheduleEditor({ form }: { readonly form: TermsFormState }) {
  const { fields, append, remove } = useFieldArray({
    control: form.control,
    name: 'schedule',
    keyName: 'key',
  });
  const { errors } = form.formState;
  return (
    <div className="grid gap-18">
      <ol className="grid gap-14">
        {fields.map((line, index) => (
          <li
            key={line.key}
            className="grid items-start gap-x-14 gap-y-8 border-b border-line pb-14 tablet:grid-cols-[minmax(0,1fr)_180px_auto]"
          >
            <TextInput
              label="Fault"
              readOnly={!isOwn(line.code)}
              error={errors.schedule?.[index]?.label?.message ?? errors.schedule?.[index]?.code?.message}
              {...form.register(`schedule.${index}.label`)}
            />
            <MoneyField control={form.control} name={`schedule.${index}.cents`} label="Takes off" />
            <Button
              icon={Trash2}
              className="tablet:mt-28"
              aria-label={`Remove ${line.label || 'this line'}`}
              onClick={() => remove(index)}
            >
              Remove
            </Button>
          </li>
        ))}
      </ol>
      {fields.length === 0 && <p>No deduction: every core sends the whole deposit back.</p>}
      <AddLine form={form} onAdd={(line) => append(line)} />
    </div>
  );
}
