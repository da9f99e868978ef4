import type { YearAnswer } from '#shared/contracts/answers-year.ts';
import type { Formatter } from '#shared/formatter.ts';
import { capital } from '../../../lib/capital.ts';
import { areCounted, counted, ENOUGH, mark, type Said, type Sentence, said, say, words } from './parts.ts';

/** Did the work pay this year? Kept, and by the hour where hours are known. */
export function sayYear(answer: YearAnswer, format: Formatter): Said {
  return { answer: sentence(answer, format), cautions: cautions(answer, format) };
}

function sentence(answer: YearAnswer, format: Formatter): Sentence {
  const { isRunning, year, n, exitCount, keptCents, overheadCents } = answer;
  const soFar = isRunning ? ' so far' : '';
  if (exitCount === 0) {
    const nothing = isRunning ? `Nothing has been sold in ${year} so far` : `Nothing was sold in ${year}`;
    if (overheadCents === 0) return [`${nothing}, so nothing was kept or lost.`];
    return say`${nothing}; overhead has cost ${mark(format.money(overheadCents))}.`;
  }
  if (n === 0) {
    return [
      `${capital(who(answer, format))} left in ${year}, but no purchase price is known: what was kept cannot be said.`,
    ];
  }
  const has = isRunning ? (n === 1 ? ' has' : ' have') : '';
  if (keptCents === 0) return say`${capital(who(answer, format))}${has} come out ${mark('even')}${soFar}.`;
  const verb = keptCents > 0 ? 'kept' : 'lost';
  const amount = mark(format.money(Math.abs(keptCents)));
  const after = overheadCents === 0 ? '' : `${isRunning ? ',' : ''} after overhead`;
  return say`${capital(who(answer, format))}${has} ${verb} ${amount}${soFar}${after}${byTheHour(answer, format)}`;
}

function who(answer: YearAnswer, format: Formatter): string {
  const { exitCount, soldCount, n } = answer;
  const count = n === 0 ? exitCount : n;
  if (soldCount === exitCount) return counted(format, count, 'sold rebuild');
  return `${counted(format, count)} that left`;
}

function byTheHour(answer: YearAnswer, format: Formatter): Sentence {
  const { own } = answer.perHour;
  if (own.pooledCents === null) return ['; hours are not known, so by the hour nothing can be said.'];
  const rate = mark(format.money(own.pooledCents));
  const hours = `${own.missingCount > 0 ? 'the' : 'your'} ${hoursWord(own.ownSeconds, format)}`;
  const known = own.missingCount > 0 ? ' that are known' : '';
  // The rate is of the rebuilds alone; overhead belongs to the year.
  if (answer.overheadCents !== 0) return say`. Before overhead it comes to ${rate} for each of ${hours}${known}.`;
  return say`: ${rate} for each of ${hours}${known}.`;
}

function hoursWord(seconds: number, format: Formatter): string {
  return `${format.hours(seconds)} ${seconds === 3600 ? 'hour' : 'hours'}`;
}

function cautions(answer: YearAnswer, format: Formatter): string[] {
  const { before, tiedUp, exitCount, n, lossCount, late, perHour } = answer;
  return said(
    before && against(before, answer, format),
    tiedUp.rebuildCount > 0 && stillIn(answer, format),
    exitCount > n &&
      n > 0 &&
      `${capital(areCounted(format, exitCount - n))} left out: the purchase price is not known.`,
    lossCount > 0 && lossWords(lossCount, n, format),
    late.count > 0 &&
      `${capital(counted(format, late.count, 'bill'))} came after the sale (${format.money(late.cents)}) and ${late.count === 1 ? 'is' : 'are'} counted here.`,
    perRebuildWords(answer, format),
    wageWords(perHour.afterWage, format),
    perHour.own.missingCount > 0 &&
      perHour.own.n > 0 &&
      `Hours are not known for ${counted(format, perHour.own.missingCount)}.`,
    n > 0 && n < ENOUGH && `${capital(counted(format, n))} ${n === 1 ? 'is' : 'are'} too few yet to judge a year by.`,
  );
}

type Before = NonNullable<YearAnswer['before']>;

function against(before: Before, { isRunning, keptCents }: YearAnswer, format: Formatter): string | null {
  const when = isRunning ? `the same day of ${before.year}` : `${before.year}`;
  if (before.aheadCents === 0) return keptCents === 0 ? null : `The same as on ${when}.`;
  const way = before.aheadCents > 0 ? 'ahead of' : 'behind';
  return `${format.money(Math.abs(before.aheadCents))} ${way} ${when}.`;
}

function stillIn({ tiedUp, isRunning, to }: YearAnswer, format: Formatter): string {
  const one = tiedUp.rebuildCount === 1;
  const when = isRunning ? '' : ` on ${format.day(to)}`;
  const are = isRunning ? (one ? 'is' : 'are') : one ? 'was' : 'were';
  const hold = isRunning ? (one ? 'holds' : 'hold') : 'held';
  return (
    `${capital(counted(format, tiedUp.rebuildCount))} ${are} unfinished or unsold${when} and ${hold} ` +
    `${format.money(tiedUp.cents)} of the shop's money; not counted until sold.`
  );
}

function lossWords(losses: number, n: number, format: Formatter): string {
  if (losses === n) return n === 1 ? 'It lost money.' : 'Every one of them lost money.';
  return `${capital(words(format, losses))} of the ${words(format, n)} lost money.`;
}

/** What the year would be said to have kept if only sales counted; null = nothing left otherwise. */
export function oldSheetYear({ soldOnly, n, keptCents, year }: YearAnswer, format: Formatter): string | null {
  if (soldOnly.n === n || soldOnly.n === 0) return null;
  const verb = (cents: number) => (cents < 0 ? 'lost' : 'kept');
  const amount = (cents: number) => format.money(Math.abs(cents));
  return (
    `An old sheet, with sold ones only, would have said that ${year} ${verb(soldOnly.keptCents)} ${amount(soldOnly.keptCents)}; ` +
    `with every way out it ${verb(keptCents)} ${amount(keptCents)}.`
  );
}

/** `$1,364 a rebuild; after $25 for each own hour, −$216.` null = nothing to divide. */
export function perRebuildWords({ n, profitCents, perHour }: YearAnswer, format: Formatter): string | null {
  if (n === 0) return null;
  const { wantedCentsPerHour: wage, leftPerRebuildCents: left } = perHour.afterWage;
  const money = (cents: number) => format.money(cents, 'never');
  const paid = wage === null || left === null ? '' : `; after ${format.money(wage)} for each own hour, ${money(left)}`;
  return `Before overhead it is ${money(profitCents / n)} a rebuild${paid}.`;
}

/** What the wanted pay for own hours would leave; nothing without a wage or hours. */
export function wageWords(afterWage: YearAnswer['perHour']['afterWage'], format: Formatter): string | null {
  const { wantedCentsPerHour: wage, leftCents } = afterWage;
  if (wage === null || leftCents === null) return null;
  const amount = format.money(Math.abs(leftCents));
  const paid = `Paid at the wanted ${format.money(wage)} an hour, your own hours`;
  return leftCents < 0 ? `${paid} would leave the shop ${amount} short.` : `${paid} would still leave ${amount}.`;
}
