import type { z } from 'zod';
import { MARKS_AT_MOST, type YearQuery } from '#shared/contracts/answers-parts.ts';
import type { yearAnswerSchema } from '#shared/contracts/answers-year.ts';
import { type Day, dayFromParts } from '#shared/day.ts';
import type { ShopFacts } from '../../books/shop-facts.ts';
import { profit } from '../../domain/profit.ts';
import { completed } from '../../domain/sets.ts';
import { sum } from '../../domain/statistics.ts';
import { shopYearOf, shopYears, yearSpan, yearSpans } from '../../domain/years.ts';
import { filterOptions } from './filter.ts';
import { type AnswerInput, countedBy, leftOut, rebuildOf } from './input.ts';
import { perHourViews } from './per-hour-views.ts';
import { soldOnlyOf, yearTrends, yearWithoutOne } from './year-judged.ts';
import { lateOf, moneyOf, returnsOf, rowOf } from './year-parts.ts';
import { yearSteps } from './year-steps.ts';

type Answer = z.input<typeof yearAnswerSchema>;

/** Did the work pay this year? The query asks for a shop year; without one, the year of today. */
export function yearAnswer(whole: AnswerInput, { year: asked, exits: counted }: YearQuery): Answer {
  const input = countedBy(whole, counted);
  const { shop, today, byId } = input;
  const year = asked ?? shopYearOf(today, shop.startMonth);
  const span = yearSpan(year, shop.startMonth);
  const through = span.to < today ? span.to : today;
  const years = yearsOf(input);
  const own = years.find((one) => one.year === year);
  const last = yearSpan(year - 1, shop.startMonth);
  const left = completed(shop.rebuilds).filter(({ exit }) => exit.on >= span.from && exit.on <= through);
  const exits = left.map(({ id }) => rebuildOf(input, id));
  const counts = profit(exits);
  const keptCents = own?.keptCents ?? 0;
  return {
    asOf: today,
    rebuildCount: exits.length,
    filters: filterOptions(input, 'left'),
    leftOut: leftOut([
      [
        'left otherwise than by sale',
        input.otherExits.filter(({ exit }) => exit && exit.on >= span.from && exit.on <= through),
      ],
      ['purchase not known', exits.filter(({ purchaseCents }) => purchaseCents === null)],
      ['own hours not known', exits.filter(({ ownSeconds }) => !ownSeconds)],
      ['entry without a date', exits.filter(({ hasUndated }) => hasUndated)],
    ]),
    year,
    ...span,
    through,
    isRunning: span.to >= today && span.from <= today,
    exitCount: exits.length,
    soldCount: left.filter(({ exit }) => exit.kind === 'sold').length,
    n: counts.n,
    lossCount: counts.lossCount,
    profitCents: counts.profitCents,
    overheadCents: own?.overheadCents ?? 0,
    keptCents,
    perHour: perHourViews(exits, shop.wantedCentsPerHour),
    before: beforeOf(shop, years, { year, through, keptCents }),
    steps: yearSteps(shop, byId, { from: span.from, to: through }, last),
    money: moneyOf(shop, exits, own?.overheadCents ?? 0),
    late: lateOf(exits),
    tiedUp: own?.tiedUp ?? input.tiedUpOn(through),
    returns: returnsOf(exits, input.flowsOf(exits.map(({ id }) => id))),
    rebuilds: left
      .toSorted((a, b) => (a.exit.on < b.exit.on ? 1 : a.exit.on > b.exit.on ? -1 : 0))
      .slice(0, MARKS_AT_MOST)
      .map((one) => rowOf(rebuildOf(input, one.id), one.exit)),
    rebuildTotal: exits.length,
    years,
    trends: yearTrends(shop.rebuilds),
    withoutOne: yearWithoutOne(input, exits, keptCents),
    soldOnly: soldOnlyOf(exits, own?.overheadCents ?? 0),
  };
}

function yearsOf({ shop, today, tiedUpOn }: AnswerInput): Answer['years'] {
  const input = { facts: shop.rebuilds, overhead: shop.overhead, asOf: today, startMonth: shop.startMonth };
  const tiedUp = yearSpans(input).map((span) => tiedUpOn(span.tiedUpOn));
  return shopYears(input, tiedUp).map((one, i) => ({
    ...one,
    tiedUp: one.tiedUp ?? tiedUp[i] ?? { on: one.tiedUpOn, rebuildCount: 0, cents: 0 },
  }));
}

/** The year before, up to the same day of it; null if the books begin later. */
function beforeOf(
  { rebuilds, overhead, startMonth }: ShopFacts,
  years: Answer['years'],
  now: { year: number; through: Day; keptCents: number },
): Answer['before'] {
  const whole = years.find((one) => one.year === now.year - 1);
  if (!whole) return null;
  const { from, to } = yearSpan(whole.year, startMonth);
  const through = sameDayLastYear(now.through);
  const isIn = (on: Day) => on >= from && on <= through;
  const left = completed(rebuilds).filter(({ exit }) => isIn(exit.on));
  const paid = sum(overhead.filter(({ on }) => isIn(on)).map(({ cents }) => cents));
  const keptCents = profit(left).profitCents - paid;
  return {
    year: whole.year,
    from,
    to,
    through,
    exitCount: left.length,
    keptCents,
    wholeKeptCents: whole.keptCents,
    aheadCents: now.keptCents - keptCents,
  };
}

function sameDayLastYear(day: Day): Day {
  const [year, month, date] = day.split('-').map(Number) as [number, number, number];
  return dayFromParts(year - 1, month, date) ?? `${year - 1}-02-28`;
}
