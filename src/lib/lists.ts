import { queryOptions } from '@tanstack/react-query';
import { shopApi } from '#shared/contracts/shop.ts';
import { call } from './api.ts';
import { capital } from './capital.ts';

/** The shop's classes, damage types, categories and workers, for the forms and filters of every page. */
export const listsQuery = () =>
  queryOptions({ queryKey: ['lists'], queryFn: ({ signal }) => call(shopApi.lists, { signal }), staleTime: 300_000 });

type Word = { readonly id: string; readonly name: string; readonly isRetired: boolean };

/** Words of a list as options of a field: retired ones only where one is chosen already. */
export function optionsOf(words: readonly Word[], chosen: string | null = null): { value: string; label: string }[] {
  return words
    .filter((word) => !word.isRetired || word.id === chosen)
    .map((word) => ({ value: word.id, label: capital(word.name) }));
}
