import { expect } from 'vitest';
import { kaplanMeier, medianDays, type Observation } from '../../server/domain/kaplan-meier.ts';
import { chiSquareTail, logRank } from '../../server/domain/log-rank.ts';
import { expectAllNear, expectNear, expectWithin, publicCheck } from '../support/public-check.ts';

interface Arm {
  time: number[];
  event: number[];
}

function observed({ time, event }: Arm): Observation[] {
  return time.map((days, i) => ({ days, isSold: event[i] === 1 }));
}

interface Table {
  time: number[];
  'n.risk': number[];
  'n.event': number[];
  surv: number[];
  se: (number | null)[];
  lo: (number | null)[];
  hi: (number | null)[];
  median: number;
  median_lo: number | null;
  median_hi: number | null;
}

/** Every row of a published table: at risk, events, S, its error and its limits, and the median with its interval. */
function wholeTable(id: string): () => void {
  return () => {
    const { input, expected } = publicCheck<Arm, Table>(id);
    const curve = kaplanMeier(observed(input));
    expect(curve.points.map((point) => point.days)).toEqual(expected.time);
    expect(curve.points.map((point) => point.atRiskCount)).toEqual(expected['n.risk']);
    expect(curve.points.map((point) => point.soldCount)).toEqual(expected['n.event']);
    const columns = [
      ['unsold', expected.surv],
      ['standardError', expected.se],
      ['lower', expected.lo],
      ['upper', expected.hi],
    ] as const;
    for (const [key, values] of columns) {
      const actual = curve.points.map((point) => point[key]);
      expectAllNear(actual, values, 1e-9);
    }
    const { median, median_lo: lower, median_hi: upper } = expected;
    expect(medianDays(curve)).toEqual({ days: median, lower, upper });
  };
}

interface TwoArms {
  observed: [number, number];
  expected: [number, number];
  variance: number;
  chi2: number;
  p: number;
}

function bothArms(id: string): () => void {
  return () => {
    const { input, expected } = publicCheck<Record<string, Arm>, TwoArms>(id);
    const [a, b] = Object.values(input).map(observed);
    const test = logRank(a ?? [], b ?? []);
    expect([test?.observedA, test?.observedB]).toEqual(expected.observed);
    expectAllNear(
      [test?.expectedA, test?.expectedB, test?.variance, test?.chiSquare],
      [...expected.expected, expected.variance, expected.chi2],
      1e-9,
    );
    expectNear(test?.p, expected.p, 1e-6);
  };
}

export const survivalChecks: Record<string, () => void> = {
  'km-6mp': wholeTable('km-6mp'),
  'km-placebo': wholeTable('km-placebo'),
  'km-aml-maintained': wholeTable('km-aml-maintained'),
  'km-aml-nonmaintained': wholeTable('km-aml-nonmaintained'),
  'km-naive-medians': () => {
    const { input, expected } = publicCheck<Arm, { correct_median: number }>('km-naive-medians');
    expect(medianDays(kaplanMeier(observed(input))).days).toBe(expected.correct_median);
  },
  'km-hand': () => {
    const { input, expected } = publicCheck<Arm, Record<string, number>>('km-hand');
    const curve = kaplanMeier(observed(input));
    const [first, second] = curve.points;
    const actual = [
      first?.unsold,
      first?.standardError,
      first?.lower,
      first?.upper,
      second?.unsold,
      medianDays(curve).days,
    ];
    const keys = ['S(1)', 'SE(1)', 'lo(1)', 'hi(1)', 'S(3)', 'median'];
    for (const [i, key] of keys.entries()) expectWithin(actual[i], expected[key] ?? Number.NaN, 1e-6);
  },
  'km-median-half': () => {
    const { input, expected } = publicCheck<Arm[], { medians: number[] }>('km-median-half');
    expect(input.map((arm) => medianDays(kaplanMeier(observed(arm))).days)).toEqual(expected.medians);
  },
  'logrank-6mp': bothArms('logrank-6mp'),
  'logrank-aml': bothArms('logrank-aml'),
  'chi2-tail': () => {
    const { input, expected } = publicCheck<{ chi2: number[] }, number[]>('chi2-tail');
    expectAllNear(input.chi2.map(chiSquareTail), expected, 1e-8);
  },
};
