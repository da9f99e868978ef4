import { useQueryClient } from '@tanstack/react-query';
import { SignInForm } from './sign-in-form.tsx';
import { Dialog } from '../ui/dialog.tsx';

/** Signs in again over the page, so that nothing typed on it is lost. */
export function SessionEnded({ email, onDone }: { email: string; onDone: () => void }) {
  const client = useQueryClient();
  const onSignedIn = async () => {
    onDone();
    await client.invalidateQueries();
  };
  return (
    <Dialog
      open
      stay
      onClose={onDone}
      title="Your session ended"
      note="Sign in to go on where you were. What you typed is still there; save it again after."
    >
      <SignInForm email={email} onSignedIn={onSignedIn} />
    </Dialog>
  );
}
