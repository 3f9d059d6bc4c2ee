// The frame with who is signed in: every page hangs below it.
import { Outlet, ScrollRestoration, useNavigate } from 'react-router-dom';
import { useSignOut, useUser, type SignedIn } from '../accounts/session';
import { paths } from '../paths';
import type { ShellAccount } from '../shell/account';
import { Layout } from '../shell/layout';
import { sayDone } from '../ui/notices';

function roleWords(user: SignedIn): string {
  const [first, ...others] = user.sellers;
  if (first) return others.length > 0 ? `${first.name} and ${others.length} more` : first.name;
  return user.roles.includes('admin') ? 'Admin' : 'Builder';
}

const shellAccount = (user: SignedIn, onSignOut: () => void): ShellAccount => ({
  name: user.name,
  email: user.email,
  role: roleWords(user),
  isAdmin: user.roles.includes('admin'),
  isMember: user.sellers.length > 0,
  onSignOut,
});

export function RootLayout() {
  const user = useUser();
  const navigate = useNavigate();
  const leave = useSignOut(() => {
    sayDone('Signed out');
    void navigate(paths.home.to());
  });
  return (
    <Layout account={user ? shellAccount(user, leave) : null} accountKnown={user !== undefined}>
      <Outlet />
      {/* The first page of a visit has no key of its own, so its address stands for it. */}
      <ScrollRestoration
        getKey={(location) => (location.key === 'default' ? location.pathname : location.key)}
      />
    </Layout>
  );
}
