import { useMutation } from '@tanstack/react-query';
import type { EntryRow } from '#shared/contracts/ledger.ts';
import { notify } from '../../ui/toast.tsx';
import { VoidDialog } from '../../ui/void-dialog.tsx';
import { useLedgerWrites } from './mutations.ts';

/** Voids one entry, or the whole bill that it is a share of. */
export function VoidEntry({ entry, onClose }: { entry: EntryRow; onClose: () => void }) {
  const { voidEntry } = useLedgerWrites();
  const { mutate, isPending, error } = useMutation({
    mutationFn: (reason: string) => voidEntry(entry, reason),
    onSuccess: () => {
      notify(entry.splitId ? 'The whole bill is void' : 'Entry void');
      onClose();
    },
  });
  return (
    <VoidDialog
      what={entry.what ?? entry.categoryName}
      note={
        entry.splitId
          ? 'It is a share of a bill: every share of the bill becomes void with it. They stay, struck through.'
          : undefined
      }
      busy={isPending}
      error={error?.message}
      onVoid={mutate}
      onClose={onClose}
    />
  );
}
