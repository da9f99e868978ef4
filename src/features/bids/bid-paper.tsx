import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import { surprisesFor } from '#shared/measures/like-cars.ts';
import { WALK_ROUND_CAUTION, FOLLOW_PROCEDURE } from '#shared/trade-cautions.ts';
import { tradeChecks } from '#shared/trade-checks.ts';
import { capital } from '../../lib/capital.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { madeOf } from './made-of.tsx';
import { cautionsOf, sayBid } from './say.ts';

type Props = { sheet: BidFields; basis: BidBasis; figures: BidFigures; shopName: string; madeOn: string };

/** The sheet on one page of paper: the bid, what it is made of, and the walk round the car. */
export function BidPaper({ sheet, basis, figures, shopName, madeOn }: Props) {
  const format = useFormatter();
  const answer = sayBid(sheet, figures, format);
  const rows = figures.bidCents === null ? [] : madeOf(sheet, figures, format);
  const nameOf = (words: BidBasis['classes'], id: string | null) => words.find((word) => word.id === id)?.name ?? null;
  const damages = [nameOf(basis.damages, sheet.damageId), nameOf(basis.damages, sheet.secondDamageId)];
  const seen = sheet.isSeen === null ? null : sheet.isSeen ? 'seen' : 'not seen';
  const car = [sheet.year, sheet.make, sheet.model, nameOf(basis.classes, sheet.classId), ...damages, seen, sheet.vin];
  const surprises = surprisesFor(basis.surprises, sheet);
  const own = surprises?.categories.slice(0, 6) ?? [];
  const category = (id: string) => capital(nameOf(basis.categories, id) ?? '');
  return (
    <section className="bid-paper">
      <p>
        {shopName} · Pre-bid sheet of {format.day(madeOn)} · books as they stood on {format.day(basis.asOf)}
      </p>
      <h2 className="text-lead font-[680]">{sheet.name}</h2>
      <p>{car.filter(Boolean).join(' · ')}</p>
      <p className="bid-paper-answer">{answer.before + answer.figure + answer.after}</p>
      <p>{cautionsOf(sheet, figures, figures, format).join(' ')}</p>
      <div className="bid-paper-columns">
        <table className="table">
          <tbody>
            {rows.map((row) => (
              <tr key={row.label} data-strong={row.kind === 'less' ? undefined : ''}>
                <th scope="row">{row.label}</th>
                <td className="number">{format.money(row.kind === 'less' ? -row.cents : row.cents)}</td>
              </tr>
            ))}
          </tbody>
        </table>
        <ul>
          {own.map(({ categoryId, x, medianCents }) => (
            <Box key={categoryId} isTicked={sheet.ticks.includes(`own-${categoryId}`)}>
              {category(categoryId)}: a surprise on {x} of {surprises?.n}, {format.money(Math.round(medianCents))} in
              the middle
            </Box>
          ))}
          {tradeChecks(damages).map(({ key, surprise }) => (
            <Box key={key} isTicked={sheet.ticks.includes(key)}>
              {surprise}
            </Box>
          ))}
        </ul>
      </div>
      {sheet.notes && <p>{sheet.notes}</p>}
      <p>
        {WALK_ROUND_CAUTION} {FOLLOW_PROCEDURE}
      </p>
    </section>
  );
}

function Box({ isTicked, children }: { isTicked: boolean; children: React.ReactNode }) {
  return (
    <li>
      {isTicked ? '☒' : '☐'} {children}
    </li>
  );
}
