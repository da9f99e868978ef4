import { Button } from '../ui/button.tsx';
import { Dialog, DialogActions } from '../ui/dialog.tsx';

/** Something typed would be lost: stay, or leave all the same. */
export function LeaveDialog({ onLeave, onStay }: { onLeave: () => void; onStay: () => void }) {
  return (
    <Dialog
      open
      onClose={onStay}
      title="Leave without saving?"
      note="Something that you typed here is not saved yet. If you leave now, it is gone."
    >
      <DialogActions>
        <Button kind="main" onClick={onStay}>
          Stay here
        </Button>
        <Button kind="danger" onClick={onLeave}>
          Leave
        </Button>
      </DialogActions>
    </Dialog>
  );
}
