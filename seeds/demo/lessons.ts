import { daysBetween } from '#shared/day.ts';
import type { RebuildFacts } from '../../server/domain/facts.ts';
import { overrun, rebuildOverrun } from '../../server/domain/overrun.ts';
import { profit } from '../../server/domain/profit.ts';
import { profitPerHour } from '../../server/domain/profit-per-hour.ts';
import { type Completed, completed } from '../../server/domain/sets.ts';
import { mean, sampleDeviation, sum } from '../../server/domain/statistics.ts';
import { creep, hoursOverrun, type Measured } from './bands.ts';
import { DEMO_DAMAGES, DEMO_TODAY } from './parameters.ts';

/** One thing that is true of the demo and that its answers should let a reader find. */
export interface Lesson {
  readonly name: string;
  readonly holds: boolean;
}

/** 90 % point of the normal distribution: ends of an 80 % interval. */
const Z80 = 1.2815515655446004;

/** The lessons hidden in the six years, L1 to L6 of the scenario. */
export function lessons({ facts, plannedSeconds }: Measured): Lesson[] {
  return [...unseenNotFront(facts), ...floodAndHail(facts), ...overTime(facts, plannedSeconds), ...headline(facts)];
}

/** L1: fronts look worst, but it is the bid unseen. */
function unseenNotFront(facts: readonly RebuildFacts[]): Lesson[] {
  const worst = (damage: string) => profit(ofDamage(facts, damage)).profitCents / ofDamage(facts, damage).length;
  const front = (isFront: boolean, seen: boolean) =>
    facts.filter((one) => one.seen === seen && (one.damage === 'front') === isFront);
  const overruns = (set: readonly RebuildFacts[]) =>
    completed(set)
      .map(rebuildOverrun)
      .filter((value) => value !== null);
  const gap = difference(
    overruns(facts.filter(({ seen }) => seen === false)),
    overruns(facts.filter(({ seen }) => seen === true)),
  );
  const strata = [true, false].map((seen) => difference(overruns(front(true, seen)), overruns(front(false, seen))));
  const both = pooled(strata);
  const pool = (isFront: boolean, seen: boolean) => overrun(front(isFront, seen)).pooled ?? 0;
  return [
    {
      name: 'L1 front keeps least of the common damages',
      holds: ['rear', 'side', 'hail', 'flood'].every((one) => worst('front') < worst(one)),
    },
    { name: 'L1 unseen overruns more than seen', holds: gap.center - Z80 * gap.error > 0 },
    {
      name: 'L1 so it is among fronts and among the others',
      holds: pool(true, false) - pool(true, true) > 0.1 && pool(false, false) - pool(false, true) > 0.1,
    },
    { name: 'L1 front itself makes no sure difference', holds: Math.abs(both.center) < Z80 * both.error },
  ];
}

/** L2 and L3: what the old sheet praises, and what the hours say. */
function floodAndHail(facts: readonly RebuildFacts[]): Lesson[] {
  const sheet = ranking((damage) => oldSheetDollars(ofDamage(facts, damage)));
  const cash = ranking(
    (damage) => profit(ofDamage(facts, damage)).profitCents / completed(ofDamage(facts, damage)).length,
  );
  const perHour = ranking((damage) => profitPerHour(ofDamage(facts, damage), null).own.pooledCents ?? 0);
  const isMiddling = (ranks: readonly string[]) => ranks.indexOf('flood') >= 3 && ranks.indexOf('flood') <= 6;
  const stuck = facts.some(
    ({ damage, exit, listedOn }) =>
      damage === 'flood' && exit === null && listedOn !== null && daysBetween(listedOn, DEMO_TODAY) > 180,
  );
  return [
    { name: 'L2 flood leads the old sheet', holds: sheet[0] === 'flood' },
    { name: 'L2 flood is middling over all that finished', holds: isMiddling(cash) && isMiddling(perHour) },
    { name: 'L2 and one flooded car finds no buyer', holds: stuck },
    { name: 'L3 hail and theft lead by the hour', holds: perHour.slice(0, 2).sort().join() === 'hail,theft' },
    { name: 'L3 hail is about fourth in the old sheet', holds: Math.abs(sheet.indexOf('hail') - 3) <= 1 },
  ];
}

