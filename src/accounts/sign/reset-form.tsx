// Sets a new password with the link that was mailed.
import { useNavigate } from 'react-router-dom';
import { z } from 'zod';
import { resetPassword } from '../../../shared/accounts/contract';
import { newPassword } from '../../../shared/accounts/fields';
import { call } from '../../http/client';
import { paths } from '../../paths';
import { Button } from '../../ui/button';
import { Form, useZodForm } from '../../ui/form/form';
import { sayDone } from '../../ui/notices';
import { PasswordField } from './password-field';

const schema = z.strictObject({ password: newPassword });

export function ResetForm({ token }: { readonly token: string }) {
  const form = useZodForm(schema, { password: '' });
  const navigate = useNavigate();
  const { errors, isSubmitting } = form.formState;
  async function submit({ password }: { password: string }) {
    await call(resetPassword, { body: { token, password } });
    sayDone('New password set. Every session was signed out');
    await navigate(paths.signIn.to(), { replace: true });
  }
  return (
    <Form form={form} onSubmit={submit} stops="the new password" label="New password">
      <PasswordField
        isNew
        label="New password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <Button type="submit" look="go" size="big" full busy={isSubmitting} busyWords="Setting it">
        Set this password
      </Button>
    </Form>
  );
}
