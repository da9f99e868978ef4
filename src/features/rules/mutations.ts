import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { type newRuleSchema, rulesApi } from '#shared/contracts/rules.ts';
import { call } from '../../lib/api.ts';
import { rulesQuery } from './queries.ts';

export type NewRule = z.input<typeof newRuleSchema>;

/** Adopts a rule. `alsoOld` are the keys of what else shows it. The key is made when the dialog opens. */
export function useAdoptRule(alsoOld: readonly (readonly string[])[]) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ body, idempotencyKey }: { body: NewRule; idempotencyKey: string }) =>
      call(rulesApi.adopt, { body, idempotencyKey }),
    onSuccess: async () => {
      const keys = [rulesQuery().queryKey, ...alsoOld];
      await Promise.all(keys.map((queryKey) => client.invalidateQueries({ queryKey })));
    },
  });
}
