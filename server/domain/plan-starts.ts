import type { RebuildFacts } from './facts.ts';
import { median } from './statistics.ts';

/** A rebuild with the hours of its locked estimate, own and paid together. null = none planned. */
export type PlannedFacts = RebuildFacts & { readonly plannedSeconds: number | null };

/** What past rebuilds of one kind were planned at and came to. Medians; cents and seconds; null = nobody said. */
export interface PlanStart {
  readonly n: number;
  /** Per category, over those that planned for it. */
  readonly categories: ReadonlyMap<
    string,
    { readonly n: number; readonly planCents: number; readonly actualCents: number }
  >;
  readonly hours: {
    readonly n: number;
    readonly plannedSeconds: number | null;
    readonly actualSeconds: number | null;
    /** The unpaid part of the actual ones. */
    readonly ownSeconds: number | null;
  };
}

/**
 * Where the plan of the next like car may start: medians of plan and actual per category and of hours, over finished
 * rebuilds with an estimate (of set K). Actual is the planning actual of definitions §18.1. Example: parts planned at
 * 900, 1,000 and 1,400 that came to 1,000, 1,300 and 1,300: n 3, 1,000 planned, 1,300 actual.
 */
export function planStart(set: readonly PlannedFacts[]): PlanStart {
  const pairs = new Map<string, { plan: number[]; actual: number[] }>();
  for (const { estimates, categories } of set) {
    for (const [category, cents] of estimates) {
      if (cents === 0) continue;
      const pair = pairs.get(category) ?? { plan: [], actual: [] };
      pairs.set(category, pair);
      pair.plan.push(cents);
      pair.actual.push(categories.get(category)?.planningCents ?? 0);
    }
  }
  const rows = [...pairs].map(([category, { plan, actual }]) => {
    return [category, { n: plan.length, planCents: middle(plan), actualCents: middle(actual) }] as const;
  });
  return { n: set.length, categories: new Map(rows), hours: startingHours(set) };
}

/** The median to the whole cent: it is where a plan starts, not a figure to reckon on with. */
function middle(cents: readonly number[]): number {
  return Math.round(median(cents) ?? 0);
}

function startingHours(set: readonly PlannedFacts[]): PlanStart['hours'] {
  const timed = timedOf(set);
  return {
    n: timed.length,
    plannedSeconds: median(timed.map((one) => one.planned)),
    actualSeconds: median(timed.map((one) => one.own + one.paid)),
    ownSeconds: median(timed.map((one) => one.own)),
  };
}

/** Σ hours planned and worked, over finished rebuilds where planned, own and paid hours are all known. */
export function hoursBias(rebuilds: readonly PlannedFacts[]) {
  const sums = { n: 0, plannedSeconds: 0, actualSeconds: 0 };
  for (const { planned: plan, own, paid } of timedOf(rebuilds.filter(({ exit }) => exit !== null))) {
    sums.n += 1;
    sums.plannedSeconds += plan;
    sums.actualSeconds += own + paid;
  }
  return sums;
}

function timedOf(set: readonly PlannedFacts[]): { planned: number; own: number; paid: number }[] {
  return set.flatMap(({ plannedSeconds, ownSeconds: own, paidSeconds: paid }) =>
    plannedSeconds && own !== null && paid !== null ? [{ planned: plannedSeconds, own, paid }] : [],
  );
}
