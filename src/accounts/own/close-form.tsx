// Closing the account: says what it means, asks for the password, and cannot be undone.
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { closeAccount, closeBody } from '../../../shared/accounts/contract';
import { call } from '../../http/client';
import { paths } from '../../paths';
import { Button } from '../../ui/button';
import { Dialog } from '../../ui/dialog';
import { Form, useZodForm } from '../../ui/form/form';
import { sayDone } from '../../ui/notices';
import { useLeave } from '../session';
import { PasswordField } from '../sign/password-field';

function CloseDialog({ onClose }: { readonly onClose: () => void }) {
  const form = useZodForm(closeBody, { password: '' });
  const navigate = useNavigate();
  const leave = useLeave();
  const { errors, isSubmitting } = form.formState;
  async function submit(body: { password: string }) {
    await call(closeAccount, { body });
    await navigate(paths.home.to());
    await leave();
    sayDone('Your account is closed');
  }
  return (
    <Dialog
      open
      onClose={onClose}
      title="Close this account?"
      description="Nobody can sign in to it any more, and this cannot be called back. The papers of past orders are kept."
    >
      <Form form={form} onSubmit={submit} stops="the closing">
        <PasswordField label="Password" error={errors.password?.message} {...form.register('password')} />
        <div className="dialog-actions">
          <Button type="submit" look="go" size="big" busy={isSubmitting} busyWords="Closing it">
            Close the account
          </Button>
          <Button size="big" onClick={onClose}>
            Go back
          </Button>
        </div>
      </Form>
    </Dialog>
  );
}

export function CloseAccount() {
  const [asking, setAsking] = useState(false);
  return (
    <div className="grid gap-14">
      <p className="max-w-read">
        An account closes when no order is open, nothing is on offer, no money is on its way and no seller
        account would be left without an owner.
      </p>
      <div>
        <Button onClick={() => setAsking(true)}>Close this account</Button>
      </div>
      {asking && <CloseDialog onClose={() => setAsking(false)} />}
    </div>
  );
}
