import type { z } from 'zod';
import { BIDS_LISTED, type contingencyAnswerSchema } from '#shared/contracts/answers-contingency.ts';
import type { Trial } from '../../domain/back-test.ts';
import { type JudgedBid, type PastBid, pastBids } from '../../domain/past-bids.ts';
import { sum } from '../../domain/statistics.ts';
import { type AnswerInput, leftOut, rebuildOf, refOf } from './input.ts';

type Answer = z.input<typeof contingencyAnswerSchema>;
type Shown = Answer['pastBids']['percent'];

/** What rules set this way would have done to the bids on the rebuilds that they are judged on. */
export function pastBidsOf(input: AnswerInput, trials: readonly Trial[]): Shown {
  const bids = trials.flatMap(({ id, estimateCents, asked }): PastBid[] => {
    if (asked === null) return [];
    const { purchaseCents, expectedSaleCents, plannedSeconds, paidCents, ownSeconds, exit } = rebuildOf(input, id);
    const profitCents = (exit?.proceedsCents ?? 0) - (purchaseCents ?? 0) - paidCents;
    const locked = { purchaseCents, expectedSaleCents, plannedSeconds, estimateCents };
    return [{ id, ...locked, reserveCents: asked.reserveCents, profitCents, ownSeconds }];
  });
  const found = pastBids(bids, input.shop.wantedCentsPerHour);
  const named = (ids: readonly string[]) => ids.map((id) => rebuildOf(input, id));
  return {
    n: found.n,
    reserveCents: found.reserveCents,
    skipped: groupOf(input, found.skipped),
    aboveAnyway: groupOf(input, found.aboveAnyway),
    leftOut: leftOut([
      ['purchase not known', named(found.noPurchaseIds)],
      ['no sale expected in its estimate', named(found.noSaleIds)],
      ['no hours planned', named(found.noHoursIds)],
    ]),
  };
}

function groupOf(input: AnswerInput, group: readonly JudgedBid[]): Shown['skipped'] {
  const lost = group.filter(({ profitCents }) => profitCents < 0);
  const gained = group.filter(({ profitCents }) => profitCents >= 0);
  const timed = group.filter(({ ownSeconds }) => ownSeconds !== null);
  return {
    count: group.length,
    lostCount: lost.length,
    lostCents: sum(lost.map(({ profitCents }) => profitCents)),
    gainedCount: gained.length,
    gainedCents: sum(gained.map(({ profitCents }) => profitCents)),
    timedCount: timed.length,
    ownSeconds: sum(timed.map(({ ownSeconds }) => ownSeconds ?? 0)),
    timedCents: sum(timed.map(({ profitCents }) => profitCents)),
    rebuilds: group.slice(0, BIDS_LISTED).map((one) => ({ ...one, ...refOf(rebuildOf(input, one.id)) })),
  };
}
