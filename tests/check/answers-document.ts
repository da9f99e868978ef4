import { annualReturns } from '../../server/domain/annual-return.ts';
import { backTest, backTestTwoPart } from '../../server/domain/back-test.ts';
import { contingencies, LEVELS, type Level } from '../../server/domain/contingency.ts';
import type { RebuildFacts } from '../../server/domain/facts.ts';
import type { NetFlows } from '../../server/domain/net-flows.ts';
import { profit } from '../../server/domain/profit.ts';
import { profitPerHour } from '../../server/domain/profit-per-hour.ts';
import { completed, planned, plannedAndTold } from '../../server/domain/sets.ts';
import { twoPartRules } from '../../server/domain/two-part-rule.ts';
import { overrunByCell, returnByCell, whatPays } from '../../server/domain/what-pays.ts';
import { type Overhead, shopYears, type TiedUp } from '../../server/domain/years.ts';
import type { Questions } from '../support/portfolio-questions.ts';
import { OTHER_EXITS } from '#shared/vocabulary.ts';
import { bidEntry } from './bid-entries.ts';
import {
  backTestEntry,
  contingencyEntry,
  flatEntries,
  levelText,
  scoreEntry,
  twoPartEntry,
} from './contingency-entries.ts';
import { groupsEntry, paidGroupsEntry } from './group-entries.ts';
import { ladderEntry } from './ladder-entries.ts';
import { overrunEntry, projectEntries, surpriseEntry } from './overrun-entries.ts';
import { sellingEntry } from './selling-entries.ts';

/** What the answers are computed from. `tiedUp` holds one sum per shop year, the last at the as-of day. */
export interface DocumentInput {
  readonly format: 1 | 2;
  readonly name: string;
  readonly asOf: string;
  readonly startMonth: number;
  readonly wantedCentsPerHour: number | null;
  readonly overhead: readonly Overhead[];
  readonly facts: readonly RebuildFacts[];
  /** Flows of every rebuild that `hasFlows`, netted by day. */
  readonly flows: NetFlows;
  readonly tiedUp: readonly TiedUp[];
}

/** A document or part of one, in the words of the reference answers. */
export type Entry = Record<string, unknown>;

const WHOLE_PERCENTS: readonly Level[] = [50, 80, 90].map((p) => ({ p, q: 100 }));

/**
 * Every answer in the format of the reference portfolios' answers: format 1, and with format 2 what §18 adds. `asked`
 * are the cars and bids that the portfolio asks about.
 */
export function answersDocument(input: DocumentInput, asked: Questions): Entry {
  const { facts, format, asOf } = input;
  return {
    portfolio: input.name,
    as_of: asOf,
    counts: countsEntry(facts, format),
    totals: totalsEntry(facts),
    xirr: xirrEntry(input),
    profit_per_hour: perHourEntry(facts),
    ...(format === 2 && { per_hour_views: perHourViewsEntry(input) }),
    overrun: overrunEntry(facts, format),
    surprise: surpriseEntry(facts, format),
    days_to_sell: sellingEntry(facts, asOf, format),
    groups: {
      overrun: groupsEntry(overrunByCell(facts)),
      roc: groupsEntry(returnByCell(facts)),
      ...(format === 2 && { per_hour: whatPaysEntry(facts) }),
    },
    contingency: {
      n: planned(facts).length,
      levels: contingencies(facts, WHOLE_PERCENTS).map((one) => ({ level: one.level.p, ...contingencyEntry(one) })),
    },
    backtest: wholePercentBackTest(facts),
    ...(format === 2 && {
      ...fractionEntries(facts),
      ladder: asked.ladder.map((question) => ladderEntry(facts, question)),
      bids: asked.bids.map((question) => bidEntry(facts, question)),
      ...yearEntries(input),
    }),
    per_project: projectEntries(facts, format),
  };
}

function countsEntry(facts: readonly RebuildFacts[], format: 1 | 2): Entry {
  const exits = completed(facts).map((rebuild) => rebuild.exit.kind);
  const sold = exits.filter((kind) => kind === 'sold').length;
  const counts = { projects: facts.length, completed: exits.length, unsold: facts.length - exits.length };
  if (format === 1) return counts;
  const byKind = OTHER_EXITS.map((kind) => [kind, exits.filter((exit) => exit === kind).length]);
  return { ...counts, sold, other_exits: exits.length - sold, by_kind: Object.fromEntries(byKind) };
}

