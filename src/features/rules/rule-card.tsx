import { ruleReserve } from '#shared/measures/rule-reserve.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { adoptedText, type PrintedRule } from './printed-rule.ts';
import { ruleText } from './rule-words.ts';

const PLANS = [100_000, 200_000, 300_000, 400_000, 600_000];

/** The rule as a card for the wallet, front and back side by side to be cut out and folded. It stands on paper only. */
export function RuleCard(printed: PrintedRule) {
  const format = useFormatter();
  const { shopName, year, figures, level, basis } = printed;
  return (
    <section className="print-card">
      <div className="print-card-face">
        <p className="print-card-small">
          {shopName} · {year}
        </p>
        <h2 className="print-card-figure">+ {ruleText(figures, format)}</h2>
        <p>on top of the locked repair estimate{figures.flatCents === null ? '' : '; the sum is for surprises'}</p>
        <p className="print-card-small">
          Set to hold {level.replace('/', ' in ')}. {basis} {adoptedText(printed, format)}
        </p>
      </div>
      <div className="print-card-face">
        <table className="print-card-table">
          <thead>
            <tr>
              <th className="number">Estimate</th>
              <th className="number">Cushion</th>
              <th className="number">Budget</th>
            </tr>
          </thead>
          <tbody>
            {PLANS.map((plan) => {
              const cushion = ruleReserve(figures, plan);
              return (
                <tr key={plan}>
                  <td className="number">{format.money(plan)}</td>
                  <td className="number">{format.money(cushion)}</td>
                  <td className="number">{format.money(plan + cushion)}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
        <p className="print-card-small">The estimate is never cut. Cushion that is not needed stays over.</p>
      </div>
      <p className="print-card-cut">Cut out along the frame and fold in the middle.</p>
    </section>
  );
}
