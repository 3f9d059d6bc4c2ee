// Mail address and password. A wrong pair is said beside the password and doesn't tell which of the two it was.
import { signIn, signInBody } from '../../../shared/accounts/contract';
import { call, ProblemError } from '../../http/client';
import { paths } from '../../paths';
import { Button, ButtonLink } from '../../ui/button';
import { Form, useZodForm } from '../../ui/form/form';
import { TextInput } from '../../ui/form/text-input';
import { useTakeSession } from '../session';
import { PasswordField } from './password-field';

export function SignInForm({ next }: { readonly next: string | null }) {
  const form = useZodForm(signInBody, { email: '', password: '' });
  const take = useTakeSession();
  const { errors, isSubmitting } = form.formState;
  async function submit(body: { email: string; password: string }) {
    try {
      take(await call(signIn, { body }));
    } catch (error) {
      if (!(error instanceof ProblemError) || error.problem.status !== 401) throw error;
      form.setError('password', {
        type: 'server',
        message: 'Address or password does not match. Try again, or get a link',
      });
    }
  }
  return (
    <Form form={form} onSubmit={submit} stops="signing in" label="Sign in">
      <TextInput
        label="Email"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <PasswordField label="Password" error={errors.password?.message} {...form.register('password')} />
      <Button type="submit" look="go" size="big" full busy={isSubmitting} busyWords="Signing in">
        Sign in
      </Button>
      <ButtonLink full to={paths.forgot.to({ next })}>
        Email me a link instead
      </ButtonLink>
    </Form>
  );
}
