import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';

/** Replies as the server sends them, whole and plausible; a test says only what it is about. */

import { head, rebuild } from './replies.ts';

type Score = ContingencyAnswer['backTest']['scores'][number];
export const score = (rule: Score['rule'], x: number, n: number, shortCents = 0): Score => ({
  rule,
  n,
  x,
  rate: n === 0 ? null : x / n,
  lower: n === 0 ? null : 0.68,
  upper: n === 0 ? null : 0.91,
  shortCents,
  unusedCents: 200_000,
  reserveCents: 300_000,
});

type Drift = ContingencyAnswer['drift'];
/** The last 24 months agree with the years before: 11 of 14 within, where 11.3 were to be expected. */
export function drift(changes: Partial<Drift> = {}): Drift {
  const figure = (n: number, percent: number) => ({ n, k: 1, uplift: percent / 100, percent });
  return {
    after: '2024-11-30',
    all: figure(41, 24),
    recent: figure(14, 26),
    before: figure(27, 23),
    withinCount: 11,
    expectedCount: 11.5,
    verdict: 'agrees',
    ...changes,
  };
}

type PastBids = ContingencyAnswer['pastBids']['percent'];
const NO_OUTCOME = { lostCount: 0, lostCents: 0, gainedCount: 0, gainedCents: 0 };
const NO_BIDS = { count: 0, ...NO_OUTCOME, timedCount: 0, ownSeconds: 0, timedCents: 0, rebuilds: [] };
export function pastBids(changes: Partial<PastBids> = {}): PastBids {
  return { n: 33, reserveCents: 3_000_000, skipped: NO_BIDS, aboveAnyway: NO_BIDS, leftOut: [], ...changes };
}

export function contingencyReply(changes: Partial<ContingencyAnswer> = {}): ContingencyAnswer {
  return {
    ...head(41),
    level: '4/5',
    estimateCents: 10_000_000,
    overrunCents: 1_500_000,
    percent: {
      n: 41,
      k: 34,
      isAttainable: true,
      guarantee: 34 / 42,
      uplift: 0.2317,
      percent: 24,
      taken: { ...rebuild('B-033'), estimateCents: 600_000, overrunCents: 139_020 },
      band: { lower: 0.71, upper: 0.88 },
      without: { uplift: { lowest: 0.2201, highest: 0.2402 }, percent: { lowest: 23, highest: 25 } },
    },
    twoPart: {
      n: 38,
      k: 32,
      isAttainable: true,
      guarantee: 32 / 39,
      creepPercent: 12,
      creepCents: 1_100_000,
      estimateCents: 9_400_000,
      flatCents: 44_911,
      adoptFlatCents: 45_000,
      band: { lower: 0.7, upper: 0.89 },
      without: { creepPercent: { lowest: 11, highest: 13 }, flatCents: { lowest: 43_200, highest: 46_050 } },
    },
    backTest: {
      skippedCount: 6,
      tooFewCount: 0,
      scores: [score('percent', 29, 35, 384_000), score('flat 10', 17, 35)],
    },
    twoPartBackTest: { skippedCount: 6, tooFewCount: 0, scores: [score('two-part', 28, 33)] },
    trail: [],
    trailTotal: 0,
    drift: drift(),
    wantedCentsPerHour: 2_500,
    pastBids: { percent: pastBids(), twoPart: pastBids() },
    damages: [],
    thisYear: { year: 2026, rule: null },
    nextYear: { year: 2027, rule: null },
    ...changes,
  };
}
