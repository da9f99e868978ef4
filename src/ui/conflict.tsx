import type { ReactNode } from 'react';
import { Button } from './button.tsx';
import { Dialog, DialogActions } from './dialog.tsx';
import { Table } from './table.tsx';

export type ConflictField = { name: string; theirs: ReactNode; mine: ReactNode };

type Props = {
  /** What was being saved: "B-062". */
  subject: string;
  fields: readonly ConflictField[];
  onTheirs: () => void;
  onMine: () => void;
  busy?: boolean;
};

/** Someone saved first: both versions beside each other, and the choice. `subject`, `fields` (name, theirs, mine), `onTheirs`, `onMine`. */
export function ConflictDialog({ subject, fields, onTheirs, onMine, busy = false }: Props) {
  return (
    <Dialog
      open
      stay
      onClose={onTheirs}
      title={`Someone changed ${subject} meanwhile`}
      note="Nothing of yours is saved yet. Look at both, then choose."
    >
      <Table
        caption="Both versions"
        rows={fields}
        rowKey={(field) => field.name}
        columns={[
          { id: 'name', header: 'Field', heads: true, cell: (field) => field.name },
          { id: 'theirs', header: 'There now', cell: (field) => field.theirs },
          { id: 'mine', header: 'Yours', cell: (field) => field.mine },
        ]}
      />
      <DialogActions>
        <Button kind="main" onClick={onMine} busy={busy}>
          Save mine over it
        </Button>
        <Button onClick={onTheirs}>Keep what is there</Button>
      </DialogActions>
    </Dialog>
  );
}
