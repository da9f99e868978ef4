import { useMutation, useQuery } from '@tanstack/react-query';
import { type FormEvent, useState } from 'react';
import type { OwnHours } from '#shared/contracts/hours.ts';
import { hoursToText, parseHours } from '../../lib/hours-text.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { EmptyState, ErrorState, LoadingState } from '../../ui/states.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { notify } from '../../ui/toast.tsx';
import { VoidDialog } from '../../ui/void-dialog.tsx';
import { useOwnHoursWrites } from './mutations.ts';
import { ownHoursQuery } from './queries.ts';

/** How many stand there before older ones are asked for. */
const FIRST = 8;

/** A person's own latest hours; those logged today can be changed or voided. */
export function OwnHoursList() {
  const format = useFormatter();
  const hours = useQuery(ownHoursQuery());
  const [open, setOpen] = useState<{ kind: 'change' | 'void'; row: OwnHours } | null>(null);
  const [isWhole, setWhole] = useState(false);
  if (hours.isPending) return <LoadingState label="Loading your hours" lines={3} />;
  if (hours.isError) return <ErrorState error={hours.error} onRetry={() => void hours.refetch()} />;
  if (hours.data.length === 0)
    return <EmptyState title="Your hours will stand here">Log the first ones above.</EmptyState>;
  return (
    <>
      <ul className="grid">
        {(isWhole ? hours.data : hours.data.slice(0, FIRST)).map((row) => (
          <li key={row.id} className="own-hours">
            <span className="min-w-0">
              <span className="font-[640]">
                {row.rebuildTag}
                {row.task && ` · ${row.task}`}
              </span>
              <span className="block text-soft">{row.workedOn ? format.day(row.workedOn) : 'no day'}</span>
            </span>
            <span className="flex items-center gap-2">
              <span className="text-lead font-[660] tabular-nums">{format.hours(row.seconds)} h</span>
              {row.canChange && (
                <>
                  <Button onClick={() => setOpen({ kind: 'change', row })} className="touch">
                    Change
                  </Button>
                  <Button onClick={() => setOpen({ kind: 'void', row })} className="touch">
                    Void
                  </Button>
                </>
              )}
            </span>
          </li>
        ))}
      </ul>
      {!isWhole && hours.data.length > FIRST && (
        <Button className="touch justify-self-start" onClick={() => setWhole(true)}>
          Show older ones
        </Button>
      )}
      {open?.kind === 'change' && <ChangeLength row={open.row} onClose={() => setOpen(null)} />}
      {open?.kind === 'void' && <VoidOwn row={open.row} onClose={() => setOpen(null)} />}
    </>
  );
}

function ChangeLength({ row, onClose }: { row: OwnHours; onClose: () => void }) {
  const { changeMine } = useOwnHoursWrites();
  const [text, setText] = useState(hoursToText(row.seconds));
  const [fault, setFault] = useState<string>();
  const { mutate, isPending, error } = useMutation({
    mutationFn: (seconds: number) => changeMine(row, { seconds }),
    onSuccess: () => {
      notify('Hours changed');
      onClose();
    },
  });
  const onSubmit = (event: FormEvent) => {
    event.preventDefault();
    const seconds = parseHours(text);
    setFault(seconds ? undefined : 'Type how long: 3.5 or 3:30.');
    if (seconds) mutate(seconds);
  };
  return (
    <Dialog open onClose={onClose} title={`Hours on ${row.rebuildTag}`}>
      <form onSubmit={onSubmit} noValidate className="grid gap-4">
        <TextField
          label="How long"
          className="tall-field"
          value={text}
          inputMode="decimal"
          onChange={(event) => setText(event.target.value)}
          error={fault ?? error?.message}
        />
        <DialogActions>
          <Button kind="main" size="large" type="submit" busy={isPending}>
            Save
          </Button>
          <Button size="large" onClick={onClose}>
            Cancel
          </Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

function VoidOwn({ row, onClose }: { row: OwnHours; onClose: () => void }) {
  const { voidMine } = useOwnHoursWrites();
  const { mutate, isPending, error } = useMutation({
    mutationFn: (reason: string) => voidMine(row, reason),
    onSuccess: () => {
      notify('Hours void');
      onClose();
    },
  });
  return (
    <VoidDialog
      what={`your hours on ${row.rebuildTag}`}
      busy={isPending}
      error={error?.message}
      onVoid={mutate}
      onClose={onClose}
    />
  );
}
