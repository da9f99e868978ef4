import { queryOptions } from '@tanstack/react-query';
import { peopleApi } from '#shared/contracts/people.ts';
import { call } from '../../lib/api.ts';

/** Members of the shop and its open invitations; for owners. */
export const peopleQuery = () => queryOptions({ queryKey: ['people'], queryFn: () => call(peopleApi.list) });

/** What an invitation says. It is asked for once: a link that was good when opened is judged again at the joining. */
export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: ['invitation', token],
    queryFn: () => call(peopleApi.look, { body: { token } }),
    staleTime: Number.POSITIVE_INFINITY,
  });
