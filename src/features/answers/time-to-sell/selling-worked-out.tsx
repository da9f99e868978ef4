import { Link } from 'react-router-dom';
import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { type Column, Table } from '../../../ui/table.tsx';
import { useShopPath } from '../rebuild-link.tsx';
import { WorkedOutBasis } from '../worked-out-basis.tsx';

type Step = TimeToSellAnswer['overall']['steps'][number];
/** So many first steps are enough to see how it goes on. */
const STEPS_SHOWN = 8;

/** The product that the curve is made of, with this shop's first selling days worked through. */
export function SellingWorkedOut({ answer }: { answer: TimeToSellAnswer }) {
  const format = useFormatter();
  const path = useShopPath();
  const { overall, comparison: test } = answer;
  const steps = overall.steps.filter((step) => step.soldCount > 0);
  return (
    <>
      <p>
        On each day on which something sold: share still unsold = share before × (1 − sold that day ÷ still waiting that
        day). An unsold rebuild is among those waiting up to its own age, and then leaves without counting as a sale; so
        does one that left otherwise. The middle is the first day on which at most half are left. (Product limit; 95%
        interval by the log-log method.)
      </p>
      {steps.length > 0 && (
        <Table
          caption="The first selling days"
          rows={steps.slice(0, STEPS_SHOWN)}
          columns={COLUMNS}
          rowKey={(step) => `${step.days}`}
        />
      )}
      {steps.length > STEPS_SHOWN && <p>and so on over {format.number(steps.length)} selling days.</p>}
      {test && test.p !== null && (
        <p className="tabular-nums">
          {test.classA} against {test.classB}, log-rank: sold {test.observedA} where alike would mean{' '}
          {format.number(test.expectedA, 2)}; ({test.observedA} − {format.number(test.expectedA, 2)})² ÷{' '}
          {format.number(test.variance, 2)} = {format.number(test.chiSquare ?? 0, 2)}, p {format.number(test.p, 3)}.
        </p>
      )}
      <p>
        Rebuilds that were never entered because they did not sell make this look better than it is. The rows:{' '}
        <Link to={path('rebuilds?stage=sold')}>sold rebuilds</Link>,{' '}
        <Link to={path('rebuilds?stage=listed')}>those listed now</Link>.
      </p>
      <WorkedOutBasis
        answer={answer}
        n={overall.n}
        headline="the middle"
        withoutOne={answer.withoutOne}
        write={(days) => `${format.number(days, days % 1 === 0 ? 0 : 1)} days`}
        definition="days-to-sell"
      />
    </>
  );
}

const COLUMNS: readonly Column<Step>[] = [
  { id: 'day', header: 'Days since listed', number: true, cell: (step) => step.days },
  { id: 'waiting', header: 'Still waiting', number: true, cell: (step) => step.atRiskCount },
  { id: 'sold', header: 'Sold that day', number: true, cell: (step) => step.soldCount },
  { id: 'share', header: 'Still unsold', number: true, cell: (step) => step.unsold.toFixed(4) },
];
