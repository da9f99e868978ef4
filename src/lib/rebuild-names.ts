import { queryOptions } from '@tanstack/react-query';
import { type RebuildName, rebuildsApi } from '#shared/contracts/rebuilds.ts';
import { call } from './api.ts';

/** Tag and name of every rebuild, open ones first: for pickers on any page. */
export const rebuildNamesQuery = () =>
  queryOptions({ queryKey: ['rebuild-names'], queryFn: ({ signal }) => call(rebuildsApi.names, { signal }) });

/** Rebuilds as options of a picker. */
export function rebuildOptions(names: readonly RebuildName[]): { value: string; label: string; note?: string }[] {
  return names.map(({ id, tag, name, isOpen }) => ({
    value: id,
    label: name ? `${tag} · ${name}` : tag,
    ...(isOpen ? {} : { note: 'has left' }),
  }));
}
