import { type FormEvent, useState } from 'react';
import { Button } from './button.tsx';
import { Dialog, DialogActions } from './dialog.tsx';
import { TextField } from './text-field.tsx';

type Props = {
  /** What is to be voided, in words. */
  what: string;
  note?: string | undefined;
  busy: boolean;
  /** Why it was refused; shown at the reason. */
  error?: string | undefined;
  onVoid: (reason: string) => void;
  onClose: () => void;
};

/** Asks why something is void: nothing in the books is deleted. `what`, `note`, `busy`, `error`, `onVoid(reason)`, `onClose`. */
export function VoidDialog({ what, note, busy, error, onVoid, onClose }: Props) {
  const [reason, setReason] = useState('');
  const [isBlank, setBlank] = useState(false);
  const onSubmit = (event: FormEvent) => {
    event.preventDefault();
    setBlank(reason.trim() === '');
    if (reason.trim() !== '') onVoid(reason.trim());
  };
  return (
    <Dialog
      open
      onClose={onClose}
      title={`Void ${what}?`}
      note={note ?? 'It stays in the books, struck through, and leaves every sum.'}
    >
      <form onSubmit={onSubmit} className="grid gap-4" noValidate>
        <TextField
          label="Why"
          value={reason}
          maxLength={300}
          onChange={(event) => setReason(event.target.value)}
          error={isBlank ? 'Say why, so that it can be followed later.' : error}
        />
        <DialogActions>
          <Button kind="danger" type="submit" busy={busy}>
            Void it
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
