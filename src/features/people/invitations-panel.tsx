import { dayInZone } from '#shared/day.ts';
import type { Invitation } from '#shared/contracts/people.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { useSession } from '../../lib/session.ts';
import { Button } from '../../ui/button.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { notify } from '../../ui/toast.tsx';
import { usePeopleActions } from './mutations.ts';
import { capital } from './roles.ts';

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
  const columns: Column<Invitation>[] = [
    { id: 'email', header: 'Invited', heads: true, cell: ({ email }) => <span className="break-all">{email}</span> },
    { id: 'role', header: 'As', cell: ({ role }) => capital(role) },
    {
      id: 'expires',
      header: 'Link works until',
      width: 'whitespace-nowrap',
      cell: ({ expiresAt }) => format.day(dayInZone(new Date(expiresAt), timeZone)),
    },
    {
      id: 'acts',
      header: <span className="sr-only">Withdraw</span>,
      cell: (invitation) => (
        <Button
          size="small"
          aria-label={`Withdraw the invitation of ${invitation.email}`}
          onClick={() => void onWithdraw(invitation)}
        >
          Withdraw
        </Button>
      ),
    },
  ];
  return (
    <Panel title="Open invitations" subtitle="A link lost or sent astray: withdraw it and invite again.">
      {invitations.length === 0 ? (
        <p className="text-soft">None. Who is invited and has not joined yet stands here.</p>
      ) : (
        <Table caption="Open invitations" rows={invitations} columns={columns} rowKey={(one) => one.id} />
      )}
    </Panel>
  );
}
