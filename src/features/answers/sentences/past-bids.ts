import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { Formatter } from '#shared/formatter.ts';
import { listed, said, words } from './parts.ts';

type PastBids = ContingencyAnswer['pastBids']['percent'];
type Group = PastBids['skipped'];

/** What the rules would have done to past bids: counts and money, the good cars that it would have cost with the bad ones. */
export function sayPastBids(
  { n, reserveCents, skipped, aboveAnyway }: PastBids,
  wantedCentsPerHour: number | null,
  format: Formatter,
): { finding: string; more: string[] } {
  if (n === 0) return { finding: 'No bid can be judged: nothing locked then says what was expected.', more: [] };
  const finding =
    skipped.count === 0
      ? `You would have skipped none of ${format.number(n)}.`
      : `You would have skipped ${format.number(skipped.count)} of ${format.number(n)}: ${outcomes(skipped, format)}.`;
  const more = said(
    skipped.lostCount > 0 && skipped.gainedCount > 0 && togetherText(skipped.lostCents + skipped.gainedCents, format),
    skipped.timedCount > 0 && skipped.ownSeconds > 0 && perHour(skipped, wantedCentsPerHour, format),
    `The limit on each car would have been ${format.money(reserveCents / n, 'never')} lower on average, ${format.money(reserveCents, 'never')} over all ${format.number(n)}.`,
    aboveAnyway.count > 0 &&
      `${format.count(aboveAnyway.count, 'car')} cost more than the sheet of the day allowed even without a cushion, and ${aboveAnyway.lostCount === 0 ? 'none' : words(format, aboveAnyway.lostCount)} of them lost money: no rule was needed to see that.`,
  );
  return { finding, more };
}

function outcomes({ lostCount, lostCents, gainedCount, gainedCents }: Group, format: Formatter): string {
  return listed(
    said(
      lostCount > 0 && `${format.number(lostCount)} that lost ${format.money(-lostCents)}`,
      gainedCount > 0 && `${format.number(gainedCount)} that made ${format.money(gainedCents)}`,
    ),
  );
}

function togetherText(cents: number, format: Formatter): string {
  return `Together they ${cents < 0 ? 'lost' : 'made'} ${format.money(Math.abs(cents))}.`;
}

function perHour({ timedCount, timedCents, ownSeconds, count }: Group, wanted: number | null, format: Formatter) {
  const rate = (timedCents / ownSeconds) * 3600;
  const who = timedCount === count ? 'They took' : `The ${format.number(timedCount)} with known hours took`;
  const beside = wanted === null ? '' : `, where ${format.perHour(wanted)} is wanted`;
  return `${who} ${format.hours(ownSeconds)} own hours: ${format.perHour(rate)}${beside}.`;
}
