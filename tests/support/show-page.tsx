import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import { type ReactNode, Suspense } from 'react';
import { MemoryRouter, Route, Routes, useLocation } from 'react-router-dom';
import { createQueryClient } from '../../src/lib/query-client.ts';
import { ErrorBoundary } from '../../src/ui/error-boundary.tsx';
import { Toasts } from '../../src/ui/toast.tsx';

/** Shows one page as the frame would, at `address` (its pattern: `path`). Other addresses show as "at /where". */
export function showPage(page: ReactNode, { path = '/', address = path }: { path?: string; address?: string } = {}) {
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { retry: false } });
  return render(
    <QueryClientProvider client={client}>
      <MemoryRouter initialEntries={[address]}>
        <ErrorBoundary>
          <Suspense>
            <Routes>
              <Route path={path} element={page} />
              <Route path="*" element={<Elsewhere />} />
            </Routes>
          </Suspense>
        </ErrorBoundary>
      </MemoryRouter>
      <Toasts />
    </QueryClientProvider>,
  );
}

function Elsewhere() {
  const { pathname, search } = useLocation();
  return <p>at {pathname + search}</p>;
}
