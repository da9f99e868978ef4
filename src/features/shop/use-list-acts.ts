import { ApiProblem } from '../../lib/api-problem.ts';
import type { useVersionedEdit } from '../../lib/use-versioned-edit.ts';
import { notify } from '../../ui/toast.tsx';

type Editing<T, Change> = Pick<ReturnType<typeof useVersionedEdit<T, Change>>, 'edit'>;
type Said<Change> = { said: string; back?: Change };

/** What rows of a list do: each change is said, with a way back where there is one. */
export function useListActs<T, Change>({ edit }: Editing<T, Change>) {
  /** For a field: a refusal is thrown, to be shown there. */
  const save = async (item: T, change: Change, { said, back }: Said<Change>): Promise<void> => {
    const after = await edit(item, change);
    if (after) notify(said, back ? { undo: () => void act(after, back, { said: 'As before' }) } : {});
  };
  /** For a button: a refusal is said. */
  const act = async (item: T, change: Change, told: Said<Change>): Promise<void> => {
    try {
      await save(item, change, told);
    } catch (refused) {
      if (!(refused instanceof ApiProblem)) throw refused;
      notify(refused.message, { wrong: true });
    }
  };
  return { save, act };
}
