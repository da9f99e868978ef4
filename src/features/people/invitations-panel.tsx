import { dayInZone } from '#shared/day.ts';
import type { Invitation } from '#shared/contracts/people.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { useSession } from '../../lib/session.ts';
import { Button } from '../../ui/button.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { notify } from '../../ui/toast.tsx';
import { usePeopleActions } from './mutations.ts';

/** Invitations that are still good, until when, and a way to make their links useless. */
export function InvitationsPanel({ invitations }: { invitations: readonly Invitation[] }) {
  const format = useFormatter();
  const { timeZone } = useSession().shop;
  const { withdraw } = usePeopleActions();
  const onWithdraw = async (invitation: Invitation) => {
    try {
      await withdraw(invitation);
      notify(`The link for ${invitation.email} no longer works`);
    } catch (refused) {
      if (!(refused instanceof ApiProblem)) throw refused;
      notify(refused.message, { wrong: true });
    }
  };
  return (
    <Panel title="Open invitations" subtitle="A link lost or sent astray: withdraw it and invite again.">
      {invitations.length === 0 ? (
        <p className="text-soft">None. Who is invited and has not joined yet stands here.</p>
      ) : (
        <ul aria-label="Open invitations" className="border-t border-ink">
          {invitations.map((invitation) => (
            <li
              key={invitation.id}
              className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-hair py-2"
            >
              <div className="min-w-0">
                <div className="break-words">{invitation.email}</div>
                <div className="text-label text-soft">
                  As {invitation.role}; the link works until{' '}
                  {format.day(dayInZone(new Date(invitation.expiresAt), timeZone))}
                </div>
              </div>
              <Button
                size="small"
                aria-label={`Withdraw the invitation of ${invitation.email}`}
                onClick={() => void onWithdraw(invitation)}
              >
                Withdraw
              </Button>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}