/** L4 and L5: hours are never learned; paint made a step in 2024. */
function overTime(facts: readonly RebuildFacts[], plannedSeconds: ReadonlyMap<string, number>): Lesson[] {
  const bought = (from: number, to: number) =>
    facts.filter(({ boughtOn }) => boughtOn !== null && boughtOn >= `${from}` && boughtOn < `${to + 1}`);
  const paint = (from: number, to: number) => creep(bought(from, to), 'outside labor (sublet)') ?? 0;
  const hours = (from: number, to: number) => hoursOverrun(bought(from, to), plannedSeconds) ?? 0;
  const [before, step, after] = [paint(2021, 2023), paint(2024, 2024), paint(2025, 2026)];
  return [
    { name: 'L4 hours overrun as much as ever', holds: hours(2025, 2026) > hours(2022, 2024) - 0.08 },
    {
      name: 'L5 paint stepped up in 2024 and was half learned',
      holds: before < 0.12 && step > 0.25 && after > 0.08 && after < step - 0.08,
    },
  ];
}

/** L6: the old sheet's headline, the cash, and what is left after paying the owner. */
function headline(facts: readonly RebuildFacts[]): Lesson[] {
  const sheet = oldSheetDollars(facts);
  const left = profitPerHour(facts, 2_500).afterWage.leftPerRebuildCents ?? 0;
  return [
    { name: 'L6 the old sheet says some 3,800 a car', holds: sheet > 3_300 && sheet < 4_300 },
    { name: 'L6 after own hours at 25 a little is lost', holds: left > -80_000 && left < 0 },
  ];
}

/** Dollars a car as the old sheet reckons: sold ones only; no haul, small systems, wages, holding or surprises. */
export function oldSheetDollars(facts: readonly RebuildFacts[]): number {
  const columns = [
    'auction fees',
    'parts',
    'outside labor (sublet)',
    'restraints (SRS)',
    'title & registration',
    'inspection',
    'selling costs',
  ];
  const sold = completed(facts).filter(({ exit }) => exit.kind === 'sold');
  return (
    sum(sold.map((one) => one.exit.proceedsCents - (one.purchaseCents ?? 0) - inColumns(one, columns))) /
    sold.length /
    100
  );
}

function inColumns({ categories }: Completed, columns: readonly string[]): number {
  return sum(
    columns.map((name) => (categories.get(name)?.paidCents ?? 0) - (categories.get(name)?.unforeseenCents ?? 0)),
  );
}

function ofDamage(facts: readonly RebuildFacts[], damage: string): RebuildFacts[] {
  return completed(facts).filter((one) => one.damage === damage);
}

function ranking(score: (damage: string) => number): string[] {
  return [...DEMO_DAMAGES].sort((a, b) => score(b) - score(a));
}

interface Difference {
  readonly center: number;
  readonly error: number;
}

/** Mean of one less mean of the other, with Welch's standard error. */
function difference(one: readonly number[], other: readonly number[]): Difference {
  const spread = (values: readonly number[]) => (sampleDeviation(values) ?? 0) ** 2 / values.length;
  return { center: (mean(one) ?? 0) - (mean(other) ?? 0), error: Math.sqrt(spread(one) + spread(other)) };
}

/** Differences of several groups, weighted by how sure each is. */
function pooled(each: readonly Difference[]): Difference {
  const weights = each.map(({ error }) => 1 / error ** 2);
  const total = sum(weights);
  return { center: sum(each.map(({ center }, i) => center * (weights[i] ?? 0))) / total, error: Math.sqrt(1 / total) };
}
