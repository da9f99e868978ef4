import { daysToSell, type SellingTime } from '../../server/domain/days-to-sell.ts';
import type { RebuildFacts } from '../../server/domain/facts.ts';
import type { UnsoldAt } from '../../server/domain/kaplan-meier.ts';
import type { Entry } from './answers-document.ts';

export function sellingEntry(facts: readonly RebuildFacts[], asOf: string, format: 1 | 2): Entry {
  const one = daysToSell(facts, asOf);
  const test = one.comparison;
  return {
    overall: timeEntry(one.overall, format),
    by_class: one.classes.map((group) => ({ class: group.class, ...timeEntry(group, format) })),
    logrank: test && {
      class_a: test.classA,
      class_b: test.classB,
      n_a: test.nA,
      n_b: test.nB,
      observed_a: test.observedA,
      expected_a: test.expectedA,
      observed_b: test.observedB,
      expected_b: test.expectedB,
      variance: test.variance,
      chi2: test.chiSquare,
      p: test.p,
    },
    ...(format === 2 && { n_odd_dates: one.oddDatesCount, n_no_listed: one.noListedCount }),
  };
}

function timeEntry(time: SellingTime, format: 1 | 2): Entry {
  return {
    n: time.n,
    events: time.soldCount,
    ...(format === 2 && { other_exits: time.otherExitCount }),
    median_days: time.median.days,
    median_lo: time.median.lower,
    median_hi: time.median.upper,
    s30: atEntry(time.at30),
    s60: atEntry(time.at60),
    s90: atEntry(time.at90),
    few_data: time.isThin,
  };
}

function atEntry({ unsold, lower, upper }: UnsoldAt): Entry {
  return { s: unsold, lo: lower, hi: upper };
}
