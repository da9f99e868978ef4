import { useRef } from 'react';
import type { Worker } from '#shared/contracts/shop.ts';
import { Button } from '../../ui/button.tsx';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { AddWord } from './add-word.tsx';
import { conflictFields } from './conflict-fields.ts';
import { useAddWorker, useWorkerEdit } from './mutations.ts';
import { useListActs } from './use-list-acts.ts';
import { WordRow } from './word-row.tsx';
import { WordsFrame } from './words-frame.tsx';

/** Everybody whose hours are kept, signed in or not, and whether those hours are paid. */
export function WorkersPanel({ workers, canEdit }: { workers: readonly Worker[]; canEdit: boolean }) {
  const { edit, conflict, dismiss } = useWorkerEdit();
  const { save, act } = useListActs({ edit });
  const add = useAddWorker();
  const list = useRef<HTMLUListElement>(null);
  const onRename = (worker: Worker) => (name: string) =>
    save(worker, { name }, { said: `${worker.name} is now ${name}`, back: { name: worker.name } });
  const onPaid = (worker: Worker) => {
    const said = `${worker.name}'s hours count as ${worker.isPaid ? 'unpaid' : 'paid'}`;
    return act(worker, { isPaid: !worker.isPaid }, { said, back: { isPaid: worker.isPaid } });
  };
  const onRetire = async (worker: Worker) => {
    await act(worker, { isRetired: true }, { said: `${worker.name} retired`, back: { isRetired: false } });
    list.current?.focus();
  };
  const onBringBack = (worker: Worker) =>
    act(worker, { isRetired: false }, { said: `${worker.name} is offered again`, back: { isRetired: true } });
  return (
    <WordsFrame
      title="Workers"
      subtitle="Everybody whose hours are kept. Paid hours are in the costs already; per hour counts the unpaid ones."
      items={workers}
      listRef={list}
      empty="Nobody: hours can be kept only by their totals."
      row={(worker: Worker) => (
        <WordRow
          key={worker.id}
          name={worker.name}
          note={`${worker.isPaid ? 'Paid' : 'Unpaid'}${worker.userId ? ', signs in' : ''}`}
          onRename={canEdit ? onRename(worker) : undefined}
          acts={
            canEdit && (
              <>
                <Button
                  kind="plain"
                  size="small"
                  aria-label={`Make ${worker.isPaid ? 'unpaid' : 'paid'}: ${worker.name}`}
                  onClick={() => void onPaid(worker)}
                >
                  {worker.isPaid ? 'Make unpaid' : 'Make paid'}
                </Button>
                <Button
                  kind="plain"
                  size="small"
                  aria-label={`Retire ${worker.name}`}
                  onClick={() => void onRetire(worker)}
                >
                  Retire
                </Button>
              </>
            )
          }
        />
      )}
      retiredRow={(worker: Worker) => (
        <WordRow
          key={worker.id}
          name={worker.name}
          acts={
            canEdit && (
              <Button
                kind="plain"
                size="small"
                aria-label={`Bring ${worker.name} back`}
                onClick={() => void onBringBack(worker)}
              >
                Bring back
              </Button>
            )
          }
        />
      )}
    >
      {canEdit && (
        <AddWord label="New worker's name" maxLength={80} flag="Paid" onAdd={(name, isPaid) => add({ name, isPaid })} />
      )}
      {conflict && (
        <ConflictDialog
          subject={conflict.theirs.name}
          fields={conflictFields(conflict.mine, conflict.theirs)}
          onMine={() => void act(conflict.theirs, conflict.mine, { said: `Yours stands on ${conflict.theirs.name}` })}
          onTheirs={dismiss}
        />
      )}
    </WordsFrame>
  );
}
