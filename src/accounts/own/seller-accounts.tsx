// The seller accounts somebody works for, and opening one of their own.
import { useState } from 'react';
import { openSeller } from '../../../shared/accounts/seller-contract';
import { sellerIdentity } from '../../../shared/accounts/fields';
import type { z } from 'zod';
import { useQueryClient } from '@tanstack/react-query';
import { call } from '../../http/client';
import { Button } from '../../ui/button';
import { DataTable, type Column } from '../../ui/data-table';
import { Form, useZodForm } from '../../ui/form/form';
import { sayDone } from '../../ui/notices';
import { meQuery, type SignedIn } from '../session';
import { SellerFields } from '../sign/seller-fields';
import { DUTY_WORDS, KIND_WORDS } from '../words';

type Own = SignedIn['sellers'][number];

const COLUMNS: readonly Column<Own>[] = [
  { head: 'Seller account', phone: 'name', cell: (one) => one.name },
  { head: 'Kind', cell: (one) => KIND_WORDS[one.kind] },
  {
    head: 'Your duties',
    phone: 'labelled',
    cell: (one) => one.duties.map((duty) => DUTY_WORDS[duty].name).join(', '),
  },
];

function OpenSellerForm({ onDone }: { readonly onDone: () => void }) {
  const form = useZodForm(sellerIdentity, { name: '', kind: 'yard', zip: '' });
  const client = useQueryClient();
  const [key] = useState(() => crypto.randomUUID());
  const { errors, isSubmitting } = form.formState;
  async function submit(body: z.output<typeof sellerIdentity>) {
    const seller = await call(openSeller, { body, idempotencyKey: key });
    await client.invalidateQueries({ queryKey: meQuery.queryKey });
    sayDone(`${seller.name} is open`);
    onDone();
  }
  return (
    <Form form={form} onSubmit={submit} stops="the seller account" label="Open a seller account">
      <SellerFields
        registered={{ name: form.register('name'), kind: form.register('kind'), zip: form.register('zip') }}
        errors={{
          name: errors.name?.message,
          kind: errors.kind?.message,
          zip: errors.zip?.message,
        }}
      />
      <div className="flex flex-wrap gap-14">
        <Button type="submit" busy={isSubmitting} busyWords="Opening it">
          Open the seller account
        </Button>
        <Button onClick={onDone}>Go back</Button>
      </div>
    </Form>
  );
}

export function SellerAccounts({ user }: { readonly user: SignedIn }) {
  const [opening, setOpening] = useState(false);
  return (
    <div className="grid gap-20">
      {user.sellers.length > 0 ? (
        <DataTable
          caption="Seller accounts you work for"
          columns={COLUMNS}
          rows={user.sellers}
          rowKey={(one) => one.id}
        />
      ) : (
        <p>You buy only. Open a seller account to put units on offer, your old one among them.</p>
      )}
      {opening ? (
        <OpenSellerForm onDone={() => setOpening(false)} />
      ) : (
        <div>
          <Button onClick={() => setOpening(true)}>Open a seller account</Button>
        </div>
      )}
    </div>
  );
}
