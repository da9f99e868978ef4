import { Link } from 'react-router-dom';
import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis, Past } from '#shared/contracts/bids-basis.ts';
import { type Similar, similarRebuilds, type Trait } from '#shared/measures/similar.ts';
import { Days, Hours, Money } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { cutWords } from './words.ts';

type Props = { sheet: BidFields; planCents: number; basis: BidBasis; shopId: string };

/** The three past rebuilds most like this one, and what came of them. */
export function Nearest({ sheet, planCents, basis, shopId }: Props) {
  const format = useFormatter();
  const { classId, damageId, isSeen } = sheet;
  const rows = similarRebuilds(basis.past, { classId, damageId, isSeen, planCents });
  if (rows.length === 0) return null;
  return (
    <Panel
      title="The nearest past rebuilds"
      subtitle={`By what they have in common, then by the size of the plan.${cutWords(basis, format)}`}
    >
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
        <span className="block text-label text-soft">{commonWords(inCommon, rebuild.isSeen)}</span>
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

/** `same damage and class, also not seen`. */
function commonWords(inCommon: readonly Trait[], isSeen: boolean | null): string {
  const same = inCommon.filter((trait) => trait !== 'seen').join(' and ');
  const seen = inCommon.includes('seen') ? `also ${isSeen ? 'seen' : 'not seen'}` : '';
  return [same && `same ${same}`, seen].filter(Boolean).join(', ') || 'little in common';
}
