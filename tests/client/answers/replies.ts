import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import type { Head, Trend } from '#shared/contracts/answers-parts.ts';
import type { TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import type { YearAnswer } from '#shared/contracts/answers-year.ts';

/** Replies as the server sends them, whole and plausible; a test says only what it is about. */

export const idOf = (text: string) => text.padEnd(22, '0');
export const rebuild = (tag: string, name = '2015 midsize sedan') => ({ id: idOf(tag), tag, name });

export function head(rebuildCount = 12): Head {
  return {
    asOf: '2026-11-30',
    rebuildCount,
    filters: {
      yearOf: 'left',
      years: [
        { year: 2025, from: '2025-01-01', to: '2025-12-31', count: 5 },
        { year: 2026, from: '2026-01-01', to: '2026-12-31', count: 7 },
      ],
      classes: [{ id: idOf('suv'), name: 'SUV', count: rebuildCount }],
      damages: [{ id: idOf('hail'), name: 'hail', count: rebuildCount }],
      seen: { yes: rebuildCount, no: 0, unknown: 0 },
    },
    leftOut: [],
  };
}

const hours = (own: number) => own * 3600;
/** Nothing to read a slope from. */
export const NO_TREND: Trend = { n: 0, isCapped: false, slope: null, lower: null, upper: null, isThin: true };

export function yearReply(changes: Partial<YearAnswer> = {}): YearAnswer {
  const kept = 1_842_000;
  const tiedUp = { on: '2026-11-30', rebuildCount: 3, cents: 1_427_500 };
  return {
    ...head(),
    year: 2026,
    from: '2026-01-01',
    to: '2026-12-31',
    through: '2026-11-30',
    isRunning: true,
    exitCount: 9,
    soldCount: 9,
    n: 9,
    lossCount: 0,
    profitCents: kept,
    overheadCents: 0,
    keptCents: kept,
    perHour: perHour(9, kept, 853),
    before: null,
    steps: { every: 'change', now: [], before: [] },
    money: { proceedsCents: 9_680_000, purchaseCents: 7_838_000, categories: [], overheadCents: 0, keptCents: kept },
    late: { count: 0, cents: 0, rebuilds: [] },
    tiedUp: { on: '2026-11-30', rebuildCount: 0, cents: 0 },
    returns: {
      pooled: 0.4,
      n: 9,
      median: 0.3,
      hasSeveral: false,
      undatedCount: 0,
      daysHeld: { n: 9, median: 120 },
      onCost: { n: 9, pooled: 0.2, median: 0.18, profitCents: kept, costCents: 7_838_000 },
    },
    rebuilds: [],
    rebuildTotal: 0,
    years: [2025, 2026].map((year) => ({
      year,
      from: `${year}-01-01`,
      to: `${year}-12-31`,
      exitCount: 9,
      soldCount: 9,
      noPurchaseCount: 0,
      profitCents: kept,
      overheadCents: 0,
      keptCents: kept,
      lateCount: 0,
      lateCents: 0,
      tiedUp,
    })),
    trends: { perHour: NO_TREND, perRebuild: NO_TREND },
    withoutOne: { kept: null, perHour: null },
    soldOnly: { n: 9, keptCents: kept },
    ...changes,
  };
}

/** Three views where `n` rebuilds kept `profitCents` over so many own hours; `missing` have none. */
export function perHour(n: number, profitCents: number, own: number, missing = 0): YearAnswer['perHour'] {
  const pooled = own === 0 ? null : profitCents / own;
  const counts = { n, missingCount: missing };
  return {
    own: { ...counts, profitCents, ownSeconds: hours(own), pooledCents: pooled, medianCents: pooled },
    all: { ...counts, profitCents, paidLaborCents: 0, seconds: hours(own), pooledCents: pooled },
    afterWage: { ...counts, wantedCentsPerHour: null, leftCents: null, leftPerRebuildCents: null },
  };
}

type Category = OverrunsAnswer['categories'][number];
const NO_DOTS = { dots: [], bins: [] };

/** A category with `n` planned rebuilds: 1,000 planned for each and `rate` over. */
export function category(name: string, n: number, rate: number, planned = 100_000): Category {
  const estimateCents = planned * n;
  return {
    categoryId: idOf(name.replaceAll(/\W/g, '')),
    name,
    ...spread(n, rate),
    estimateCents,
    actualCents: Math.round(estimateCents * (1 + rate)),
    ...NO_DOTS,
    parts: { n, overCents: Math.round(estimateCents * rate), surpriseCents: 0, knownCents: 0, surpriseShare: null },
    unbudgetedCount: 0,
    unbudgetedCents: 0,
    extraCents: 0,
    years: [],
  };
}

function spread(n: number, rate: number) {
  const value = n === 0 ? null : rate;
  return {
    n,
    pooled: value,
    median: value,
    mean: value,
    q10: value,
    q25: value,
    q75: value,
    q90: value,
    isThin: n < 5,
  };
}

export function overrunsReply(n: number, rate: number, categories: Category[] = []): OverrunsAnswer {
  const total = category('all', n, rate);
  return {
    ...head(),
    marks: 'each',
    total,
    categories,
    hours: { ...spread(0, 0), plannedSeconds: 0, actualSeconds: 0, ...NO_DOTS, years: [] },
    surprises: {
      n: 0,
      x: 0,
      rate: null,
      lower: null,
      upper: null,
      unknownCount: 0,
      unforeseenCents: 0,
      workCents: 0,
      shareOfWork: null,
      categories: [],
    },
    extras: { rebuildCount: 0, cents: 0 },
    seen: [],
    seenDifference: { overrun: null, surprised: null, perHour: null },
    damages: [],
    trends: { overrun: NO_TREND, hours: NO_TREND },
    withoutOne: null,
    soldOnly: { n, pooled: n === 0 ? null : rate },
    years: [],
  };
}

export function timeToSellReply(overall: Partial<TimeToSellAnswer['overall']> = {}): TimeToSellAnswer {
  const never = { unsold: null, lower: null, upper: null };
  return {
    ...head(),
    overall: {
      n: 12,
      soldCount: 10,
      unsoldCount: 2,
      otherExitCount: 0,
      median: { days: 28, lower: 20, upper: 41 },
      at30: { unsold: 0.46, lower: 0.2, upper: 0.7 },
      at60: { unsold: 0.21, lower: 0.05, upper: 0.4 },
      at90: never,
      isThin: false,
      longestDays: 88,
      steps: [{ days: 28, atRiskCount: 12, soldCount: 6, unsold: 0.5, lower: 0.2, upper: 0.7 }],
      isThinned: false,
      ...overall,
    },
    classes: [],
    comparison: null,
    stages: [],
    classStages: [],
    withoutOne: null,
    soldOnly: { n: 10, median: 26 },
    unsold: { on: '2026-11-30', total: 0, cents: 0, ages: [], rebuilds: [] },
  };
}
