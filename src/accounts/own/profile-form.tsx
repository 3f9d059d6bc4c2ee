// The name that the other side of an order sees, and whether the mail address is checked.
import { renameAccount, renameBody } from '../../../shared/accounts/contract';
import { call } from '../../http/client';
import { Button } from '../../ui/button';
import { Flag } from '../../ui/flag';
import { Form, useZodForm } from '../../ui/form/form';
import { TextInput } from '../../ui/form/text-input';
import { sayDone } from '../../ui/notices';
import { useTakeMe, type SignedIn } from '../session';
import { ResendButton } from '../sign/resend-button';

export function ProfileForm({ user }: { readonly user: SignedIn }) {
  const form = useZodForm(renameBody, { name: user.name });
  const take = useTakeMe();
  const { errors, isSubmitting, isDirty } = form.formState;
  async function submit(body: { name: string }) {
    const me = await call(renameAccount, { body });
    take(me);
    form.reset({ name: me.user?.name ?? body.name });
    sayDone('Name changed');
  }
  return (
    <div className="grid gap-20">
      <div className="flex flex-wrap items-center gap-14">
        <span className="b wrap-anywhere">{user.email}</span>
        {user.mailChecked ? <Flag tone="fits">Checked</Flag> : <Flag tone="not_known">Not checked</Flag>}
        {!user.mailChecked && <ResendButton />}
      </div>
      <Form form={form} onSubmit={submit} stops="the new name" label="Name">
        <TextInput
          label="Your name"
          autoComplete="name"
          hint="The other side of an order sees it"
          error={errors.name?.message}
          {...form.register('name')}
        />
        <div>
          <Button type="submit" disabled={!isDirty} busy={isSubmitting} busyWords="Saving">
            Save the name
          </Button>
        </div>
      </Form>
    </div>
  );
}
