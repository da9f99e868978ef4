import { overrun } from '../../server/domain/overrun.ts';
import { mean, quantile, sampleDeviation, tInterval, wilson } from '../../server/domain/statistics.ts';
import { buildOutcome } from '../support/facts.ts';
import { expectAllNear, expectNear, expectWithin, publicCheck } from '../support/public-check.ts';

type Checks = Record<string, () => void>;

interface Univariate {
  data?: number[];
  digits?: string;
  rule?: { first: number; then_repeat_500_times: number[] };
}

/** NIST StRD, univariate. The certified autocorrelation is not computed here. */
function nist(id: string, deviationTolerance: number): () => void {
  return () => {
    const { input, expected } = publicCheck<Univariate, { mean: number; sample_sd: number }>(id);
    const repeated = Array.from({ length: 500 }, () => input.rule?.then_repeat_500_times ?? []).flat();
    const data = input.data ?? (input.rule ? [input.rule.first, ...repeated] : [...(input.digits ?? '')].map(Number));
    expectNear(mean(data), expected.mean, 1e-13);
    expectNear(sampleDeviation(data), expected.sample_sd, deviationTolerance);
  };
}

function typeSeven(id: string): () => void {
  return () => {
    const { input, expected } = publicCheck<{ data: number[]; p: number[] }, { type7: number[] }>(id);
    expectAllNear(
      input.p.map((p) => quantile(input.data, p)),
      expected.type7,
      1e-12,
    );
  };
}

/** Newcombe 1998, method 3. Clopper–Pearson limits of the same rows are not computed here. */
function wilsonRow(id: string): () => void {
  return () => {
    type Expected = { wilson: [number, number]; wilson_published?: [number, number] };
    const { input, expected } = publicCheck<{ x: number; n: number }, Expected>(id);
    const { lower, upper } = wilson(input.x, input.n);
    expectAllNear([lower, upper], expected.wilson, 1e-9);
    for (const [i, value] of (expected.wilson_published ?? []).entries()) expectWithin([lower, upper][i], value, 5e-5);
  };
}

export const statisticsChecks: Checks = {
  'nist-numacc1': nist('nist-numacc1', 1e-11),
  'nist-numacc2': nist('nist-numacc2', 1e-11),
  'nist-numacc3': nist('nist-numacc3', 1e-8),
  'nist-numacc4': nist('nist-numacc4', 1e-8),
  'nist-mavro': nist('nist-mavro', 1e-11),
  'nist-michelso': nist('nist-michelso', 1e-11),
  'nist-lew': nist('nist-lew', 1e-11),
  'nist-lottery': nist('nist-lottery', 1e-11),
  'nist-pidigits': nist('nist-pidigits', 1e-11),
  'quantile-nist-handbook': () => {
    const { input, expected } = publicCheck<{ data: number[]; p: number }, { type7: number }>('quantile-nist-handbook');
    expectNear(quantile(input.data, input.p), expected.type7, 1e-12);
  },
  'quantile-all-types-nist': typeSeven('quantile-all-types-nist'),
  'quantile-all-types-small': typeSeven('quantile-all-types-small'),
  'quantile-spreadsheet-docs': () => {
    type Row = { fn: string; data: number[]; p: number };
    const { input, expected } = publicCheck<Row[], number[]>('quantile-spreadsheet-docs');
    for (const [i, row] of input.entries()) {
      if (row.fn.includes('type 7')) expectNear(quantile(row.data, row.p), expected[i] ?? null, 1e-12);
    }
  },
  'wilson-cp-81-263': wilsonRow('wilson-cp-81-263'),
  'wilson-cp-15-148': wilsonRow('wilson-cp-15-148'),
  'wilson-cp-0-20': wilsonRow('wilson-cp-0-20'),
  'wilson-cp-1-29': wilsonRow('wilson-cp-1-29'),
  'wilson-cp-20-20': wilsonRow('wilson-cp-20-20'),
  'wilson-cp-0-10': wilsonRow('wilson-cp-0-10'),
  'wilson-cp-10-10': wilsonRow('wilson-cp-10-10'),
  'wilson-cp-5-10': wilsonRow('wilson-cp-5-10'),
  't-interval-zarr13': () => {
    type Input = { n: number; mean: number; sample_sd: number };
    const { input, expected } = publicCheck<Input, { lower: number; upper: number }>('t-interval-zarr13');
    const interval = tInterval(input.mean, input.sample_sd, input.n);
    expectWithin(interval?.lower, expected.lower, 2e-6);
    expectWithin(interval?.upper, expected.upper, 2e-6);
  },
  't-quantiles': () => {
    const { input, expected } = publicCheck<{ df: number[] }, number[]>('t-quantiles');
    // With mean 0 and SD √n the upper end is the t quantile itself.
    const quantiles = input.df.map((df) => tInterval(0, Math.sqrt(df + 1), df + 1)?.upper);
    expectAllNear(quantiles, expected, 1e-9);
  },
  't-test-sleep': () => {
    type Expected = { mean: number; sd: number; ci95: [number, number] };
    const { input, expected } = publicCheck<{ differences: number[] }, Expected>('t-test-sleep');
    const deviation = sampleDeviation(input.differences);
    const interval = tInterval(mean(input.differences) ?? Number.NaN, deviation, input.differences.length);
    expectNear(mean(input.differences), expected.mean, 1e-9);
    expectNear(deviation, expected.sd, 1e-9);
    expectAllNear([interval?.lower, interval?.upper], expected.ci95, 1e-9);
  },
  'ratios-pooled-mean': () => {
    type Input = { estimate: number[]; actual: number[] };
    type Expected = { pooled: number; mean: number; median: number };
    const { input, expected } = publicCheck<Input, Expected>('ratios-pooled-mean');
    const one = overrun(input.estimate.map((estimate, i) => buildOutcome(String(i), input.actual[i] ?? 0, estimate)));
    expectAllNear([one.pooled, one.mean, one.median], [expected.pooled, expected.mean, expected.median], 1e-12);
  },
};
