import { useQueryClient } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import type { z } from 'zod';
import type { Rebuild, rebuildChangeSchema } from '#shared/contracts/rebuilds.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { fieldsInWords } from '../../lib/field-words.ts';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { notify } from '../../ui/toast.tsx';
import { tryUndo } from '../../ui/undo.ts';
import { type RebuildChange, useRebuildWrites } from './mutations.ts';
import { rebuildQuery } from './queries.ts';
import { changeOf, FIELD_NAMES } from './rebuild-form.ts';

export type SaveRebuild = (body: z.output<typeof rebuildChangeSchema>) => Promise<void>;

/**
 * Saves parts of a rebuild in place, with a way back. When someone was quicker it shows both versions: `conflict` is to
 * be drawn, `generation` changes when the forms must start from what is there. `wordOf` names an id.
 */
export function useSaveRebuild(rebuild: Rebuild, wordOf: (id: string) => string | null) {
  const format = useFormatter();
  const client = useQueryClient();
  const { change } = useRebuildWrites();
  const [clash, setClash] = useState<{ now: Rebuild; mine: RebuildChange } | null>(null);
  const [generation, setGeneration] = useState(0);

  async function write(base: Rebuild, mine: RebuildChange): Promise<void> {
    const saved = await change(base, mine);
    const back = Object.fromEntries(Object.keys(mine).map((name) => [name, base[name as keyof Rebuild]]));
    const undo = () => void tryUndo(change(saved, back).then(() => setGeneration((n) => n + 1)));
    notify('Saved', { undo });
  }

  const save: SaveRebuild = async (body) => {
    const mine = changeOf(rebuild, body);
    if (Object.keys(mine).length === 0) return;
    try {
      await write(rebuild, mine);
    } catch (problem) {
      if (!(problem instanceof ApiProblem) || problem.status !== 412) throw problem;
      const { rebuild: now } = await client.fetchQuery({ ...rebuildQuery(rebuild.id), staleTime: 0 });
      setClash({ now, mine });
    }
  };

  const words = (field: keyof Rebuild, value: unknown) => {
    if (value === null || value === undefined || value === '') return 'nothing';
    if (typeof value === 'boolean') return value ? 'yes' : 'no';
    if (String(field).endsWith('Cents')) return format.money(Number(value), 'always');
    if (String(field).endsWith('On')) return format.day(String(value));
    return (String(field).endsWith('Id') && wordOf(String(value))) || String(value);
  };

  const settle = () => {
    setClash(null);
    setGeneration((n) => n + 1);
  };
  const conflict: ReactNode = clash && (
    <ConflictDialog
      subject={rebuild.tag}
      fields={fieldsInWords<Rebuild>(clash.mine as Partial<Rebuild>, clash.now, FIELD_NAMES, words)}
      onTheirs={settle}
      onMine={() => void write(clash.now, clash.mine).then(settle)}
    />
  );
  return { save, conflict, generation };
}
