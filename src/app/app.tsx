import { QueryClientProvider, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { createBrowserRouter, RouterProvider } from 'react-router-dom';
import { createQueryClient } from '../lib/query-client.ts';
import { ErrorBoundary } from '../ui/error-boundary.tsx';
import { Doorway } from './doorway.tsx';
import { AppRoutes } from './routes.tsx';

/** The whole client: cache, address, pages. */
export function App() {
  const [client] = useState(createQueryClient);
  // One address for all; the pages are told apart below. This router can ask before a page is left.
  const [router] = useState(() => createBrowserRouter([{ path: '*', element: <Pages /> }]));
  return (
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  );
}

function Pages() {
  const client = useQueryClient();
  return (
    <ErrorBoundary frame={Doorway} onReset={() => void client.resetQueries()}>
      <AppRoutes />
    </ErrorBoundary>
  );
}
