import type { Member } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { notify } from '../../ui/toast.tsx';
import { useRoleEdit } from './mutations.ts';

/** Changes a role and says so, with a way back. A refusal is said too; a conflict is left to the page. */
export function useRoleChange() {
  const { edit, conflict, dismiss } = useRoleEdit();
  const change = async (member: Member, role: Role): Promise<void> => {
    try {
      const after = await edit(member, role);
      if (after) notify(`${member.name} is now ${role}`, { undo: () => void change(after, member.role) });
    } catch (refused) {
      if (!(refused instanceof ApiProblem)) throw refused;
      notify(refused.message, { wrong: true });
    }
  };
  return { change, conflict, dismiss };
}