function totalsEntry(facts: readonly RebuildFacts[]): Entry {
  const one = profit(facts);
  return {
    purchase_cents: one.purchaseCents,
    rebuild_cents: one.workCents,
    cost_cents: one.costCents,
    sale_cents: one.proceedsCents,
    profit_cents: one.profitCents,
    n_loss: one.lossCount,
    roc_pooled: one.returnOnCost.pooled,
    roc_n: one.returnOnCost.n,
    roc_median: one.returnOnCost.median,
    roc_mean: one.returnOnCost.mean,
  };
}

function xirrEntry({ facts, flows, format }: DocumentInput): Entry {
  const one = annualReturns(facts, flows);
  const entry = { pooled: one.pooled, project_n: one.n, project_median: one.median };
  return format === 1 ? entry : { ...entry, n_undated: one.undatedCount };
}

function perHourEntry(facts: readonly RebuildFacts[]): Entry {
  const { own } = profitPerHour(facts, null);
  return { n_used: own.n, n_missing: own.missingCount, pooled_cents: own.pooledCents, median_cents: own.medianCents };
}

function perHourViewsEntry({ facts, wantedCentsPerHour }: DocumentInput): Entry {
  const { own, all, afterWage } = profitPerHour(facts, wantedCentsPerHour);
  return {
    own: { n_used: own.n, n_missing: own.missingCount, rate: own.pooledCents },
    all: {
      n_used: all.n,
      n_missing: all.missingCount,
      paid_labor_cents: all.paidLaborCents,
      rate: all.pooledCents,
    },
    after_wage: {
      n_used: afterWage.n,
      n_missing: afterWage.missingCount,
      wanted_cents_per_hour: afterWage.wantedCentsPerHour,
      left: afterWage.leftCents,
      left_per_project: afterWage.leftPerRebuildCents,
    },
  };
}

function whatPaysEntry(facts: readonly RebuildFacts[]): Entry {
  const { cells, classes, damages } = whatPays(facts, 'per-hour', null);
  return { cell: paidGroupsEntry(cells), class: paidGroupsEntry(classes), damage: paidGroupsEntry(damages) };
}

function wholePercentBackTest(facts: readonly RebuildFacts[]): Entry {
  const entries = (knowledge: 'sequence' | 'asKnown'): Entry[] =>
    backTest(facts, WHOLE_PERCENTS, knowledge).map((one) => ({
      level: one.level.p,
      not_attainable: one.notAttainableCount,
      ...scoreEntry(one.scores.percent),
      flat_rules: flatEntries(one, [10, 15, 20]),
    }));
  return { sequence: entries('sequence'), as_known: entries('asKnown') };
}

function fractionEntries(facts: readonly RebuildFacts[]): Entry {
  const twoPart = twoPartRules(facts, LEVELS);
  const n = planned(facts).length;
  const told = { n: plannedAndTold(facts).length, n_unknown: twoPart.unknownCount };
  return {
    contingency_fractions: {
      n,
      percent: contingencies(facts, LEVELS).map((one) => ({ level: levelText(one.level), ...contingencyEntry(one) })),
      two_part: {
        ...told,
        creep_percent: twoPart.rules[0]?.creepPercent ?? null,
        levels: twoPart.rules.map(twoPartEntry),
      },
    },
    backtest_fractions: {
      n,
      sequence: backTest(facts, LEVELS, 'sequence').map(backTestEntry),
      as_known: backTest(facts, LEVELS, 'asKnown').map(backTestEntry),
    },
    backtest_two_part: {
      ...told,
      sequence: backTestTwoPart(facts, LEVELS, 'sequence').map(backTestEntry),
      as_known: backTestTwoPart(facts, LEVELS, 'asKnown').map(backTestEntry),
    },
  };
}

function yearEntries(input: DocumentInput): Entry {
  const years = shopYears(input, input.tiedUp);
  const tiedUpEntry = (one: TiedUp | null): Entry | null =>
    one && { on: one.on, projects: one.rebuildCount, cents: one.cents };
  return {
    years: years.map((year) => ({
      year: year.year,
      from: year.from,
      to: year.to,
      exits: year.exitCount,
      sold: year.soldCount,
      profit_cents: year.profitCents,
      overhead_cents: year.overheadCents,
      kept_cents: year.keptCents,
      late_n: year.lateCount,
      late_cents: year.lateCents,
      tied_up: tiedUpEntry(year.tiedUp),
    })),
    tied_up: tiedUpEntry(input.tiedUp.find(({ on }) => on === input.asOf) ?? null),
  };
}
