import { ruleReserve } from '#shared/measures/rule-reserve.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { adoptedText, type PrintedRule } from './printed-rule.ts';
import { ruleOrder } from './rule-words.ts';

/** Plans to read the cushion off at, in cents. */
const PLANS = [100_000, 150_000, 200_000, 250_000, 300_000, 400_000, 500_000, 750_000, 1_000_000];

/** The rule on one page to pin up: what to add, and a table to read it off. It stands on paper only. */
export function RuleSheet(printed: PrintedRule) {
  const format = useFormatter();
  const { shopName, year, figures, level, basis, record } = printed;
  const plans = PLANS.map((plan) => ({ plan, cushion: ruleReserve(figures, plan) }));
  return (
    <section className="print-sheet">
      <p>{shopName}</p>
      <h2 className="print-title">Contingency rule for {year}</h2>
      <p className="print-order">{ruleOrder(figures, format)}</p>
      <p>
        Set to hold {level.replace('/', ' in ')}. {basis} {record}
      </p>
      <table className="table print-table">
        <thead>
          <tr>
            <th className="number">Locked estimate</th>
            <th className="number">Cushion</th>
            <th className="number">Budget</th>
          </tr>
        </thead>
        <tbody>
          {plans.map(({ plan, cushion }) => (
            <tr key={plan}>
              <td className="number">{format.money(plan)}</td>
              <td className="number">{format.money(cushion)}</td>
              <td className="number">{format.money(plan + cushion)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p>
        The estimate itself is never cut, and never rewritten: it stays as it was locked. What of the cushion is not
        needed stays over; it is a reserve, not a reason to spend. It is for money, never a reason to skip a step:
        follow the maker’s procedure and the law of your state.
      </p>
      <p>It holds only so long as next year’s cars and next year’s prices are like those behind it. Not a promise.</p>
      <p>{adoptedText(printed, format)}</p>
    </section>
  );
}
