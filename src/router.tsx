// Every page by its address. A page's code is fetched when it is first opened.
import type { ComponentType } from 'react';
import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { BrokenPage } from './pages/broken-page';
import { Guard, type Needs } from './pages/guard';
import { NotFoundPage } from './pages/not-found-page';
import { RootLayout } from './pages/root-layout';
import { WaitingPage } from './pages/waiting-page';
import { paths } from './paths';

type LoadPage = () => Promise<ComponentType>;

/** `needs` left out: anybody may open it. */
const page = (pattern: string, load: LoadPage, needs?: Needs): RouteObject => ({
  path: pattern,
  errorElement: <BrokenPage />,
  lazy: async () => {
    const Loaded = await load();
    if (!needs) return { Component: Loaded };
    return {
      element: (
        <Guard needs={needs}>
          <Loaded />
        </Guard>
      ),
    };
  },
});

/**
 * One line for each page:
 * `page(paths.order.pattern, () => import('./pages/order-page').then((m) => m.OrderPage), 'signed_in'),`
 */
const pages: RouteObject[] = [
  page(paths.home.pattern, () => import('./pages/home-page').then((m) => m.HomePage)),
  page(paths.results.pattern, () => import('./pages/results-page').then((m) => m.ResultsPage)),
  page(paths.listing.pattern, () => import('./pages/unit-page').then((m) => m.UnitPage)),
  page(paths.codeReader.pattern, () => import('./pages/code-page').then((m) => m.CodePage)),
  page(paths.families.pattern, () => import('./pages/families-page').then((m) => m.FamiliesPage)),
  page(paths.family.pattern, () => import('./pages/family-page').then((m) => m.FamilyPage)),
  page(
    paths.adminCatalogue.pattern,
    () => import('./pages/admin-catalogue-page').then((m) => m.AdminCataloguePage),
    'admin',
  ),
  page(paths.signIn.pattern, () => import('./pages/sign-in-page').then((m) => m.SignInPage)),
  page(paths.signUp.pattern, () => import('./pages/sign-up-page').then((m) => m.SignUpPage)),
  page(
    paths.checkMail.pattern,
    () => import('./pages/check-mail-page').then((m) => m.CheckMailPage),
    'signed_in',
  ),
  page(paths.verify.pattern, () => import('./pages/verify-page').then((m) => m.VerifyPage)),
  page(paths.forgot.pattern, () => import('./pages/forgot-page').then((m) => m.ForgotPage)),
  page(paths.reset.pattern, () => import('./pages/reset-page').then((m) => m.ResetPage)),
  page(paths.invite.pattern, () => import('./pages/invite-page').then((m) => m.InvitePage), 'signed_in'),
  page(paths.account.pattern, () => import('./pages/account-page').then((m) => m.AccountPage), 'signed_in'),
  page(paths.tag.pattern, () => import('./pages/tag-page').then((m) => m.TagPage)),
  page(paths.orders.pattern, () => import('./pages/orders-page').then((m) => m.OrdersPage), 'signed_in'),
  page(paths.order.pattern, () => import('./pages/order-page').then((m) => m.OrderPage), 'signed_in'),
  page(
    paths.checkoutDone.pattern,
    () => import('./pages/checkout-done-page').then((m) => m.CheckoutDonePage),
    'signed_in',
  ),
  page(
    paths.bookReturn.pattern,
    () => import('./pages/book-return-page').then((m) => m.BookReturnPage),
    'signed_in',
  ),
  page(paths.yard.pattern, () => import('./pages/yard-today-page').then((m) => m.YardTodayPage), 'member'),
  page(
    paths.yardOrders.pattern,
    () => import('./pages/yard-orders-page').then((m) => m.YardOrdersPage),
    'member',
  ),
  page(
    paths.receiving.pattern,
    () => import('./pages/receiving-page').then((m) => m.ReceivingPage),
    'member',
  ),
  page(
    paths.receive.pattern,
    () => import('./pages/receive-desk-page').then((m) => m.ReceiveDeskPage),
    'member',
  ),
  page(paths.payouts.pattern, () => import('./pages/payouts-page').then((m) => m.PayoutsPage), 'member'),
  page(paths.team.pattern, () => import('./pages/team-page').then((m) => m.TeamPage), 'member'),
  page(paths.terms.pattern, () => import('./pages/terms-page').then((m) => m.TermsPage), 'member'),
];

if (import.meta.env.DEV) {
  pages.push(page('/kit', () => import('./pages/kit-page').then((m) => m.KitPage)));
}

export const createRouter = () =>
  createBrowserRouter([
    {
      element: <RootLayout />,
      errorElement: <BrokenPage />,
      hydrateFallbackElement: <WaitingPage />,
      children: [...pages, { path: '*', element: <NotFoundPage /> }],
    },
  ]);
