import { useSession } from '../../lib/session.ts';

/** May this person bring in books and adopt a rule? The server decides; this only spares a button that it would refuse. */
export function useMayWrite(): boolean {
  const { role } = useSession();
  return role === 'owner' || role === 'bookkeeper';
}
