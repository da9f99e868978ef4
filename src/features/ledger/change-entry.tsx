import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { EntryRow } from '#shared/contracts/ledger.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { fieldsInWords } from '../../lib/field-words.ts';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { notify } from '../../ui/toast.tsx';
import { tryUndo } from '../../ui/undo.ts';
import { EntryDialog } from './entry-dialog.tsx';
import { changeOf, formOf } from './entry-form.ts';
import { EntrySource } from './entry-source.tsx';
import { type EntryChange, useLedgerWrites } from './mutations.ts';
import { entryQuery } from './queries.ts';

type Props = {
  entry: EntryRow;
  rebuilds: readonly PickOption[];
  categories: readonly PickOption[];
  onClose: () => void;
};

const NAMES = {
  rebuildId: 'Rebuild',
  categoryId: 'Category',
  datedOn: 'Day',
  cents: 'Amount',
  vendor: 'Vendor',
  what: 'What',
  foreseen: 'Foreseen',
  isExtra: 'Chosen extra',
  freeValueCents: 'Free value',
  receipt: 'Receipt',
} as const;

/** Changes one entry; if someone was quicker, shows both versions and asks. */
export function ChangeEntry({ entry, rebuilds, categories, onClose }: Props) {
  const format = useFormatter();
  const client = useQueryClient();
  const { change } = useLedgerWrites();
  const [conflict, setConflict] = useState<{ now: EntryRow; mine: EntryChange } | null>(null);

  async function save(base: EntryRow, mine: EntryChange): Promise<void> {
    if (Object.keys(mine).length > 0) {
      const saved = await change(base, mine);
      const back = Object.fromEntries(Object.keys(mine).map((name) => [name, base[name as keyof EntryRow]]));
      notify('Entry changed', { undo: () => void tryUndo(change(saved, back)) });
    }
    onClose();
  }

  async function onSave(body: Parameters<typeof changeOf>[1]): Promise<void> {
    const mine = changeOf(entry, body);
    try {
      await save(entry, mine);
    } catch (problem) {
      if (!(problem instanceof ApiProblem) || problem.status !== 412) throw problem;
      setConflict({ now: await client.fetchQuery({ ...entryQuery(entry.id), staleTime: 0 }), mine });
    }
  }

  const words = (field: keyof EntryRow, value: unknown) => {
    if (value === null || value === undefined) return 'nothing';
    const options = field === 'rebuildId' ? rebuilds : field === 'categoryId' ? categories : [];
    const found = options.find((option) => option.value === value);
    return found?.label ?? (typeof value === 'number' ? format.money(value, 'always') : String(value));
  };

  if (conflict) {
    return (
      <ConflictDialog
        subject="this entry"
        fields={fieldsInWords<EntryRow>(conflict.mine as Partial<EntryRow>, conflict.now, NAMES, words)}
        onTheirs={onClose}
        onMine={() => void save(conflict.now, conflict.mine)}
      />
    );
  }
  return (
    <EntryDialog
      title="Change this entry"
      start={formOf(entry, format.decimal)}
      rebuilds={rebuilds}
      categories={categories}
      keepsAmount={entry.splitId !== null}
      onSave={onSave}
      onClose={onClose}
    >
      <EntrySource entryId={entry.id} />
    </EntryDialog>
  );
}
