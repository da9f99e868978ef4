import type { Rule } from '#shared/contracts/rules.ts';
import { ruleReserve } from '#shared/measures/rule-reserve.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { type RuleFigures, ruleOrder } from './rule-words.ts';

/** Plans to read the cushion off at, in cents. */
const PLANS = [100_000, 200_000, 300_000, 400_000, 500_000, 750_000, 1_000_000];

type Props = {
  shopName: string;
  year: number;
  figures: RuleFigures;
  level: string;
  /** Where it comes from, in a sentence. */
  basis: string;
  /** The adopted rule; null = a proposal only. */
  rule: Rule | null;
};

/** The rule on one page to pin up: what to add, and a table to read it off. It stands on paper only. */
export function RuleCard({ shopName, year, figures, level, basis, rule }: Props) {
  const format = useFormatter();
  const plans = PLANS.map((plan) => ({ plan, cushion: ruleReserve(figures, plan) }));
  return (
    <section className="print-card">
      <p>{shopName}</p>
      <h2 className="print-card-title">Contingency rule for {year}</h2>
      <p className="print-card-order">{ruleOrder(figures, format)}</p>
      <p>
        Set to hold {level.replace('/', ' in ')}. {basis}
      </p>
      <table className="table print-card-table">
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
        The estimate itself is never cut. The cushion is for money, not a reason to skip a step: follow the maker’s
        procedure.
      </p>
      <p>
        {rule
          ? `Adopted ${format.day(rule.adoptedOn)} by ${rule.adoptedByName}, revision ${rule.revision}.`
          : 'A proposal, not adopted.'}
      </p>
    </section>
  );
}

/** Prints the card alone. */
export function printRuleCard(): void {
  const root = document.documentElement;
  root.dataset['print'] = 'card';
  window.print();
  delete root.dataset['print'];
}
