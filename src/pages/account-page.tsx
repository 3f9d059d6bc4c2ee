// What somebody sees and changes of their own account.
import { CloseAccount } from '../accounts/own/close-form';
import { PasswordForm } from '../accounts/own/password-form';
import { ProfileForm } from '../accounts/own/profile-form';
import { SellerAccounts } from '../accounts/own/seller-accounts';
import { SessionList } from '../accounts/own/session-list';
import { useUser } from '../accounts/session';
import { Page } from '../shell/layout';
import { PageHead } from '../ui/page-title';
import { Section } from '../ui/sheet';

export function AccountPage() {
  const user = useUser();
  if (!user) return null;
  return (
    <Page>
      <PageHead title="Account" under={<span className="sm mute">{user.email}</span>} />
      <div className="grid gap-x-28 desk:grid-cols-2">
        <Section title="You">
          <ProfileForm key={user.id} user={user} />
        </Section>
        <Section title="Password">
          <PasswordForm />
        </Section>
      </div>
      <Section title="Seller accounts">
        <SellerAccounts user={user} />
      </Section>
      <Section title="Where you are signed in">
        <SessionList />
      </Section>
      <Section title="Close the account">
        <CloseAccount />
      </Section>
    </Page>
  );
}
