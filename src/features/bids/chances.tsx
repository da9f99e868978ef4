import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import type { Formatter } from '#shared/formatter.ts';
import { unbroken } from '../../lib/unbroken.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { chanceWords, cutWords, rungWords } from './words.ts';

type Joint = NonNullable<BidFigures['joint']>;
type Rate = BidFigures['saleChance'];
type Props = { figures: BidFigures; isSeen: boolean | null; basis: BidBasis };
type Line = { readonly what: string; readonly rate: Rate };

const REASONS = {
  'too few past pairs':
    'Too few yet: it needs nine finished rebuilds with an estimate and an expected sale to put on this sheet.',
  'no bid': 'There is no bid to try.',
  'no plan': 'Plan the repair first; then past rebuilds can be put on this sheet.',
  'no expected sale': 'Put in the sale expected first.',
} as const;

/** Past rebuilds put on this sheet: how often repair and sale, each and together, would have held. */
export function Chances({ figures, isSeen, basis }: Props) {
  const format = useFormatter();
  const { joint, jointReason } = figures;
  if (!joint) {
    return (
      <Panel title="How likely all of it holds">
        <p className="text-soft">{jointReason && REASONS[jointReason]}</p>
      </Panel>
    );
  }
  const rows: Line[] = [
    { what: 'The repair stays within its budget', rate: joint.repair },
    { what: 'The sale reaches what is counted on', rate: joint.sale },
    { what: 'Both at once', rate: joint.both },
    { what: 'It brings what you want, one way or the other', rate: joint.wanted },
  ];
  const beyond = joint.beyondCents;
  return (
    <Panel
      title="How likely all of it holds"
      subtitle={`${format.count(joint.wanted.n, 'past rebuild')} ${rungWords(joint.rung, isSeen)}, put on this sheet as they came out.${cutWords(basis, format)}`}
    >
      <p className="mb-3 text-lead font-[640]">{chanceWords(joint)}</p>
      <Table caption="How often it would have held" rows={rows} columns={COLUMNS} rowKey={(row) => row.what} />
      {beyond && <p className="mt-3">{beyondWords(beyond, format)}</p>}
      <p className="mt-2 text-soft">
        Cushions stack: a careful sale and a careful repair together are more careful than either alone. And these are
        lots you won, under the way you bid until now.
      </p>
    </Panel>
  );
}

const COLUMNS: readonly Column<Line>[] = [
  { id: 'what', header: 'What holds', heads: true, cell: (row) => row.what },
  { id: 'of', header: 'Of past', number: true, cell: ({ rate }) => `${rate.x} of ${rate.n}` },
  { id: 'range', header: 'Could be', number: true, cell: ({ rate }) => <Range rate={rate} /> },
];

function Range({ rate: { lower, upper } }: { rate: Rate }) {
  const format = useFormatter();
  return lower === null || upper === null ? null : `${format.percent(lower)} to ${format.percent(upper)}`;
}

function beyondWords({ p10, p50, p90 }: NonNullable<Joint['beyondCents']>, format: Formatter): string {
  const [low, middle, high] = [p10, p50, p90].map((cents) => format.signed(Math.round(cents)));
  return unbroken(
    `Against what you want, half end above ${middle}; one in ten above ${high}, one in ten below ${low}.`,
  );
}
