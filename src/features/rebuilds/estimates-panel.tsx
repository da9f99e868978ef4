import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import type { z } from 'zod';
import type { Estimate, estimateFieldsSchema } from '#shared/contracts/estimates.ts';
import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { Days, Hours, Money } from '../../ui/figures.tsx';
import type { Option } from '../../ui/text-field.tsx';
import { Table } from '../../ui/table.tsx';
import { notify } from '../../ui/toast.tsx';
import { EstimateDialog } from './estimate-dialog.tsx';
import { estimateName, estimateTotal } from './estimate-form.ts';
import { useRebuildWrites } from './mutations.ts';

type Props = { detail: RebuildDetail; categories: readonly Option[]; canWrite: boolean };

/** The plan and its revisions: made, locked, revised beside. */
export function EstimatesPanel({ detail, categories, canWrite }: Props) {
  const { estimates, rebuild } = detail;
  const writes = useRebuildWrites();
  const [isEditing, setEditing] = useState(false);
  const [locking, setLocking] = useState<Estimate | null>(null);
  const [key, setKey] = useState(newIdempotencyKey);
  const last = estimates.at(-1) ?? null;
  const open = last && last.lockedAt === null ? last : null;
  const isLate = open?.revision === 0 && rebuild.startedOn !== null;
  const title = open ? estimateName(open) : estimates.length === 0 ? 'The plan' : `Revision ${estimates.length}`;

  const onSave = async (body: z.output<typeof estimateFieldsSchema>) => {
    if (open) await writes.changeEstimate(open, body);
    else await writes.addEstimate(rebuild.id, body, key);
    setKey(newIdempotencyKey());
    setEditing(false);
    notify(`${title} saved`);
  };

  return (
    <div className="grid justify-items-start gap-4">
      {isLate && canWrite && (
        <p className="caution-note w-full">
          Work has started and the plan is not locked. Lock it, so that overruns are against what was planned and not
          against what is known since.
        </p>
      )}
      {estimates.length > 0 && <EstimateTable estimates={estimates} />}
      {canWrite && (
        <div className="flex flex-wrap gap-3">
          <Button kind={estimates.length === 0 ? 'main' : 'quiet'} onClick={() => setEditing(true)}>
            {open
              ? `Change ${estimateName(open).toLowerCase()}`
              : estimates.length === 0
                ? 'Make the plan'
                : 'Add a revision'}
          </Button>
          {open && (
            <Button kind={isLate ? 'main' : 'quiet'} onClick={() => setLocking(open)}>
              Lock {estimateName(open).toLowerCase()}
            </Button>
          )}
        </div>
      )}
      {isEditing && (
        <EstimateDialog
          title={title}
          note={
            estimates.length === 0 || open?.revision === 0
              ? 'What you expect to spend, before work starts. Leave empty what you do not plan for.'
              : 'Stands beside the locked plan; overruns stay against the plan.'
          }
          start={last}
          categories={categories}
          onSave={onSave}
          onClose={() => setEditing(false)}
        />
      )}
      {locking && <LockDialog estimate={locking} onClose={() => setLocking(null)} />}
    </div>
  );
}

function EstimateTable({ estimates }: { estimates: readonly Estimate[] }) {
  return (
    <Table
      caption="Estimates"
      rows={estimates}
      rowKey={(estimate) => estimate.id}
      columns={[
        { id: 'name', header: 'Estimate', heads: true, cell: (estimate) => estimateName(estimate) },
        {
          id: 'state',
          header: 'State',
          under: 'phone',
          bare: true,
          cell: (estimate) =>
            estimate.lockedAt === null ? 'Open' : estimate.isBaseline ? 'Locked: overruns are against it' : 'Locked',
        },
        { id: 'total', header: 'In all', number: true, cell: (estimate) => <Money cents={estimateTotal(estimate)} /> },
        { id: 'hours', header: 'Hours', number: true, cell: (estimate) => <Hours seconds={estimate.plannedSeconds} /> },
        {
          id: 'sale',
          header: 'Sale expected',
          under: 'phone',
          number: true,
          cell: (estimate) => <Money cents={estimate.expectedSaleCents} />,
        },
        {
          id: 'days',
          header: 'Days expected',
          under: 'phone',
          number: true,
          cell: (estimate) => <Days days={estimate.expectedDays} />,
        },
      ]}
    />
  );
}

function LockDialog({ estimate, onClose }: { estimate: Estimate; onClose: () => void }) {
  const { lockEstimate } = useRebuildWrites();
  const { mutate, isPending, error } = useMutation({
    mutationFn: () => lockEstimate(estimate),
    onSuccess: () => {
      notify(`${estimateName(estimate)} is locked`);
      onClose();
    },
  });
  const name = estimateName(estimate).toLowerCase();
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Lock ${name}?`}
      note="A locked estimate cannot change any more; what comes later goes beside it. Every overrun is against the locked plan."
    >
      <ErrorSummary message={error?.message} />
      <DialogActions>
        <Button kind="main" onClick={() => mutate()} busy={isPending}>
          Lock it
        </Button>
        <Button onClick={onClose}>Not yet</Button>
      </DialogActions>
    </Dialog>
  );
}
