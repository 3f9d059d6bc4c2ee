// A new account; with a seller account in the same step for whoever has units to sell.
import { useNavigate } from 'react-router-dom';
import type { z } from 'zod';
import { signUp, signUpBody } from '../../../shared/accounts/contract';
import { call } from '../../http/client';
import { paths } from '../../paths';
import { Button } from '../../ui/button';
import { Checkbox } from '../../ui/form/checkbox';
import { Form, useZodForm } from '../../ui/form/form';
import { TextInput } from '../../ui/form/text-input';
import { useTakeSession } from '../session';
import { PasswordField } from './password-field';
import { SellerFields } from './seller-fields';

const NO_SELLER = { name: '', kind: 'yard', zip: '' } as const;

export function SignUpForm({ next }: { readonly next: string | null }) {
  const form = useZodForm(signUpBody, { name: '', email: '', password: '' });
  const take = useTakeSession();
  const navigate = useNavigate();
  const { errors, isSubmitting } = form.formState;
  const sells = form.watch('seller') !== undefined;
  async function submit(body: z.output<typeof signUpBody>) {
    const me = await call(signUp, { body });
    await navigate(paths.checkMail.to({ next }));
    take(me);
  }
  return (
    <Form form={form} onSubmit={submit} stops="the new account" label="Make an account">
      <TextInput
        label="Your name"
        autoComplete="name"
        hint="The other side of an order sees it"
        error={errors.name?.message}
        {...form.register('name')}
      />
      <TextInput
        label="Email"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <PasswordField isNew label="Password" error={errors.password?.message} {...form.register('password')} />
      <Checkbox
        label="I have units to sell"
        checked={sells}
        onChange={(event) => form.setValue('seller', event.target.checked ? { ...NO_SELLER } : undefined)}
      />
      {sells && (
        <SellerFields
          registered={{
            name: form.register('seller.name'),
            kind: form.register('seller.kind'),
            zip: form.register('seller.zip'),
          }}
          errors={{
            name: errors.seller?.name?.message,
            kind: errors.seller?.kind?.message,
            zip: errors.seller?.zip?.message,
          }}
        />
      )}
      <Button type="submit" look="go" size="big" full busy={isSubmitting} busyWords="Making the account">
        Make the account
      </Button>
    </Form>
  );
}
