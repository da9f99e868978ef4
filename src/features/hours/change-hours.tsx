import { useState } from 'react';
import { type HoursRow, hoursApi } from '#shared/contracts/hours.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { call } from '../../lib/api.ts';
import { fieldsInWords } from '../../lib/field-words.ts';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import type { Option } from '../../ui/text-field.tsx';
import { notify } from '../../ui/toast.tsx';
import { tryUndo } from '../../ui/undo.ts';
import { HoursDialog } from './hours-dialog.tsx';
import { changeOf, formOf } from './hours-form.ts';
import { type HoursChange, useHoursWrites } from './mutations.ts';

type Props = {
  hours: HoursRow;
  rebuilds: readonly PickOption[];
  workers: readonly Option[];
  onClose: () => void;
};

const NAMES = {
  rebuildId: 'Rebuild',
  workerId: 'Who',
  workedOn: 'Day',
  seconds: 'Hours',
  isPaid: 'Paid',
  task: 'Doing what',
} as const;

/** Changes one row of hours; if someone was quicker, shows both versions and asks. */
export function ChangeHours({ hours, rebuilds, workers, onClose }: Props) {
  const format = useFormatter();
  const { change } = useHoursWrites();
  const [conflict, setConflict] = useState<{ now: HoursRow; mine: HoursChange } | null>(null);

  async function save(base: HoursRow, mine: HoursChange): Promise<void> {
    if (Object.keys(mine).length > 0) {
      const saved = await change(base, mine);
      const back = Object.fromEntries(Object.keys(mine).map((name) => [name, base[name as keyof HoursRow]]));
      notify('Hours changed', { undo: () => void tryUndo(change(saved, back)) });
    }
    onClose();
  }

  async function onSave(body: Parameters<typeof changeOf>[1]): Promise<void> {
    const mine = changeOf(hours, body);
    try {
      await save(hours, mine);
    } catch (problem) {
      if (!(problem instanceof ApiProblem) || problem.status !== 412) throw problem;
      const now = await findNow(hours);
      if (!now) throw problem;
      setConflict({ now, mine });
    }
  }

  const words = (field: keyof HoursRow, value: unknown) => {
    if (value === null || value === undefined) return 'nothing';
    if (field === 'seconds') return format.hours(Number(value), true);
    if (typeof value === 'boolean') return value ? 'yes' : 'no';
    const options = field === 'rebuildId' ? rebuilds : field === 'workerId' ? workers : [];
    return options.find((option) => option.value === value)?.label ?? String(value);
  };

  if (conflict) {
    return (
      <ConflictDialog
        subject="these hours"
        fields={fieldsInWords<HoursRow>(conflict.mine as Partial<HoursRow>, conflict.now, NAMES, words)}
        onTheirs={onClose}
        onMine={() => void save(conflict.now, conflict.mine)}
      />
    );
  }
  return <HoursDialog title="Change these hours" start={formOf(hours)} {...{ rebuilds, workers, onSave, onClose }} />;
}

/** The row as it stands now; null when it is no longer on its rebuild's first page. */
async function findNow(hours: HoursRow): Promise<HoursRow | null> {
  const { rows } = await call(hoursApi.list, { query: { rebuild: hours.rebuildId, void: 'show' } });
  return rows.find((row) => row.id === hours.id) ?? null;
}
