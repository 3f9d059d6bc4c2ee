// The kit's forms: every control with its hint and its error, and a form that is refused.
import { useState } from 'react';
import { z } from 'zod';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/form/checkbox';
import { CodeInput } from '../../ui/form/code-input';
import { Form, useZodForm } from '../../ui/form/form';
import { MoneyField } from '../../ui/form/money-field';
import { RadioGroup } from '../../ui/form/radio-group';
import { Select } from '../../ui/form/select';
import { TextArea } from '../../ui/form/text-area';
import { TextInput } from '../../ui/form/text-input';
import { YesNo, type YesNoAnswer } from '../../ui/form/yes-no';
import { Tabs } from '../../ui/tabs';
import { PhotoButton } from '../../ui/form/photo-button';
import { sayDone, sayStop } from '../../ui/notices';
import { Section, Sheet } from '../../ui/sheet';

const schema = z
  .object({
    email: z.email('Type an address, such as ines@abara.example'),
    priceCents: z.number('Type a price, such as 1450.00'),
    depositCents: z.number('Type a deposit, such as 600.00'),
    kind: z.string().min(1, 'Choose a kind'),
    terms: z.string().nullable(),
    notes: z.string(),
    read: z.literal(true, 'Read the cautions first'),
  })
  .refine((value) => value.depositCents < value.priceCents, {
    path: ['depositCents'],
    message: 'Make it less than the price',
  });

const START = {
  email: '',
  priceCents: 145_000,
  depositCents: 190_000,
  kind: '',
  terms: 'exchange',
  notes: '',
};

function Listing() {
  const form = useZodForm(schema, START);
  const { errors } = form.formState;
  return (
    <Form form={form} stops="this listing" onSubmit={() => sayDone('Listing saved')}>
      <TextInput label="Email" type="email" error={errors.email?.message} {...form.register('email')} />
      <MoneyField
        control={form.control}
        name="priceCents"
        label="Exchange price"
        hint="What you get when the builder checks the unit"
      />
      <MoneyField control={form.control} name="depositCents" label="Core deposit" />
      <Select
        label="Kind"
        placeholder="Choose a kind"
        options={[
          { value: 'automatic', label: 'Automatic' },
          { value: 'manual', label: 'Manual' },
        ]}
        error={errors.kind?.message}
        {...form.register('kind')}
      />
      <RadioGroup
        legend="How you sell"
        options={[
          { value: 'exchange', label: 'Exchange, with deposit', count: 23 },
          { value: 'outright', label: 'Outright, they keep their core', count: 14 },
        ]}
        {...form.register('terms')}
      />
      <TextArea label="Notes" optional hint="Eight words stand on the tag" {...form.register('notes')} />
      <Checkbox label="I read the cautions" error={errors.read?.message} {...form.register('read')} />
      <Button type="submit" look="go" size="big">
        List it for $1,450.00
      </Button>
    </Form>
  );
}

function Loose() {
  const [code, setCode] = useState('K66A4XD90');
  const [tab, setTab] = useState('code');
  const [pan, setPan] = useState<YesNoAnswer | null>('no');
  const [bell, setBell] = useState<YesNoAnswer | null>('yes');
  return (
    <div className="grid content-start gap-20">
      <CodeInput
        label="Type what is stamped on the case"
        value={code}
        onChange={setCode}
        groups={[4, 2, 2, 5, 2]}
        doubtful={[8]}
        readBack="Reads so far: Keld 66A six-speed automatic, four-wheel-drive output, D9 bellhousing."
      />
      <TextInput label="Tag number" code placeholder="66A-2207" hint="It is on the wire tag" />
      <TextInput label="Cannot be changed" defaultValue="Quenby" disabled />
      <YesNo legend="All nine bell ears whole" legendShown value={bell} onChange={setBell} />
      <YesNo legend="Pan on" legendShown value={pan} onChange={setPan} noCostsCents={4_000} />
      <div className="panel">
        <Tabs
          label="How to find a core"
          value={tab}
          onChange={setTab}
          tabs={[
            { value: 'code', label: 'Case code', content: <p className="p-20">By what is stamped</p> },
            { value: 'rig', label: 'My vehicle', content: <p className="p-20">By the vehicle</p> },
          ]}
        />
      </div>
      <PhotoButton onFiles={(files) => sayDone(`${files.length} photo taken`)}>
        Shoot 3, bell face
      </PhotoButton>
      <div className="flex flex-wrap gap-10">
        <Button onClick={() => sayDone('Shot 3 is up')}>Say done</Button>
        <Button onClick={() => sayStop('Not sent. No signal')}>Say stopped</Button>
      </div>
    </div>
  );
}

export function KitForms() {
  return (
    <Section title="Fields and errors" note="Press the red button to see it refused">
      <div className="grid gap-28 desk:grid-cols-2">
        <Sheet pad>
          <Listing />
        </Sheet>
        <Loose />
      </div>
    </Section>
  );
}
