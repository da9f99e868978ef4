import { Link } from 'react-router-dom';
import { unbroken } from '../../lib/unbroken.ts';
import { exitsOf, useAddress } from './address.ts';

/**
 * What an old sheet, which holds only what was sold, would have said; and the switch that counts the whole page so. The
 * switch stands in the address and is never on by itself.
 */
export function OldSheetLine({ says }: { says: string | null }) {
  const { search } = useAddress();
  const next = new URLSearchParams(search);
  if (exitsOf(search) === 'sold') {
    next.delete('exits');
    return (
      <p role="status" className="max-w-[58rem] border-l-4 border-zinc pl-4 text-lead">
        Counted as an old sheet would: sold ones only, whatever left otherwise or waits unsold is missing.{' '}
        <Link to={`?${next}`}>Count every rebuild</Link>
      </p>
    );
  }
  if (says === null) return null;
  next.set('exits', 'sold');
  return (
    <p className="max-w-[58rem] text-lead text-soft">
      {unbroken(says)} <Link to={`?${next}`}>Count this page so</Link>
    </p>
  );
}
