import { useState } from 'react';
import { dayInZone } from '#shared/day.ts';
import type { Member } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import { useSession } from '../../lib/session.ts';
import { Button } from '../../ui/button.tsx';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { SelectField } from '../../ui/text-field.tsx';
import { AskRole, AskTakeOut } from './member-questions.tsx';
import { capital } from '../../lib/capital.ts';
import { lostPowers, ROLE_OPTIONS, roleWords } from './roles.ts';
import { useRoleChange } from './use-role-change.ts';

/** Who belongs to the shop, as what; a change that takes something away is asked about first. */
export function MembersPanel({ members }: { members: readonly Member[] }) {
  const [asking, setAsking] = useState<{ member: Member; role: Role | 'out' } | null>(null);
  const { change, conflict, dismiss } = useRoleChange();
  const onPick = (member: Member, role: Role) => {
    if (lostPowers(member.role, role).length > 0) setAsking({ member, role });
    else void change(member, role);
  };
  const close = () => setAsking(null);
  return (
    <Panel title="Members" subtitle="A new role holds at once: the person is asked to sign in again.">
      <ul aria-label="Members" className="border-t border-ink">
        {members.map((member) => (
          <MemberRow
            key={member.userId}
            member={member}
            onPick={(role) => onPick(member, role)}
            onTakeOut={() => setAsking({ member, role: 'out' })}
          />
        ))}
      </ul>
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

type RowProps = { member: Member; onPick: (role: Role) => void; onTakeOut: () => void };

function MemberRow({ member, onPick, onTakeOut }: RowProps) {
  const format = useFormatter();
  const { user, shop } = useSession();
  const { name, email, joinedAt, userId } = member;
  const isSelf = userId === user.id;
  return (
    <li className="grid items-start gap-x-6 gap-y-2 border-b border-hair py-3 sm:grid-cols-[minmax(0,1fr)_minmax(0,1.3fr)_5rem]">
      <div>
        <div className="font-[640]">{name}</div>
        <div className="text-label break-words text-soft">{email}</div>
        <div className="text-label text-soft">Joined {format.day(dayInZone(new Date(joinedAt), shop.timeZone))}</div>
      </div>
      <MemberRole member={member} isSelf={isSelf} onPick={onPick} />
      {!isSelf && (
        <div className="sm:text-right">
          <Button
            size="small"
            aria-label={`Take out ${name}`}
            onClick={onTakeOut}
            className="min-h-10 whitespace-nowrap"
          >
            Take out
          </Button>
        </div>
      )}
    </li>
  );
}

/** One's own role is another owner's to change, so that nobody locks themselves out by a slip. */
function MemberRole({ member, isSelf, onPick }: Omit<RowProps, 'onTakeOut'> & { isSelf: boolean }) {
  const words = `${capital(roleWords(member.role))}.`;
  if (isSelf)
    return (
      <div>
        <div className="font-[640]">{capital(member.role)}, that is you</div>
        <div className="text-label text-soft">{words}</div>
      </div>
    );
  return (
    <SelectField
      label={`Role of ${member.name}`}
      hideLabel
      hint={words}
      options={ROLE_OPTIONS}
      value={member.role}
      onChange={(event) => onPick(event.target.value as Role)}
    />
  );
}
