// A new password, with the old one asked for first.
import { changePassword, passwordChange } from '../../../shared/accounts/contract';
import { call } from '../../http/client';
import { Button } from '../../ui/button';
import { Form, useZodForm } from '../../ui/form/form';
import { sayDone } from '../../ui/notices';
import { useQueryClient } from '@tanstack/react-query';
import { sessionsQuery } from '../api';
import { useTakeMe } from '../session';
import { PasswordField } from '../sign/password-field';

const EMPTY = { current: '', password: '' };

export function PasswordForm() {
  const form = useZodForm(passwordChange, EMPTY);
  const take = useTakeMe();
  const client = useQueryClient();
  const { errors, isSubmitting } = form.formState;
  async function submit(body: { current: string; password: string }) {
    take(await call(changePassword, { body }));
    form.reset(EMPTY);
    await client.invalidateQueries({ queryKey: sessionsQuery.queryKey });
    sayDone('Password changed. Every other session was signed out');
  }
  return (
    <Form form={form} onSubmit={submit} stops="the new password" label="Password">
      <PasswordField
        label="Password you have now"
        error={errors.current?.message}
        {...form.register('current')}
      />
      <PasswordField
        isNew
        label="New password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <div>
        <Button type="submit" busy={isSubmitting} busyWords="Changing it">
          Change the password
        </Button>
      </div>
    </Form>
  );
}
