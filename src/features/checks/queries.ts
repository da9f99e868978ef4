import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { checksApi, type settleCheckSchema } from '#shared/contracts/checks.ts';
import { call } from '../../lib/api.ts';

/** What is missing or odd in the books. */
export const checksQuery = () =>
  queryOptions({ queryKey: ['checks'], queryFn: ({ signal }) => call(checksApi.show, { signal }) });

/** Says that something is right as it is, or takes that back. */
export function useSettleCheck() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof settleCheckSchema>) => call(checksApi.settle, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: checksQuery().queryKey }),
  });
}
