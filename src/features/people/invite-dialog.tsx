import { useState } from 'react';
import type { Role } from '#shared/vocabulary.ts';
import { usePlainForm } from '../../lib/use-plain-form.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { SelectField, TextField } from '../../ui/text-field.tsx';
import { InvitationLink } from './invitation-link.tsx';
import { usePeopleActions } from './mutations.ts';
import { capital } from '../../lib/capital.ts';
import { ROLE_OPTIONS, roleWords } from './roles.ts';

type Made = Awaited<ReturnType<ReturnType<typeof usePeopleActions>['invite']>>;

/** Invites someone by address and role; then shows the link, once. It stays open until it is closed on purpose. */
export function InviteDialog({ onClose }: { onClose: () => void }) {
  const [made, setMade] = useState<Made | null>(null);
  if (made) return <InvitationLink invitation={made} onClose={onClose} />;
  return (
    <Dialog open stay onClose={onClose} title="Invite someone" note="They join by a link that works once.">
      <InviteForm onMade={setMade} onClose={onClose} />
    </Dialog>
  );
}

function InviteForm({ onMade, onClose }: { onMade: (made: Made) => void; onClose: () => void }) {
  const [role, setRole] = useState<Role>('bookkeeper');
  const { invite } = usePeopleActions();
  const { onSubmit, isBusy, errors, message } = usePlainForm({
    names: ['email', 'role'],
    check: ({ email }) => (email.includes('@') ? {} : { email: 'Give an e-mail address.' }),
    save: async ({ email }) => onMade(await invite({ email, role })),
  });
  return (
    <form onSubmit={onSubmit} noValidate className="grid gap-4">
      <TextField
        label="Their email"
        name="email"
        type="email"
        autoComplete="off"
        maxLength={254}
        error={errors.email}
        hint="Who joins by the link signs in with this address."
      />
      <SelectField
        label="Role"
        name="role"
        options={ROLE_OPTIONS}
        value={role}
        onChange={(event) => setRole(event.target.value as Role)}
        hint={`${capital(roleWords(role))}.`}
        error={errors.role}
      />
      <ErrorSummary message={message} />
      <DialogActions>
        <Button kind="main" type="submit" busy={isBusy}>
          Make the link
        </Button>
        <Button onClick={onClose}>Cancel</Button>
      </DialogActions>
    </form>
  );
}
