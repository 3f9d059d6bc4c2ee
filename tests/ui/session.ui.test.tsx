// @vitest-environment happy-dom
// The network is answered here as the server would answer; everything on this side of it is the real page.
import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Route, Routes, useLocation } from 'react-router-dom';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import type { Me } from '../../shared/accounts/contract';
import { rememberCsrfToken } from '../../src/http/client';
import { Guard, type Needs } from '../../src/pages/guard';
import { Layout } from '../../src/shell/layout';
import { useSignOut, useUser } from '../../src/accounts/session';
import { render } from './render';

const NOBODY: Me = { user: null, csrfToken: 'token-0' };

const person = (
  roles: ('builder' | 'seller' | 'admin')[],
  sellers: NonNullable<Me['user']>['sellers'] = [],
): Me => ({
  user: { id: 'usr_1', name: 'Roza Pike', email: 'roza@quenby.example', mailChecked: true, roles, sellers },
  csrfToken: 'token-1',
});

const DOCK = person(
  ['builder', 'seller'],
  [{ id: 'slr_1', name: 'Quenby Dismantlers', kind: 'yard', duties: ['dock'] }],
);

let signedIn: Me;
const sent: { path: string; method: string; token: string | null }[] = [];

beforeEach(() => {
  sent.length = 0;
  rememberCsrfToken('token-1');
  vi.stubGlobal('fetch', async (url: string, init: RequestInit) => {
    const path = new URL(url, 'http://localhost').pathname;
    sent.push({ path, method: init.method ?? 'GET', token: new Headers(init.headers).get('x-csrf-token') });
    if (path === '/api/auth/sign-out') {
      signedIn = NOBODY;
      return new Response(null, { status: 204 });
    }
    return Response.json(signedIn);
  });
});

function Frame() {
  const user = useUser();
  const leave = useSignOut(() => undefined);
  const account = user
    ? {
        name: user.name,
        email: user.email,
        isAdmin: user.roles.includes('admin'),
        isMember: user.sellers.length > 0,
        onSignOut: leave,
      }
    : null;
  return (
    <Layout account={account} accountKnown={user !== undefined}>
      <main>Page</main>
    </Layout>
  );
}

function SignInPage() {
  return <p>Sign in, then {useLocation().search}</p>;
}

const guarded = (needs: Needs) => (
  <Routes>
    <Route path="/sign-in" element={<SignInPage />} />
    <Route path="*" element={<Guard needs={needs}>Private page</Guard>} />
  </Routes>
);

describe('guard', () => {
  it('when nobody is signed in, then it leads to sign-in and remembers the address', async () => {
    signedIn = NOBODY;
    render(guarded('signed_in'), { at: '/orders/ord_1?tab=log' });
    expect(await screen.findByText('Sign in, then ?next=%2Forders%2Ford_1%3Ftab%3Dlog')).toBeInTheDocument();
    expect(screen.queryByText('Private page')).not.toBeInTheDocument();
  });

  it.each<[Needs, string, Me]>([
    ['signed_in', 'a builder', person(['builder'])],
    ['member', 'a dock hand', DOCK],
    ['admin', 'an admin', person(['admin'])],
  ])('when a page needs %s and %s comes, then it opens', async (needs, _, who) => {
    signedIn = who;
    render(guarded(needs), { at: '/somewhere' });
    expect(await screen.findByText('Private page')).toBeInTheDocument();
  });

  it.each<[Needs, string, Me]>([
    ['member', 'a builder', person(['builder'])],
    ['admin', 'a dock hand', DOCK],
  ])('when a page needs %s and %s comes, then there is nothing here', async (needs, _, who) => {
    signedIn = who;
    render(guarded(needs), { at: '/somewhere' });
    expect(await screen.findByRole('heading', { name: 'This tag is not on any rack' })).toBeInTheDocument();
    expect(screen.queryByText('Private page')).not.toBeInTheDocument();
  });
});

describe('header', () => {
  it('when nobody is signed in, then it offers to sign in and shows no desk', async () => {
    signedIn = NOBODY;
    render(<Frame />);
    expect(await screen.findByRole('link', { name: 'Sign in' })).toBeInTheDocument();
    expect(screen.queryByRole('link', { name: 'Orders' })).not.toBeInTheDocument();
  });

  it('when a dock hand is at the yard, then the yard’s sections stand in the bar and the current one is marked', async () => {
    signedIn = DOCK;
    render(<Frame />, { at: '/yard/receiving/ord_1' });
    await screen.findByRole('button', { name: /Roza Pike/ });
    const nav = within(screen.getByRole('navigation', { name: 'Main' }));
    expect(nav.getByRole('link', { current: 'page' })).toHaveTextContent('Receive');
    expect(within(screen.getByRole('banner')).getByRole('link', { name: 'List a unit' })).toBeInTheDocument();
  });

  it('when somebody signs out, then the server is told with the token and the header forgets them', async () => {
    signedIn = DOCK;
    render(<Frame />);
    await userEvent.click(await screen.findByRole('button', { name: /Roza Pike/ }));
    await userEvent.click(await screen.findByRole('menuitem', { name: 'Sign out' }));
    expect(await screen.findByRole('link', { name: 'Sign in' })).toBeInTheDocument();
    expect(sent).toContainEqual({ path: '/api/auth/sign-out', method: 'POST', token: 'token-1' });
  });
});
