// Every page by its address. A page's code is fetched when it is first opened.
import type { ComponentType } from 'react';
import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { BrokenPage } from './pages/broken-page';
import { Guard, type Needs } from './pages/guard';
import { NotFoundPage } from './pages/not-found-page';
import { RootLayout } from './pages/root-layout';
import { WaitingPage } from './pages/waiting-page';

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
const pages: RouteObject[] = [];

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
