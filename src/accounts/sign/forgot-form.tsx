// Asks for a link to set a new password. What it says next is the same whether or not there is such an account.
import { useState } from 'react';
import { forgot, forgotBody } from '../../../shared/accounts/contract';
import { call } from '../../http/client';
import { paths } from '../../paths';
import { Button, ButtonLink } from '../../ui/button';
import { Form, useZodForm } from '../../ui/form/form';
import { TextInput } from '../../ui/form/text-input';

export function ForgotForm({ next }: { readonly next: string | null }) {
  const form = useZodForm(forgotBody, { email: '' });
  const [sentTo, setSentTo] = useState<string | null>(null);
  const { errors, isSubmitting } = form.formState;
  if (sentTo !== null) {
    return (
      <>
        <p role="status">
          If <b className="b">{sentTo}</b> has an account here, a link is on its way. It works once, for 30
          minutes. Look among the junk mail too.
        </p>
        <ButtonLink full to={paths.signIn.to({ next })}>
          Go to sign in
        </ButtonLink>
        <Button full onClick={() => setSentTo(null)}>
          Try another address
        </Button>
      </>
    );
  }
  async function submit(body: { email: string }) {
    await call(forgot, { body });
    setSentTo(body.email);
  }
  return (
    <Form form={form} onSubmit={submit} stops="the link" label="Get a link">
      <TextInput
        label="Email"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <Button type="submit" look="go" size="big" full busy={isSubmitting} busyWords="Asking for the link">
        Email me a link
      </Button>
    </Form>
  );
}
