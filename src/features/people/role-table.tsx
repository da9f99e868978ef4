import { ROLES } from '#shared/vocabulary.ts';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { capital } from '../../lib/capital.ts';
import { POWERS } from './roles.ts';

type Power = (typeof POWERS)[number];

const COLUMNS: readonly Column<Power>[] = [
  { id: 'does', header: 'May', cell: ({ does }) => does, heads: true, width: 'min-w-[12rem]' },
  ...ROLES.map((role) => ({
    id: role,
    header: capital(role),
    cell: ({ roles }: Power) => (roles.includes(role) ? 'yes' : <span className="text-soft">no</span>),
  })),
];

/** What each role may do. */
export function RoleTable() {
  return (
    <Panel
      title="What each role may do"
      subtitle="A partner reads only the rebuilds they put money in; those pages come later, so a partner sees no books yet."
    >
      <Table caption="What each role may do" rows={POWERS} columns={COLUMNS} rowKey={({ does }) => does} />
    </Panel>
  );
}
