// Invites somebody by mail to work for the seller account.
import { inviteBody } from '../../../shared/accounts/seller-contract';
import type { Duty } from '../../../shared/accounts/actor';
import { Button } from '../../ui/button';
import { Form, useZodForm } from '../../ui/form/form';
import { TextInput } from '../../ui/form/text-input';
import { sayDone } from '../../ui/notices';
import { useTeamChanges } from '../api';
import { DutiesField } from './duties-field';

const START: { email: string; duties: Duty[] } = { email: '', duties: ['lister', 'dock'] };

export function InviteForm({ sellerId }: { readonly sellerId: string }) {
  const form = useZodForm(inviteBody, START);
  const { invite } = useTeamChanges(sellerId);
  const { errors, isSubmitting } = form.formState;
  async function submit(body: { email: string; duties: Duty[] }) {
    await invite.mutateAsync(body);
    form.reset(START);
    sayDone(`An invitation is on its way to ${body.email}`);
  }
  return (
    <Form form={form} onSubmit={submit} stops="the invitation" label="Invite somebody">
      <TextInput
        label="Email"
        type="email"
        autoComplete="off"
        hint="The link works once, for 7 days, and only for this address"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <DutiesField registered={form.register('duties')} error={errors.duties?.message} />
      <div>
        <Button type="submit" look="go" size="big" busy={isSubmitting} busyWords="Inviting">
          Invite to the team
        </Button>
      </div>
    </Form>
  );
}
