import { useQueryClient } from '@tanstack/react-query';
import { ApiProblem } from '../lib/api-problem.ts';
import { moveSession } from '../lib/session.ts';
import { Dialog } from '../ui/dialog.tsx';
import { SignInForm } from './sign-in-form.tsx';

/** Signs in again over the page, so that nothing typed on it is lost. */
export function SessionEnded(props: { email: string; shopId: string; onDone: () => void }) {
  const { email, shopId, onDone } = props;
  const client = useQueryClient();
  const onSignedIn = async () => {
    // A new session may start in another shop; move it first, or the page would be taken away.
    const isMember = await moveSession(shopId).then(
      () => true,
      (refused: unknown) => {
        if (refused instanceof ApiProblem && refused.status === 404) return false;
        throw refused;
      },
    );
    // Taken out of this shop meanwhile: what stands here cannot be saved any more.
    if (!isMember) return location.assign('/');
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
