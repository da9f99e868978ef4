import { useRef, useState } from 'react';
import { dayInZone } from '#shared/day.ts';
import type { Invitation } from '#shared/contracts/people.ts';
import { useSession } from '../../lib/session.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { TextField } from '../../ui/text-field.tsx';

type Props = { invitation: Invitation & { token: string }; onClose: () => void };

/** The link of a new invitation. Only its trace is kept on the server, so it is shown this one time. */
export function InvitationLink({ invitation, onClose }: Props) {
  const format = useFormatter();
  const { timeZone } = useSession().shop;
  const field = useRef<HTMLInputElement>(null);
  const [told, setTold] = useState('');
  const link = `${window.location.origin}/join/${invitation.token}`;
  const onCopy = async () => {
    field.current?.select();
    try {
      await navigator.clipboard.writeText(link);
      setTold('Copied.');
    } catch {
      // Without https, or when the browser forbids it, the marked text is still one keystroke from the clipboard.
      setTold('The link is marked: copy it with Ctrl C or ⌘ C.');
    }
  };
  const until = format.day(dayInZone(new Date(invitation.expiresAt), timeZone));
  return (
    <Dialog
      open
      stay
      onClose={onClose}
      title={`The link for ${invitation.email}`}
      note={`Mail comes later: copy the link and send it yourself. It is shown only now, lets one person in as ${invitation.role}, and works until ${until}.`}
    >
      <TextField label="Link" value={link} readOnly ref={field} onFocus={(event) => event.target.select()} />
      <DialogActions>
        <Button kind="main" onClick={() => void onCopy()}>
          Copy the link
        </Button>
        <Button onClick={onClose}>Done</Button>
      </DialogActions>
      <p role="status" className="min-h-6 font-[640]">
        {told}
      </p>
    </Dialog>
  );
}
