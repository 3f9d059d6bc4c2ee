// Renders a piece of the page inside a router and a query client, and cleans up after each test.
import '@testing-library/jest-dom/vitest';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render as renderBare, type RenderResult } from '@testing-library/react';
import type { ReactNode } from 'react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach } from 'vitest';

afterEach(cleanup);

/** No retries, so that a failed question is drawn at once. */
export const testQueryClient = (): QueryClient =>
  new QueryClient({ defaultOptions: { queries: { retry: false } } });

export function render(node: ReactNode, options: { readonly at?: string } = {}): RenderResult {
  return renderBare(
    <QueryClientProvider client={testQueryClient()}>
      <MemoryRouter initialEntries={[options.at ?? '/']}>{node}</MemoryRouter>
    </QueryClientProvider>,
  );
}
