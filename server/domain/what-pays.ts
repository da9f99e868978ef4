import type { PayView } from '#shared/vocabulary.ts';
import type { RebuildFacts } from './facts.ts';
import { type ComparedGroup, compareGroups, type GroupComparison, groupComparison } from './group-comparison.ts';
import { withoutFurthest } from './group-without-one.ts';
import { rebuildOverrun } from './overrun.ts';
import { addPay, NO_PAY, type PayFigure, type PaySums, payFigure, paySums } from './pay-figure.ts';
import { rebuildProfit } from './profit.ts';
import type { WithoutOne } from './ratio-without-one.ts';
import { completed, type Priced, priced } from './sets.ts';

/** The kind of wreck that a group stands for; of a margin one of the two is null. */
export interface Kind {
  readonly class: string | null;
  readonly damage: string | null;
}

export interface PaidGroup extends ComparedGroup, Kind {
  /** Σ ÷ Σ: beside the pulled mean, never in its place. */
  readonly plain: number | null;
  readonly sums: Readonly<PaySums>;
  /** The pulled figure without its furthest rebuild; null = thin, or it is alone. */
  readonly withoutOne: WithoutOne | null;
}

export interface PayFit extends Omit<GroupComparison, 'groups'> {
  readonly groups: readonly PaidGroup[];
  /** Rebuilds with a figure that are in no group: class or damage is not known. */
  readonly ungroupedCount: number;
}

export interface PayFits {
  readonly cells: PayFit;
  readonly classes: PayFit;
  readonly damages: PayFit;
}

/** Key of a class × damage cell; null = one of the two is not known, so the rebuild is in no cell. */
export function cellOf(rebuild: RebuildFacts): string | null {
  return rebuild.class === null || rebuild.damage === null ? null : `${rebuild.class}|${rebuild.damage}`;
}

/**
 * Which wrecks pay (definitions §9, §18.2, decisions 26): a view's figure of each rebuild, compared by class × damage, by
 * class and by damage; three fits, each on its own. Nobody has a figure: no groups.
 */
export function whatPays(facts: readonly RebuildFacts[], view: PayView, wantedCentsPerHour: number | null): PayFits {
  const figure = payFigure(view, wantedCentsPerHour);
  const members: Counted[] = [];
  const keyOf = cellKeys();
  for (const rebuild of priced(facts)) {
    const sums = paySums(rebuild);
    const value = figure(sums);
    if (value === null) continue;
    const { id, class: name, damage } = rebuild;
    members.push({ id, class: name, damage, cell: keyOf(rebuild), sums, value });
  }
  return {
    cells: fit(members, figure, {
      keyOf: ({ cell }) => cell,
      kindOf: ({ class: name, damage }) => ({ class: name, damage }),
    }),
    classes: fit(members, figure, { keyOf: (one) => one.class, kindOf: (one) => ({ class: one.class, damage: null }) }),
    damages: fit(members, figure, {
      keyOf: (one) => one.damage,
      kindOf: (one) => ({ class: null, damage: one.damage }),
    }),
  };
}

/** A rebuild as every fit sees it, worked out once. */
interface Counted extends Kind {
  readonly id: string;
  /** Holds both names, so that no two cells meet in one. null = a name is not known. */
  readonly cell: string | null;
  readonly sums: PaySums;
  readonly value: number;
}

/**
 * Gives a rebuild's cell its key, each made once: a text that is put together anew for every rebuild costs more to look
 * up than all the sums.
 */
function cellKeys(): (rebuild: Priced) => string | null {
  const keys = new Map<string, Map<string, string>>();
  return ({ class: name, damage }) => {
    if (name === null || damage === null) return null;
    const row = keys.get(name) ?? new Map<string, string>();
    keys.set(name, row);
    const key = row.get(damage) ?? `${name}\0${damage}`;
    row.set(damage, key);
    return key;
  };
}

/** How a fit groups: the key of a rebuild's group (null = in none), and the kind that the group is. */
interface Grouping {
  readonly keyOf: (one: Counted) => string | null;
  readonly kindOf: (one: Counted) => Kind;
}

interface Gathered {
  readonly kind: Kind;
  readonly sums: PaySums;
  readonly members: { readonly id: string; readonly value: number }[];
}

/** One fit on its own. */
function fit(members: readonly Counted[], figure: PayFigure, grouping: Grouping): PayFit {
  const gathered = gather(members, grouping);
  const values = new Map<string, number[]>();
  for (const [key, one] of gathered)
    values.set(
      key,
      one.members.map(({ value }) => value),
    );
  const comparison = compareGroups(values);
  const groups = comparison.groups.flatMap((group, at): PaidGroup[] => {
    const own = gathered.get(group.group);
    if (!own) return [];
    const { kind, sums } = own;
    const withoutOne = group.isThin ? null : withoutFurthest(comparison, at, own.members);
    return [{ ...group, ...kind, plain: figure(sums), sums, withoutOne }];
  });
  return { ...comparison, groups, ungroupedCount: members.length - comparison.n };
}

function gather(members: readonly Counted[], { keyOf, kindOf }: Grouping): Map<string, Gathered> {
  const groups = new Map<string, Gathered>();
  for (const one of members) {
    const key = keyOf(one);
    if (key === null) continue;
    let group = groups.get(key);
    if (!group) {
      group = { kind: kindOf(one), sums: { ...NO_PAY }, members: [] };
      groups.set(key, group);
    }
    addPay(group.sums, one.sums);
    group.members.push(one);
  }
  return groups;
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
