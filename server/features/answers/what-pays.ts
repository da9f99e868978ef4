import type { z } from 'zod';
import type { FilterQuery } from '#shared/contracts/answers-parts.ts';
import type { Comparison, whatPaysAnswerSchema } from '#shared/contracts/answers-what-pays.ts';
import { type ComparedGroup, compareGroups, type GroupComparison } from '../../domain/group-comparison.ts';
import { profit, rebuildProfit } from '../../domain/profit.ts';
import { type Priced, priced } from '../../domain/sets.ts';
import { ratio } from '../../domain/statistics.ts';
import { cellOf } from '../../domain/what-pays.ts';
import { filtered, filterOptions } from './filter.ts';
import { type AnswerInput, leftOut } from './input.ts';
import { perHourViews } from './per-hour-views.ts';

type Answer = z.input<typeof whatPaysAnswerSchema>;
type Group = Comparison['groups'][number];

/** Which wrecks pay? Profit per own hour, and on cost, by class × damage and by each alone (definitions §9, §18.2). */
export function whatPaysAnswer(input: AnswerInput, query: FilterQuery): Answer {
  const { shop, today } = input;
  const rebuilds = filtered(input, query, 'left');
  const done = rebuilds.filter(({ exit }) => exit !== null);
  const { noPurchaseCount: _, ...totals } = profit(rebuilds);
  const keyOf = cellKeys();
  const all = priced(rebuilds).map((one) => counted(one, keyOf(one)));
  const hours = all.filter(({ ownSeconds }) => ownSeconds > 0);
  const returns = all.filter(({ costCents }) => costCents > 0);
  return {
    asOf: today,
    rebuildCount: rebuilds.length,
    filters: filterOptions(input, 'left'),
    leftOut: leftOut([
      ['not sold yet', rebuilds.filter(({ exit }) => exit === null)],
      ['purchase not known', done.filter(({ purchaseCents }) => purchaseCents === null)],
      ['own hours not known', done.filter(({ ownSeconds }) => !ownSeconds)],
      ['class or damage not known', done.filter((one) => cellOf(one) === null)],
    ]),
    totals,
    views: perHourViews(rebuilds, shop.wantedCentsPerHour),
    perHour: threeFits(input, hours, ({ profitCents, ownSeconds }) => ratio(profitCents * 3600, ownSeconds)),
    returnOnCost: threeFits(input, returns, ({ profitCents, costCents }) => ratio(profitCents, costCents)),
  };
}

interface Sums {
  profitCents: number;
  ownSeconds: number;
  costCents: number;
}
interface Cell {
  readonly class: string | null;
  readonly damage: string | null;
}
/** A rebuild's cell and what it adds to the sums, worked out once for all fits. */
interface Counted extends Readonly<Sums>, Cell {
  /** Of the cell; holds both names, so that no two cells meet in one. null = a name is not known. */
  readonly key: string | null;
}
/** The figure of one rebuild, and of a group's sums: sum over sum. */
type Figure = (sums: Readonly<Sums>) => number | null;

/**
 * Gives a rebuild's cell its key, each made once: a text that is put together anew for every rebuild costs more to
 * look up than all the sums.
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

function counted(rebuild: Priced, key: string | null): Counted {
  const { profitCents, costCents } = rebuildProfit(rebuild);
  const { class: name, damage, ownSeconds } = rebuild;
  return { class: name, damage, key, profitCents, costCents, ownSeconds: ownSeconds ?? 0 };
}

/** How a fit groups: the key of a rebuild's group (null = in none), and the part of its cell that names it. */
interface Grouping {
  readonly keyOf: (one: Counted) => string | null;
  readonly nameOf: (cell: Cell) => Cell;
}
const BY_CELL: Grouping = { keyOf: ({ key }) => key, nameOf: ({ class: name, damage }) => ({ class: name, damage }) };
const BY_CLASS: Grouping = {
  keyOf: ({ class: name }) => name,
  nameOf: ({ class: name }) => ({ class: name, damage: null }),
};
const BY_DAMAGE: Grouping = { keyOf: ({ damage }) => damage, nameOf: ({ damage }) => ({ class: null, damage }) };

function threeFits(input: AnswerInput, members: readonly Counted[], figure: Figure): Answer['perHour'] {
  return {
    cells: fit(input, members, figure, BY_CELL),
    classes: fit(input, members, figure, BY_CLASS),
    damages: fit(input, members, figure, BY_DAMAGE),
  };
}

/** One fit on its own. */
function fit({ shop }: AnswerInput, members: readonly Counted[], figure: Figure, grouping: Grouping): Comparison {
  const { cells, values } = gathered(members, figure, grouping);
  const comparison = compareGroups(values);
  const idIn = (list: readonly { id: string; name: string }[], name: string | null) =>
    list.find((item) => item.name === name)?.id ?? null;
  const groups = comparison.groups.map((group): Group => {
    const { cell, sums } = cells.get(group.group) ?? { cell: { class: null, damage: null }, sums: NOTHING };
    return {
      classId: idIn(shop.classes, cell.class),
      className: cell.class,
      damageId: idIn(shop.damages, cell.damage),
      damageName: cell.damage,
      plain: figure(sums),
      ...figuresOf(group),
      ...sums,
    };
  });
  return { ...heading(comparison), ungroupedCount: members.length - comparison.n, groups: ranked(groups) };
}

/** Each group's cell, sums and single figures. */
function gathered(members: readonly Counted[], figure: Figure, { keyOf, nameOf }: Grouping) {
  const cells = new Map<string, { cell: Cell; sums: Sums }>();
  const values = new Map<string, number[]>();
  for (const one of members) {
    const group = keyOf(one);
    if (group === null) continue;
    let known = cells.get(group);
    if (!known) {
      known = { cell: nameOf(one), sums: { ...NOTHING } };
      cells.set(group, known);
      values.set(group, []);
    }
    add(known.sums, one);
    values.get(group)?.push(figure(one) ?? 0);
  }
  return { cells, values };
}

const NOTHING: Sums = { profitCents: 0, ownSeconds: 0, costCents: 0 };

function add(sums: Sums, more: Readonly<Sums>): void {
  sums.profitCents += more.profitCents;
  sums.costCents += more.costCents;
  sums.ownSeconds += more.ownSeconds;
}

function figuresOf({ n, mean, deviation, interval, shrunken, isThin }: ComparedGroup) {
  const { lower, upper } = interval ?? { lower: null, upper: null };
  return { n, mean, deviation, lower, upper, pulled: shrunken, isThin, rank: null };
}

function heading({ n, withinVariance, pooled }: GroupComparison): Pick<Comparison, 'n' | 'withinVariance' | 'average'> {
  return { n, withinVariance, average: pooled };
}

/** Ranks by the lower end of the pulled interval (decisions 26), the thin ones not at all. */
function ranked(groups: Group[]): Group[] {
  const order = groups
    .filter(({ isThin, pulled }) => !isThin && pulled !== null)
    .sort((a, b) => (b.pulled?.lower ?? 0) - (a.pulled?.lower ?? 0));
  return groups.map((group) => ({ ...group, rank: order.includes(group) ? order.indexOf(group) + 1 : null }));
}
