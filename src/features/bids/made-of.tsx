import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import type { Formatter } from '#shared/formatter.ts';
import { bidFee, bidTax } from '#shared/measures/walk-away-bid.ts';
import { WaterfallBars } from '../../charts/waterfall-bars.tsx';
import type { WaterfallRow } from '../../charts/waterfall-layout.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { HowWorkedOut, Panel } from '../../ui/panel.tsx';
import { hasBid } from './words.ts';

type Props = { sheet: BidFields; figures: BidFigures };

/** From the sale down to the bid: what each part takes off. */
export function MadeOf({ sheet, figures }: Props) {
  const format = useFormatter();
  if (!hasBid(figures)) return null;
  return (
    <Panel title="What it is made of" id="made-of">
      <WaterfallBars caption={captionOf(figures, format)} rows={madeOf(sheet, figures, format)} format={format} />
      <HowWorkedOut>
        <WorkedOut sheet={sheet} figures={figures} />
      </HowWorkedOut>
    </Panel>
  );
}

function captionOf({ saleCents, roomCents, bidCents, feeCents, taxCents }: BidFigures, format: Formatter): string {
  const money = (cents: number | null) => format.money(cents ?? 0);
  const charged = [feeCents ? `${money(feeCents)} of fees` : '', taxCents ? `${money(taxCents)} of tax` : ''].filter(
    Boolean,
  );
  const besides = charged.length === 0 ? '' : ` with ${charged.join(' and ')}`;
  return `Of ${money(saleCents)}, ${money(roomCents)} is left for bid and fees: a bid of ${money(bidCents)}${besides} fits.`;
}

/** The parts in order; what takes nothing off is left out. */
export function madeOf(sheet: BidFields, figures: BidFigures, format: Formatter): WaterfallRow[] {
  const cushion = (figures.repairBudgetCents ?? figures.planCents) - figures.planCents;
  const hours = `Own ${format.hours(sheet.ownSeconds)} h`;
  const less: readonly (readonly [string, number])[] = [
    ['Repair plan', figures.planCents],
    ['Cushion', cushion],
    ['Transport', sheet.transportCents],
    ['Title, inspection', sheet.titleCents],
    ['Selling', sheet.sellingCents],
    [`Holding ${format.days(sheet.days)}`, figures.holdingCents],
    ['Paid help', sheet.paidLaborCents],
    [hours, figures.ownPayCents],
    ['Profit wanted', sheet.wantedProfitCents],
    ['Fees', figures.feeCents ?? 0],
    ['Tax', figures.taxCents ?? 0],
    ['Below the next step', figures.leftCents ?? 0],
  ];
  return [
    { label: 'Sale counted on', cents: figures.saleCents, kind: 'total' },
    ...less.filter(([, cents]) => cents !== 0).map(([label, cents]) => ({ label, cents, kind: 'less' as const })),
    { label: 'Walk-away bid', cents: figures.bidCents ?? 0, kind: 'kept' },
  ];
}

/** Why this bid and not one step more, to be redone by hand. */
function WorkedOut({ sheet, figures }: Props) {
  const format = useFormatter();
  const exact = (cents: number) => format.money(cents, 'always');
  const { bidCents, feeCents, taxCents, roomCents, leftCents } = figures;
  if (bidCents === null || roomCents === null) return null;
  const next = bidCents + sheet.bidStepCents;
  const [nextFee, nextTax] = [bidFee(next, sheet), bidTax(next, sheet.tax)];
  return (
    <>
      <p>
        Room for the bid = sale − repair plan − cushion − transport − title − selling − days × holding − paid help − own
        hours × wanted pay − profit wanted = {exact(roomCents)}.
      </p>
      <p>
        The bid is the highest whole step that fits with its fee and tax: {exact(bidCents)} + {exact(feeCents ?? 0)} +{' '}
        {exact(taxCents ?? 0)} leaves {exact(leftCents ?? 0)}. The next step would need {exact(next)} + {exact(nextFee)}{' '}
        + {exact(nextTax)} = {exact(next + nextFee + nextTax)}.
      </p>
      <p>A fee table may fall from one step to the next, so every step of it is tried from the top down.</p>
    </>
  );
}
