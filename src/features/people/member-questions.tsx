import type { Member } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import { ConfirmDialog } from '../../ui/confirm-dialog.tsx';
import { notify } from '../../ui/toast.tsx';
import { usePeopleActions } from './mutations.ts';
import { lostPowers } from './roles.ts';

/** Asks before somebody is let do less than before. */
export function AskRole(props: {
  member: Member;
  role: Role;
  onAct: (member: Member, role: Role) => Promise<void>;
  onClose: () => void;
}) {
  const { member, role, onAct, onClose } = props;
  return (
    <ConfirmDialog
      title={`Make ${member.name} ${role}?`}
      note={`${member.name} is signed out and can then no longer:`}
      act={`Make ${member.name} ${role}`}
      leave={`Leave ${member.name} ${member.role}`}
      onAct={() => onAct(member, role)}
      onClose={onClose}
    >
      <ul className="grid list-disc gap-1 pl-5">
        {lostPowers(member.role, role).map((power) => (
          <li key={power}>{power.charAt(0).toLowerCase() + power.slice(1)}</li>
        ))}
      </ul>
    </ConfirmDialog>
  );
}

/** Asks before somebody is taken out of the shop. */
export function AskTakeOut({ member, onClose }: { member: Member; onClose: () => void }) {
  const { remove } = usePeopleActions();
  const onAct = async () => {
    await remove(member);
    notify(`${member.name} no longer belongs to the shop`);
  };
  return (
    <ConfirmDialog
      title={`Take ${member.name} out of the shop?`}
      note={`${member.name} is signed out and sees nothing of the shop any more. Hours and entries made by ${member.name} stay. To come back takes a new invitation.`}
      act={`Take ${member.name} out`}
      leave={`Keep ${member.name}`}
      isDanger
      onAct={onAct}
      onClose={onClose}
    />
  );
}
