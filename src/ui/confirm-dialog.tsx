import { type ReactNode, useState } from 'react';
import { Button } from './button.tsx';
import { Dialog, DialogActions } from './dialog.tsx';
import { ErrorState } from './states.tsx';

type Props = {
  title: string;
  /** What will happen, in one sentence. */
  note?: ReactNode;
  children?: ReactNode;
  /** The button that does it, in words: "Take Bea out". */
  act: string;
  /** The button that leaves things as they are. */
  leave?: string;
  isDanger?: boolean;
  onAct: () => Promise<unknown>;
  onClose: () => void;
};

/**
 * Asks before something is done. Closes when it is done; says why when it is refused. `title`, `note`, `act`, `leave`,
 * `isDanger`, `onAct`, `onClose`.
 */
export function ConfirmDialog(props: Props) {
  const { title, note, children, act, leave = 'Leave it', isDanger, onAct, onClose } = props;
  const [isBusy, setBusy] = useState(false);
  const [problem, setProblem] = useState<unknown>(null);
  const onPress = async () => {
    setBusy(true);
    try {
      await onAct();
      onClose();
    } catch (refused) {
      setProblem(refused);
    } finally {
      setBusy(false);
    }
  };
  return (
    <Dialog open onClose={onClose} title={title} note={note}>
      {children}
      {problem !== null && <ErrorState error={problem} />}
      <DialogActions>
        <Button kind={isDanger ? 'danger' : 'main'} busy={isBusy} onClick={() => void onPress()}>
          {act}
        </Button>
        <Button onClick={onClose}>{leave}</Button>
      </DialogActions>
    </Dialog>
  );
}
