import { type QueryClient, useQueryClient } from '@tanstack/react-query';

/** Everything read of the books is stale: a write to one page's rows changes the sums of every other. */
export function forgetBooks(client: QueryClient): Promise<void> {
  return client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
}

/** The same, for a component. */
export function useBooksChanged(): () => Promise<void> {
  const client = useQueryClient();
  return () => forgetBooks(client);
}
