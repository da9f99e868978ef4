import { queryOptions, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import type { Session } from '#shared/contracts/session.ts';
import { ApiProblem } from './api-problem.ts';
import { drop, KEPT_SESSION, keep, kept } from './kept.ts';
import { send } from './send.ts';

/** How long a weak signal may take, once a session is kept that can stand in. */
const PATIENCE_MS = 4000;

/**
 * Who is signed in and which shop the session is in; null when nobody is. Without signal it is the one that a page kept
 * for that (`keepSession`).
 */
async function readSession(): Promise<Session | null> {
  const stored = kept(KEPT_SESSION);
  const patience = stored === null ? {} : { signal: AbortSignal.timeout(PATIENCE_MS) };
  const reply = await send({ method: 'GET', url: '/api/session', isAboutSession: true, ...patience }).catch(
    (problem: unknown) => {
      if (stored !== null && problem instanceof ApiProblem && problem.status === 0) return stored;
      throw problem;
    },
  );
  if (reply === null) {
    drop(KEPT_SESSION);
    return null;
  }
  // Loaded only here: a visitor who is not signed in never pays for the schemas.
  const { sessionApi } = await import('#shared/contracts/session.ts');
  const session = sessionApi.get.response.parse(reply);
  if (stored !== null) keepSession(session);
  return session;
}

/** From now on this browser opens for this person without signal too, until they sign out. */
export function keepSession(session: Session | null): void {
  keep(KEPT_SESSION, session);
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
