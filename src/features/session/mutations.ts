import { useQueryClient } from '@tanstack/react-query';
import { send } from '../../lib/send.ts';
import { sessionQuery } from '../../lib/session.ts';

export type SignUp = { name: string; shopName: string; email: string; password: string };

/** Makes an account and its shop, in the browser's time zone, and signs in. Gives the new shop's id. */
export function useSignUp(): (wish: SignUp) => Promise<string | null> {
  const client = useQueryClient();
  return async (wish) => {
    const { timeZone } = new Intl.DateTimeFormat().resolvedOptions();
    // Not through the contract: this page is often the first one, and goes without the schemas.
    await send({ method: 'POST', url: '/api/sign-up', body: { ...wish, timeZone }, isAboutSession: true });
    client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
    const session = await client.fetchQuery({ ...sessionQuery(), staleTime: 0 });
    return session?.shop.id ?? null;
  };
}
