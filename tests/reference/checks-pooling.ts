import { expect } from 'vitest';
import { groupComparison } from '../../server/domain/group-comparison.ts';
import { type RandomEffects, randomEffects } from '../../server/domain/random-effects.ts';
import { expectAllNear, expectNear, expectWithin, publicCheck } from '../support/public-check.ts';

interface Trials {
  yi: number[];
  vi: number[];
}

interface Pooled {
  mu: number;
  se: number;
  ci?: [number, number];
  Q?: number;
  tau2?: number;
  tau?: number;
  shrunken?: number[];
  shrunken_se?: number[];
  lambda?: number[];
}

function fit({ yi, vi }: Trials): RandomEffects {
  const effects = randomEffects(yi.map((mean, i) => ({ mean, variance: vi[i] ?? Number.NaN })));
  if (effects === null) throw new Error('no fit');
  return effects;
}

function derSimonianLaird(id: string): () => void {
  return () => {
    const { input, expected } = publicCheck<Trials, Pooled>(id);
    const effects = fit(input);
    const tolerance = 1e-8;
    expectAllNear([effects.mean, effects.standardError], [expected.mu, expected.se], tolerance);
    expectAllNear([effects.lower, effects.upper], expected.ci ?? [effects.lower, effects.upper], tolerance);
    expectNear(effects.q, expected.Q ?? effects.q, tolerance);
    expectNear(effects.betweenVariance, expected.tau2 ?? (expected.tau ?? Number.NaN) ** 2, tolerance);
    const columns = [
      ['value', expected.shrunken],
      ['standardError', expected.shrunken_se],
      ['weight', expected.lambda],
    ] as const;
    for (const [key, values] of columns) {
      const actual = effects.groups.map((group) => group[key]);
      expectAllNear(actual, values ?? actual, tolerance);
    }
  };
}

interface OneWay extends Record<'mean' | 'v' | 'lambda' | 'shrunk' | 'shrunk_se', number[]> {
  sp2: number;
  Q: number;
  tau2: number;
  mu: number;
  se: number;
}

export const poolingChecks: Record<string, () => void> = {
  'dl-bcg': derSimonianLaird('dl-bcg'),
  'dl-normand': derSimonianLaird('dl-normand'),
  'dl-clasp': derSimonianLaird('dl-clasp'),
  'dl-zero-tau': () => {
    const { input, expected } = publicCheck<Trials, Pooled>('dl-zero-tau');
    const effects = fit(input);
    expect(effects.betweenVariance).toBe(0);
    expectWithin(effects.mean, expected.mu, 1e-12);
    expectWithin(effects.standardError, expected.se, 1e-12);
    for (const [i, group] of effects.groups.entries())
      expectWithin(group.value, expected.shrunken?.[i] ?? Number.NaN, 1e-12);
  },
  'shrink-oneway': () => {
    const { input, expected } = publicCheck<{ y: number[]; group: string[] }, OneWay>('shrink-oneway');
    const { pooled, withinVariance, groups } = groupComparison(
      input.y.map((value, i) => ({ value, group: input.group[i] ?? '' })),
    );
    expectAllNear(
      [withinVariance, pooled?.q, pooled?.betweenVariance, pooled?.mean, pooled?.standardError],
      [expected.sp2, expected.Q, expected.tau2, expected.mu, expected.se],
      1e-8,
    );
    expectAllNear(
      groups.map((group) => group.mean),
      expected.mean,
      1e-8,
    );
    expectAllNear(
      groups.map((group) => group.variance),
      expected.v,
      1e-8,
    );
    expectAllNear(
      groups.map((group) => group.shrunken?.weight),
      expected.lambda,
      1e-8,
    );
    expectAllNear(
      groups.map((group) => group.shrunken?.value),
      expected.shrunk,
      1e-8,
    );
    expectAllNear(
      groups.map((group) => group.shrunken?.standardError),
      expected.shrunk_se,
      1e-8,
    );
  },
};
