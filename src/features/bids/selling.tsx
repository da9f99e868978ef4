import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { Formatter } from '#shared/formatter.ts';
import { sellingFor } from '#shared/measures/like-cars.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';

type Wait = BidBasis['selling'][number]['toSell'];

/** How long such cars take to sell, and how long the money is out; unsold ones count as waiting. */
export function Selling({ sheet, basis }: { sheet: BidFields; basis: BidBasis }) {
  const format = useFormatter();
  const selling = sellingFor(basis.selling, sheet.classId);
  if (!selling || selling.toSell.n + selling.held.n === 0) return null;
  const name = basis.classes.find(({ id }) => id === selling.classId)?.name;
  return (
    <Panel title="Days to sell" subtitle={name ? `Of class ${name}.` : 'Of every class.'}>
      <dl className="grid gap-2">
        <Line label="From listed to sold" wait={selling.toSell} format={format} />
        <Line label="From bought to sold" wait={selling.held} format={format} />
      </dl>
      <p className="mt-3 text-soft">This sheet counts {format.days(sheet.days)} of holding.</p>
    </Panel>
  );
}

function Line({ label, wait, format }: { label: string; wait: Wait; format: Formatter }) {
  return (
    <div className="money-line">
      <dt>
        {label}
        <span className="block text-label text-soft">{basedOn(wait, format)}</span>
      </dt>
      <dd className="text-right font-[640] tabular-nums">{middle(wait, format)}</dd>
    </div>
  );
}

function middle({ n, median, lower, upper }: Wait, format: Formatter): string {
  if (n === 0) return 'none yet';
  if (median === null) return 'half not sold yet';
  const range = lower === null ? '' : upper === null ? ` (${lower} or more)` : ` (${lower} to ${upper})`;
  return `half within ${format.days(median)}${range}`;
}

function basedOn({ soldCount, unsoldCount, otherExitCount }: Wait, format: Formatter): string {
  const waiting = unsoldCount > 0 ? `, ${format.number(unsoldCount)} still waiting` : '';
  const others = otherExitCount > 0 ? `, ${format.number(otherExitCount)} left otherwise` : '';
  return `${format.number(soldCount)} sold${waiting}${others}`;
}
