import { useState } from 'react';
import { dayInZone } from '#shared/day.ts';
import type { Member } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import { useSession } from '../../lib/session.ts';
import { Button } from '../../ui/button.tsx';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { SelectField } from '../../ui/text-field.tsx';
import { AskRole, AskTakeOut } from './member-questions.tsx';
import { capital, lostPowers, ROLE_OPTIONS, roleWords } from './roles.ts';
import { useRoleChange } from './use-role-change.ts';

/** Who belongs to the shop, as what; a change that takes something away is asked about first. */
export function MembersPanel({ members }: { members: readonly Member[] }) {
  const [asking, setAsking] = useState<{ member: Member; role: Role | 'out' } | null>(null);
  const { change, conflict, dismiss } = useRoleChange();
  const onPick = (member: Member, role: Role) => {
    if (lostPowers(member.role, role).length > 0) setAsking({ member, role });
    else void change(member, role);
  };
  const columns = useColumns({ onPick, onTakeOut: (member) => setAsking({ member, role: 'out' }) });
  const close = () => setAsking(null);
  return (
    <Panel title="Members" subtitle="A new role holds at once: the person is asked to sign in again.">
      <Table caption="Members of the shop" rows={members} columns={columns} rowKey={(member) => member.userId} />
      {asking?.role === 'out' && <AskTakeOut member={asking.member} onClose={close} />}
      {asking && asking.role !== 'out' && (
        <AskRole member={asking.member} role={asking.role} onClose={close} onAct={change} />
      )}
      {conflict && (
        <ConflictDialog
          subject={`the role of ${conflict.theirs.name}`}
          fields={[{ name: 'Role', theirs: capital(conflict.theirs.role), mine: capital(conflict.mine) }]}
          onMine={() => void change(conflict.theirs, conflict.mine)}
          onTheirs={dismiss}
        />
      )}
    </Panel>
  );
}

type Acts = { onPick: (member: Member, role: Role) => void; onTakeOut: (member: Member) => void };

function useColumns({ onPick, onTakeOut }: Acts): Column<Member>[] {
  const format = useFormatter();
  const { user, shop } = useSession();
  return [
    {
      id: 'name',
      header: 'Name',
      heads: true,
      width: 'min-w-[10rem]',
      cell: ({ name, email }) => (
        <>
          <span className="block font-[640]">{name}</span>
          <span className="break-all text-label text-soft">{email}</span>
        </>
      ),
    },
    {
      id: 'role',
      header: 'Role',
      width: 'min-w-[15rem]',
      cell: (member) => <RoleCell member={member} isSelf={member.userId === user.id} onPick={onPick} />,
    },
    {
      id: 'joined',
      header: 'Joined',
      width: 'whitespace-nowrap',
      cell: ({ joinedAt }) => format.day(dayInZone(new Date(joinedAt), shop.timeZone)),
    },
    {
      id: 'acts',
      header: <span className="sr-only">Take out</span>,
      cell: (member) =>
        member.userId !== user.id && (
          <Button size="small" aria-label={`Take ${member.name} out`} onClick={() => onTakeOut(member)}>
            Take out
          </Button>
        ),
    },
  ];
}

/** One's own role is another owner's to change, so that nobody locks themselves out by a slip. */
function RoleCell({ member, isSelf, onPick }: { member: Member; isSelf: boolean; onPick: Acts['onPick'] }) {
  const words = `${capital(roleWords(member.role))}.`;
  if (isSelf)
    return (
      <>
        <span className="block font-[640]">{capital(member.role)}, that is you</span>
        <span className="text-label text-soft">{words}</span>
      </>
    );
  return (
    <SelectField
      label={`Role of ${member.name}`}
      hideLabel
      hint={words}
      options={ROLE_OPTIONS}
      value={member.role}
      onChange={(event) => onPick(member, event.target.value as Role)}
    />
  );
}
