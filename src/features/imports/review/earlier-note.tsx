import { Link } from 'react-router-dom';
import type { Reading } from '#shared/contracts/import-reading.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';

/** Rows that came in with files before: they are not taken again. `to` gives the address of an import. */
export function EarlierNote({ reading, to }: { reading: Reading; to: (importId: string) => string }) {
  const format = useFormatter();
  if (reading.earlier.length === 0) return null;
  const changed = reading.earlier.reduce((sum, one) => sum + one.changedRows, 0);
  return (
    <Panel title="Part of this came in before" className="mb-6">
      <ul className="grid gap-1">
        {reading.earlier.map((one) => (
          <li key={one.importId}>
            {format.count(one.sameRows, 'row')} came in before with <Link to={to(one.importId)}>{one.fileName}</Link> on{' '}
            {format.day(one.committedAt.slice(0, 10))} and {one.sameRows === 1 ? 'is' : 'are'} not taken again
            {one.changedRows > 0 && `; ${format.number(one.changedRows)} changed since`}.
          </li>
        ))}
        <li>
          {reading.control.taken === 0
            ? 'Nothing in it is new'
            : `${format.count(reading.control.taken, 'row')} would come in now`}
          {changed > 0 && '; what shall become of the changed ones is asked below'}.
        </li>
      </ul>
    </Panel>
  );
}
