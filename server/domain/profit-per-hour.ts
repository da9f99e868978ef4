import type { RebuildFacts } from './facts.ts';
import { rebuildProfit } from './profit.ts';
import { completed, type Priced, priced } from './sets.ts';
import { median, ratio, sum } from './statistics.ts';

const SECONDS_PER_HOUR = 3600;

export interface PerHour {
  /** Rebuilds in the figure, and completed ones that are not (hours or purchase not known). */
  readonly n: number;
  readonly missingCount: number;
  /** Σ profit ÷ Σ hours, cents per hour; null = nobody's hours are known. */
  readonly pooledCents: number | null;
}

export interface ProfitPerHour {
  /** Per own, unpaid hour: the headline. */
  readonly own: PerHour & { readonly medianCents: number | null };
  /** Per hour of anybody, paid labor given back: what an hour of work brings. */
  readonly all: PerHour & { readonly paidLaborCents: number };
  /** What is left when own hours are paid the wanted wage. null = no wage given, or no hours. */
  readonly afterWage: {
    readonly n: number;
    readonly missingCount: number;
    readonly wantedCentsPerHour: number | null;
    readonly leftCents: number | null;
    readonly leftPerRebuildCents: number | null;
  };
}

/** Completed, purchase known, own hours known and above 0 (H of §4). */
export type Worked = Priced & { readonly ownSeconds: number };

/** The rebuilds that a profit per own hour can be said of. */
export function worked(facts: readonly RebuildFacts[]): Worked[] {
  return priced(facts).filter((rebuild): rebuild is Worked => rebuild.ownSeconds !== null && rebuild.ownSeconds > 0);
}

/** Profit per own hour of one rebuild, in cents. */
export function profitPerOwnHour(rebuild: Worked): number {
  return (rebuildProfit(rebuild).profitCents * SECONDS_PER_HOUR) / rebuild.ownSeconds;
}

/**
 * Three views of profit per hour (definitions §4, §18.2), hours as whole seconds. Numerators hold only the rebuilds
 * whose hours are known. own = Σ profit ÷ Σ own; all = (Σ profit + Σ paid labor) ÷ Σ (own + paid);
 * after wage = Σ profit − Σ own · wanted. Example: profits 3,000 and 1,000 over 100 and 25 hours: 32 an hour, median 35.
 */
export function profitPerHour(facts: readonly RebuildFacts[], wantedCentsPerHour: number | null): ProfitPerHour {
  const count = completed(facts).length;
  const own = worked(facts);
  const ownSeconds = sum(own.map((rebuild) => rebuild.ownSeconds));
  const profitCents = sum(own.map((rebuild) => rebuildProfit(rebuild).profitCents));
  const canPay = wantedCentsPerHour !== null && own.length > 0;
  const leftCents = canPay
    ? (profitCents * SECONDS_PER_HOUR - ownSeconds * wantedCentsPerHour) / SECONDS_PER_HOUR
    : null;
  const missingCount = count - own.length;
  return {
    own: {
      n: own.length,
      missingCount,
      pooledCents: ratio(profitCents * SECONDS_PER_HOUR, ownSeconds),
      medianCents: median(own.map(profitPerOwnHour)),
    },
    all: perHourOfAnybody(facts, count),
    afterWage: {
      n: own.length,
      missingCount,
      wantedCentsPerHour,
      leftCents,
      leftPerRebuildCents: leftCents === null ? null : leftCents / own.length,
    },
  };
}

function perHourOfAnybody(facts: readonly RebuildFacts[], count: number): ProfitPerHour['all'] {
  const set = priced(facts).filter(
    ({ ownSeconds, paidSeconds }) => ownSeconds !== null && paidSeconds !== null && ownSeconds + paidSeconds > 0,
  );
  const paidLaborCents = sum(set.map((rebuild) => rebuild.paidLaborCents));
  const profitCents = sum(set.map((rebuild) => rebuildProfit(rebuild).profitCents));
  const seconds = sum(set.map((rebuild) => (rebuild.ownSeconds ?? 0) + (rebuild.paidSeconds ?? 0)));
  return {
    n: set.length,
    missingCount: count - set.length,
    pooledCents: ratio((profitCents + paidLaborCents) * SECONDS_PER_HOUR, seconds),
    paidLaborCents,
  };
}
