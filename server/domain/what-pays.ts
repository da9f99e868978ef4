import type { RebuildFacts } from './facts.ts';
import { type ComparedGroup, type GroupComparison, groupComparison } from './group-comparison.ts';
import { rebuildOverrun } from './overrun.ts';
import { profitPerOwnHour, type Worked, worked } from './profit-per-hour.ts';
import { rebuildProfit } from './profit.ts';
import { completed, priced } from './sets.ts';
import { sum } from './statistics.ts';

/** Key of a class × damage cell; null = one of the two is not known, so the rebuild is in no cell. */
export function cellOf(rebuild: RebuildFacts): string | null {
  return rebuild.class === null || rebuild.damage === null ? null : `${rebuild.class}|${rebuild.damage}`;
}

export interface PaidGroup extends ComparedGroup {
  /** Σ profit ÷ Σ own hours, cents per hour: beside the pulled mean, never in its place. */
  readonly plainCents: number;
  readonly profitCents: number;
  readonly ownSeconds: number;
}

export interface PerHourComparison extends Omit<GroupComparison, 'groups'> {
  readonly groups: readonly PaidGroup[];
  /** Rebuilds with hours that are in no group: class or damage is not known. */
  readonly ungroupedCount: number;
}

export interface WhatPays {
  readonly cells: PerHourComparison;
  readonly classes: PerHourComparison;
  readonly damages: PerHourComparison;
}

/**
 * Which wrecks pay (definitions §18.2, decisions 26): profit ÷ own hours per rebuild, cents per hour, compared by
 * class × damage, by class and by damage; three fits, each on its own. No hours known: no groups.
 */
export function whatPays(facts: readonly RebuildFacts[]): WhatPays {
  const set = worked(facts);
  return {
    cells: perHour(set, cellOf),
    classes: perHour(set, (rebuild) => rebuild.class),
    damages: perHour(set, (rebuild) => rebuild.damage),
  };
}

/** Overrun by class × damage (§9), over the rebuilds that have one. */
export function overrunByCell(facts: readonly RebuildFacts[]): GroupComparison {
  return byCell(completed(facts), rebuildOverrun);
}

/** Return on cost by class × damage (§9), over the rebuilds that have one. */
export function returnByCell(facts: readonly RebuildFacts[]): GroupComparison {
  return byCell(priced(facts), (rebuild) => rebuildProfit(rebuild).returnOnCost);
}

function byCell<T extends RebuildFacts>(set: readonly T[], valueOf: (rebuild: T) => number | null): GroupComparison {
  const values = set.flatMap((rebuild) => {
    const [group, value] = [cellOf(rebuild), valueOf(rebuild)];
    return group === null || value === null ? [] : [{ group, value }];
  });
  return groupComparison(values);
}

function perHour(set: readonly Worked[], groupOf: (rebuild: Worked) => string | null): PerHourComparison {
  const grouped = set.flatMap((rebuild) => {
    const group = groupOf(rebuild);
    return group === null ? [] : [{ group, rebuild }];
  });
  const comparison = groupComparison(
    grouped.map(({ group, rebuild }) => ({ group, value: profitPerOwnHour(rebuild) })),
  );
  const groups = comparison.groups.map((compared) => {
    const members = grouped.filter(({ group }) => group === compared.group).map(({ rebuild }) => rebuild);
    const profitCents = sum(members.map((rebuild) => rebuildProfit(rebuild).profitCents));
    const ownSeconds = sum(members.map((rebuild) => rebuild.ownSeconds));
    return { ...compared, profitCents, ownSeconds, plainCents: (profitCents * 3600) / ownSeconds };
  });
  return { ...comparison, groups, ungroupedCount: set.length - grouped.length };
}
