import { QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { BrowserRouter } from 'react-router-dom';
import '../lib/step-gate.ts';
import { createQueryClient } from '../lib/query-client.ts';
import { ErrorBoundary } from '../ui/error-boundary.tsx';
import { Doorway } from './doorway.tsx';
import { AppRoutes } from './routes.tsx';

/** The whole client: cache, address, pages. */
export function App() {
  const [client] = useState(createQueryClient);
  return (
    <QueryClientProvider client={client}>
      <BrowserRouter>
        <ErrorBoundary frame={Doorway} onReset={() => void client.resetQueries()}>
          <AppRoutes />
        </ErrorBoundary>
      </BrowserRouter>
    </QueryClientProvider>
  );
}
