import type { RebuildFacts } from './facts.ts';
import { rebuildProfit } from './profit.ts';
import { type Priced, priced } from './sets.ts';
import { FEW } from './statistics.ts';
import { byCodePoint } from './text-order.ts';

/** So many kinds of bill an old sheet holds: the largest, wages not among them. */
const BIG_BILLS = 3;

export interface Kept {
  readonly n: number;
  readonly keptCents: number;
}

export interface OldSheetGroup {
  readonly name: string;
  /** What an old sheet would say: sold ones, purchase and the big bills. */
  readonly old: Kept;
  /** Every way out and every entry. */
  readonly whole: Kept;
  /** Not gone yet: in neither. */
  readonly unsoldCount: number;
  /** 1 = most kept a rebuild, among groups of five or more. null = too few. */
  readonly oldRank: number | null;
  readonly wholeRank: number | null;
}

export interface OldSheet {
  /** The categories that it counts beside the purchase, the largest first. */
  readonly bills: readonly string[];
  readonly old: Kept;
  /** Sold ones only, but every entry. */
  readonly soldOnly: Kept;
  readonly whole: Kept;
  readonly classes: readonly OldSheetGroup[];
  readonly damages: readonly OldSheetGroup[];
}

/**
 * What a sheet of one row per sold vehicle would claim (trade practice; survivorship, definitions §1): sale − purchase − the
 * three largest kinds of bill, wages left out, sold ones only; beside it the same money with every entry and every way
 * out. Never a figure of its own, only a warning. Nothing finished: n 0. Example: sold for 10,000, bought for 5,000,
 * bills of 3,000, wages of 1,000: the old sheet says 2,000, and 1,000 was kept.
 */
export function oldSheet(facts: readonly RebuildFacts[], isWage: (category: string) => boolean): OldSheet {
  const set = priced(facts);
  const bills = bigBills(set, isWage);
  const all = emptySums();
  const classes = new Map<string, Sums>();
  const damages = new Map<string, Sums>();
  for (const rebuild of facts) {
    const { class: name, damage } = rebuild;
    if (rebuild.exit !== null) continue;
    if (name !== null) sumsIn(classes, name).unsoldCount += 1;
    if (damage !== null) sumsIn(damages, damage).unsoldCount += 1;
  }
  for (const rebuild of set) {
    const { class: name, damage } = rebuild;
    const claimed = claimedCents(rebuild, bills);
    take(all, rebuild, claimed);
    if (name !== null) take(sumsIn(classes, name), rebuild, claimed);
    if (damage !== null) take(sumsIn(damages, damage), rebuild, claimed);
  }
  const { old, soldOnly, whole } = all;
  return { bills, old, soldOnly, whole, classes: groupsOf(classes), damages: groupsOf(damages) };
}

function bigBills(set: readonly Priced[], isWage: (category: string) => boolean): string[] {
  const totals = new Map<string, number>();
  for (const { categories } of set) {
    for (const [name, { paidCents }] of categories) totals.set(name, (totals.get(name) ?? 0) + paidCents);
  }
  return [...totals]
    .filter(([name, cents]) => cents > 0 && !isWage(name))
    .sort(([a, x], [b, y]) => y - x || byCodePoint(a, b))
    .slice(0, BIG_BILLS)
    .map(([name]) => name);
}

function claimedCents({ exit, purchaseCents, categories }: Priced, bills: readonly string[]): number {
  let cents = exit.proceedsCents - purchaseCents;
  for (const name of bills) cents -= categories.get(name)?.paidCents ?? 0;
  return cents;
}

interface Sums {
  readonly old: { n: number; keptCents: number };
  readonly soldOnly: { n: number; keptCents: number };
  readonly whole: { n: number; keptCents: number };
  unsoldCount: number;
}

function emptySums(): Sums {
  const none = () => ({ n: 0, keptCents: 0 });
  return { old: none(), soldOnly: none(), whole: none(), unsoldCount: 0 };
}

function sumsIn(groups: Map<string, Sums>, name: string): Sums {
  const known = groups.get(name) ?? emptySums();
  groups.set(name, known);
  return known;
}

function take({ old, soldOnly, whole }: Sums, rebuild: Priced, claimed: number): void {
  const { profitCents } = rebuildProfit(rebuild);
  whole.n += 1;
  whole.keptCents += profitCents;
  if (rebuild.exit.kind !== 'sold') return;
  soldOnly.n += 1;
  soldOnly.keptCents += profitCents;
  old.n += 1;
  old.keptCents += claimed;
}

function groupsOf(groups: ReadonlyMap<string, Sums>): OldSheetGroup[] {
  const ranked = [...groups].filter(([, { old, whole }]) => whole.n >= FEW && old.n > 0);
  const order = (kept: (sums: Sums) => Kept) => {
    const mean = ([, sums]: [string, Sums]) => kept(sums).keptCents / kept(sums).n;
    return ranked.toSorted((a, b) => mean(b) - mean(a)).map(([name]) => name);
  };
  const [oldOrder, wholeOrder] = [order(({ old }) => old), order(({ whole }) => whole)];
  const rankIn = (names: readonly string[], name: string) => (names.includes(name) ? names.indexOf(name) + 1 : null);
  return [...groups]
    .sort(([a], [b]) => byCodePoint(a, b))
    .map(([name, { old, whole, unsoldCount }]) => {
      return { name, old, whole, unsoldCount, oldRank: rankIn(oldOrder, name), wholeRank: rankIn(wholeOrder, name) };
    });
}
