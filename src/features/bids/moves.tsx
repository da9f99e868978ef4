import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import type { Formatter } from '#shared/formatter.ts';
import { Money } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { type Column, Table } from '../../ui/table.tsx';
import { figuresAlone } from './use-sheet.ts';
import { hasBid } from './words.ts';

type Move = { readonly if: string; readonly bidCents: number | null; readonly changeCents: number | null };

/** How far the bid moves when one thing comes out otherwise. */
export function Moves({ sheet, figures, basis }: { sheet: BidFields; figures: BidFigures; basis: BidBasis }) {
  const format = useFormatter();
  if (!hasBid(figures)) return null;
  const rows = movesOf(sheet, format).map(({ label, to }): Move => {
    const { bidCents } = figuresAlone({ ...sheet, ...to }, basis);
    return { if: label, bidCents, changeCents: bidCents === null ? null : bidCents - figures.bidCents };
  });
  return (
    <Panel title="How the bid moves" subtitle="One thing at a time, the rest as it stands.">
      <Table caption="How the bid moves" rows={rows} columns={COLUMNS} rowKey={(row) => row.if} />
    </Panel>
  );
}

const COLUMNS: readonly Column<Move>[] = [
  { id: 'if', header: 'If …', heads: true, cell: (row) => row.if },
  {
    id: 'bid',
    header: 'Walk away above',
    number: true,
    cell: (row) => (row.bidCents === null ? 'do not bid' : <Money cents={row.bidCents} />),
  },
  {
    id: 'change',
    header: 'Change',
    number: true,
    cell: (row) => <Money cents={row.changeCents} signed tone="kept" />,
  },
];

const SALE = 500_00;
const HOURS = 10 * 3600;
const DAYS = 30;

/** The sale 500 less or more; the plan a tenth, hours ten, days thirty more or less, as far as there are so many. */
export function movesOf(sheet: BidFields, format: Formatter): { label: string; to: Partial<BidFields> }[] {
  const counted = sheet.countedSaleCents ?? sheet.expectedSaleCents;
  const plan = sheet.lines.reduce((sum, { cents }) => sum + cents, 0);
  const tenth = Math.round(plan / 10_000) * 1000;
  const [first, ...others] = sheet.lines;
  const repair = (cents: number) => ({
    lines: first ? [{ ...first, cents: first.cents + cents }, ...others] : [],
  });
  const money = (cents: number) => format.money(cents);
  return [
    { label: `the sale is ${money(SALE)} less`, to: { countedSaleCents: Math.max(0, counted - SALE) } },
    { label: `the sale is ${money(SALE)} more`, to: { countedSaleCents: counted + SALE } },
    ...(tenth > 0
      ? [
          { label: `the plan is ${money(tenth)} more`, to: repair(tenth) },
          { label: `the plan is ${money(tenth)} less`, to: repair(-tenth) },
        ]
      : []),
    { label: 'it takes 10 own hours more', to: { ownSeconds: sheet.ownSeconds + HOURS } },
    ...(sheet.ownSeconds >= HOURS
      ? [{ label: 'it takes 10 own hours less', to: { ownSeconds: sheet.ownSeconds - HOURS } }]
      : []),
    ...(sheet.holdingCentsPerDay > 0 ? [{ label: 'it sells 30 days later', to: { days: sheet.days + DAYS } }] : []),
    ...(sheet.holdingCentsPerDay > 0 && sheet.days >= DAYS
      ? [{ label: 'it sells 30 days sooner', to: { days: sheet.days - DAYS } }]
      : []),
  ];
}
