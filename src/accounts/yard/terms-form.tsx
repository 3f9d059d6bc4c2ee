// The terms that new listings start from. What is on offer already keeps the terms it was listed with.
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { putTerms, sellerTerms, type SellerTerms } from '../../../shared/accounts/seller-contract';
import { call } from '../../http/client';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/form/checkbox';
import { Form, useZodForm } from '../../ui/form/form';
import { MoneyField } from '../../ui/form/money-field';
import { RadioGroup } from '../../ui/form/radio-group';
import { TextInput } from '../../ui/form/text-input';
import { sayDone } from '../../ui/notices';
import { Section } from '../../ui/sheet';
import { termsQuery } from '../api';
import { GradePreview } from './grade-preview';
import { ScheduleEditor, type TermsFormState } from './schedule-editor';

const FIRST_DEPOSIT_CENTS = 40_000;

const FREIGHT = [
  { value: 'seller', label: 'We pay the core’s way back' },
  { value: 'builder', label: 'The builder pays the core’s way back' },
] as const;

type DaysName = 'windowDays' | 'shipDays' | 'graceDays';

function DaysField({
  form,
  name,
  label,
  hint,
}: {
  readonly form: TermsFormState;
  readonly name: DaysName;
  readonly label: string;
  readonly hint: string;
}) {
  return (
    <TextInput
      label={label}
      hint={hint}
      type="number"
      inputMode="numeric"
      min={0}
      error={form.formState.errors[name]?.message}
      {...form.register(name, { valueAsNumber: true })}
    />
  );
}

function Exchange({ form }: { readonly form: TermsFormState }) {
  return (
    <>
      <div className="grid gap-20 tablet:grid-cols-2">
        <MoneyField
          control={form.control}
          name="depositCents"
          label="Core deposit"
          hint="Held until the old unit is graded"
        />
        <DaysField
          form={form}
          name="windowDays"
          label="Return window, days"
          hint="From delivery to the day the old unit is sent"
        />
      </div>
      <RadioGroup
        legend="Return freight"
        options={FREIGHT}
        error={form.formState.errors.returnFreight?.message}
        {...form.register('returnFreight')}
      />
      <Section
        title="Deductions"
        level={3}
        note="Both sides see them before anything is paid. Nothing else is ever taken off."
      >
        <ScheduleEditor form={form} />
      </Section>
      <Section title="What comes back at each grade" level={3}>
        <GradePreview form={form} />
      </Section>
    </>
  );
}

export function TermsForm({ sellerId, terms }: { readonly sellerId: string; readonly terms: SellerTerms }) {
  const form = useZodForm(sellerTerms, { ...terms, schedule: [...terms.schedule] });
  const client = useQueryClient();
  const { errors, isSubmitting } = form.formState;
  // Kept apart from the amount: a field that is empty for a moment must not take the exchange away.
  const [exchange, setExchange] = useState(terms.depositCents !== null);
  function sellForExchange(on: boolean) {
    setExchange(on);
    form.setValue('depositCents', on ? (terms.depositCents ?? FIRST_DEPOSIT_CENTS) : null);
  }
  async function submit(body: SellerTerms) {
    if (exchange && body.depositCents === null) {
      form.setError('depositCents', { type: 'missing', message: 'Type a deposit, such as 400.00' });
      return;
    }
    const seller = await call(putTerms, { params: { id: sellerId }, body });
    if (seller.terms) {
      client.setQueryData(termsQuery(sellerId).queryKey, seller.terms);
      form.reset(seller.terms);
    }
    sayDone('Terms saved for new listings');
  }
  return (
    <Form form={form} onSubmit={submit} stops="these terms" label="Terms" className="grid max-w-read gap-20">
      <Checkbox
        label="We sell for exchange, with a core deposit"
        checked={exchange}
        onChange={(event) => sellForExchange(event.target.checked)}
      />
      <Checkbox
        label="We sell outright: the buyer keeps the old unit"
        error={errors.outright?.message}
        {...form.register('outright')}
      />
      {exchange && <Exchange form={form} />}
      <div className="grid gap-20 tablet:grid-cols-2">
        <DaysField
          form={form}
          name="shipDays"
          label="Ship within, business days"
          hint="From payment to the carrier’s pickup"
        />
        <DaysField
          form={form}
          name="graceDays"
          label="Days after that before the sale is undone"
          hint="Then everything goes back to the builder"
        />
      </div>
      <div>
        <Button type="submit" look="go" size="big" busy={isSubmitting} busyWords="Saving the terms">
          Save the terms
        </Button>
      </div>
    </Form>
  );
}
