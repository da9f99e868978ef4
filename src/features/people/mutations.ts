import { useQueryClient } from '@tanstack/react-query';
import { type Invitation, type Member, peopleApi } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { call } from '../../lib/api.ts';
import { sessionQuery } from '../../lib/session.ts';
import { useVersionedEdit } from '../../lib/use-versioned-edit.ts';
import { peopleQuery } from './queries.ts';

function useFreshPeople() {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: peopleQuery().queryKey });
}

/** Gives members another role; see useVersionedEdit for what happens when someone else was quicker. */
export function useRoleEdit() {
  const client = useQueryClient();
  const refresh = useFreshPeople();
  return useVersionedEdit<Member, Role>({
    send: async ({ userId, version }, role) => {
      const after = await call(peopleApi.changeRole, { params: { userId }, body: { role }, version });
      await refresh();
      return after;
    },
    latest: async ({ userId, name }) => {
      const { members } = await client.fetchQuery({ ...peopleQuery(), staleTime: 0 });
      const found = members.find((member) => member.userId === userId);
      if (!found) throw new ApiProblem({ title: `${name} no longer belongs to the shop` }, 404);
      return found;
    },
  });
}

/** The other changes: take someone out, invite, withdraw. */
export function usePeopleActions() {
  const refresh = useFreshPeople();
  return {
    remove: async ({ userId, version }: Member) => {
      // A refusal may mean that the list shown is old: it is read again either way.
      await call(peopleApi.remove, { params: { userId }, version }).finally(() => void refresh());
    },
    invite: async (body: { email: string; role: Role }) => {
      const invitation = await call(peopleApi.invite, { body });
      await refresh();
      return invitation;
    },
    withdraw: async ({ id }: Invitation) => {
      await call(peopleApi.withdraw, { params: { invitationId: id } }).finally(() => void refresh());
    },
  };
}

/** Takes an invitation up and signs in. Gives the id of the shop joined. */
export function useJoin(): (wish: { token: string; name?: string; password: string }) => Promise<string | null> {
  const client = useQueryClient();
  return async (body) => {
    await call(peopleApi.join, { body });
    client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'session' && queryKey[0] !== 'invitation' });
    const session = await client.fetchQuery({ ...sessionQuery(), staleTime: 0 });
    return session?.shop.id ?? null;
  };
}
