import { Link } from 'react-router-dom';
import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis, Past } from '#shared/contracts/bids-basis.ts';
import { type Similar, similarRebuilds, type Trait } from '#shared/measures/similar.ts';
import { Days, Hours, Money } from '../../ui/figures.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';

type Props = { sheet: BidFields; planCents: number; basis: BidBasis; shopId: string };

const IN_COMMON: Readonly<Record<Trait, string>> = { seen: 'seen or not', damage: 'damage', class: 'class' };

/** The three past rebuilds most like this one, and what came of them. */
export function Nearest({ sheet, planCents, basis, shopId }: Props) {
  const { classId, damageId, isSeen } = sheet;
  const rows = similarRebuilds(basis.past, { classId, damageId, isSeen, planCents });
  if (rows.length === 0) return null;
  return (
    <Panel title="The nearest past rebuilds" subtitle="By what they have in common, then by the size of the plan.">
      <Table
        caption="The nearest past rebuilds"
        rows={rows}
        columns={columns(shopId)}
        rowKey={(row) => row.rebuild.id}
      />
    </Panel>
  );
}

const columns = (shopId: string): readonly Column<Similar<Past>>[] => [
  {
    id: 'tag',
    header: 'Rebuild',
    heads: true,
    cell: ({ rebuild, inCommon }) => (
      <>
        <Link to={`/s/${shopId}/rebuilds/${rebuild.id}`}>{rebuild.tag}</Link> {rebuild.name}
        <span className="block text-label text-soft">
          {inCommon.length === 0 ? 'little in common' : `same ${inCommon.map((trait) => IN_COMMON[trait]).join(', ')}`}
        </span>
      </>
    ),
  },
  {
    id: 'plan',
    header: 'Planned',
    number: true,
    under: 'phone',
    cell: ({ rebuild }) => <Money cents={rebuild.estimateCents} />,
  },
  {
    id: 'came',
    header: 'Came to',
    number: true,
    under: 'phone',
    cell: ({ rebuild }) => <Money cents={rebuild.actualCents} />,
  },
  {
    id: 'hours',
    header: 'Hours',
    number: true,
    under: 'phone',
    cell: ({ rebuild }) => <Hours seconds={rebuild.actualSeconds} />,
  },
  { id: 'days', header: 'Days', number: true, under: 'phone', cell: ({ rebuild }) => <Days days={rebuild.daysHeld} /> },
  { id: 'kept', header: 'Kept', number: true, cell: ({ rebuild }) => <Money cents={rebuild.keptCents} tone="kept" /> },
];
