// The frame with who is signed in: every page hangs below it.
import { Outlet, ScrollRestoration } from 'react-router-dom';
import { Layout } from '../shell/layout';

export function RootLayout() {
  return (
    <Layout account={null}>
      <Outlet />
      <ScrollRestoration />
    </Layout>
  );
}
