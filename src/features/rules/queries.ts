import { queryOptions } from '@tanstack/react-query';
import { rulesApi } from '#shared/contracts/rules.ts';
import { call } from '../../lib/api.ts';

/** Rules adopted so far, the latest first. */
export const rulesQuery = () =>
  queryOptions({ queryKey: ['rules'], queryFn: ({ signal }) => call(rulesApi.list, { signal }) });
