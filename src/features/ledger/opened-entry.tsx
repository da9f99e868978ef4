import { useQuery } from '@tanstack/react-query';
import type { PickOption } from '../../ui/pick-field.tsx';
import { ChangeEntry } from './change-entry.tsx';
import { entryQuery } from './queries.ts';

type Props = {
  entryId: string;
  rebuilds: readonly PickOption[];
  categories: readonly PickOption[];
  onClose: () => void;
};

/** The entry that the address names, opened over the ledger; nothing while it loads, or when there is none such. */
export function OpenedEntry({ entryId, ...rest }: Props) {
  const { data: entry } = useQuery(entryQuery(entryId));
  return entry ? <ChangeEntry entry={entry} {...rest} /> : null;
}
