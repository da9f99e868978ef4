import { queryOptions, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import type { Session } from '#shared/contracts/session.ts';
import { ApiProblem } from './api-problem.ts';
import { send } from './send.ts';

/** Who is signed in and which shop the session is in; null when nobody is. */
async function readSession(): Promise<Session | null> {
  const reply = await send({ method: 'GET', url: '/api/session', isAboutSession: true });
  if (reply === null) return null;
  // Loaded only here: a visitor who is not signed in never pays for the schemas.
  const { sessionApi } = await import('#shared/contracts/session.ts');
  return sessionApi.get.response.parse(reply);
}

/**
 * Read once and then only when something asks for it: a session that ends is noticed by the first refused request, which
 * opens a dialog over the page; a quiet re-read would take the page away with what was typed on it.
 */
export const sessionQuery = () =>
  queryOptions({
    queryKey: ['session'],
    queryFn: readSession,
    staleTime: Number.POSITIVE_INFINITY,
    gcTime: Number.POSITIVE_INFINITY,
    refetchOnWindowFocus: false,
    refetchOnReconnect: false,
  });

/** The session on a page that is only shown to people who are signed in. */
export function useSession(): Session {
  const { data } = useSuspenseQuery(sessionQuery());
  if (!data) throw new ApiProblem({ title: 'You are not signed in' }, 401);
  return data;
}

/** Signs in. Throws ApiProblem when the address or the password is wrong. */
export async function signIn(body: { email: string; password: string }): Promise<void> {
  await send({ method: 'POST', url: '/api/session', body, isAboutSession: true });
}

/** Ends the session on the server; everything cached goes with the page that is then loaded. */
export async function signOut(): Promise<void> {
  await send({ method: 'DELETE', url: '/api/session', isAboutSession: true });
}

/** Moves the session to another of the person's shops, on the server only. */
export async function moveSession(shopId: string): Promise<void> {
  await send({ method: 'PUT', url: '/api/session/shop', body: { shopId }, isAboutSession: true });
}

/** Moves to another shop and forgets all that was read in the one before. Only where no page of either is shown. */
export function useSwitchShop(): (shopId: string) => Promise<void> {
  const client = useQueryClient();
  return async (shopId) => {
    await moveSession(shopId);
    client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
    await client.refetchQueries({ queryKey: sessionQuery().queryKey });
  };
}
