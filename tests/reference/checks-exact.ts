import { expect } from 'vitest';
import { walkForward } from '../../server/domain/back-test.ts';
import { contingency, rankAt } from '../../server/domain/contingency.ts';
import { reserve } from '#shared/measures/reserves.ts';
import { divideRounded, splitCents } from '#shared/money.ts';
import { checkVin } from '#shared/vin.ts';
import { expectWithin, publicCheck } from '../support/public-check.ts';

function vin(id: string): () => void {
  return () => {
    type Expected = { sum: number; check_digit: string; valid: boolean };
    const { input, expected } = publicCheck<{ vin: string }, Expected>(id);
    const { sum, expectedDigit, isValid } = checkVin(input.vin);
    expect({ sum, check_digit: expectedDigit, valid: isValid }).toEqual(expected);
  };
}

type Step = { project: number; k: number; reserve_cents: number; covered: boolean };
interface WalkForward {
  not_attainable: number;
  scored: number;
  covered: number;
  shortfall_cents: number;
  idle_reserve_cents: number;
  reserve_cents: number;
  steps: Step[];
}

function walkForwardMicro(): void {
  type Input = { actual_estimate_cents_in_order: [number, number][] };
  const { input, expected } = publicCheck<Input, Record<string, WalkForward>>('walk-forward-micro');
  const outcomes = input.actual_estimate_cents_in_order.map(([actual, estimateCents], i) => ({
    id: String(i + 1),
    exitOn: '2025-01-01',
    boughtOn: null,
    surpriseCents: 0,
    estimateCents,
    overrunCents: actual - estimateCents,
  }));
  const levels = Object.keys(expected).map((percent) => ({ p: Number(percent), q: 100 }));
  for (const result of walkForward(outcomes, { levels, knowledge: 'sequence', withTwoPart: false })) {
    const { percent } = result.scores;
    const steps = (result.trials.percent ?? []).flatMap(({ id, k, asked }) =>
      asked ? [{ project: Number(id), k, reserve_cents: asked.reserveCents, covered: asked.isCovered }] : [],
    );
    expect({
      not_attainable: result.notAttainableCount,
      scored: percent?.n,
      covered: percent?.x,
      shortfall_cents: percent?.shortCents,
      idle_reserve_cents: percent?.unusedCents,
      reserve_cents: percent?.reserveCents,
      steps,
    }).toEqual(expected[result.level.p]);
  }
}

function permutations(values: readonly number[]): number[][] {
  if (values.length < 2) return [[...values]];
  return values.flatMap((value) =>
    permutations(values.filter((other) => other !== value)).map((rest) => [value, ...rest]),
  );
}

/** In every order of six values, how often does the last stay within the k-th of the first five? */
function conformalEnumeration(): void {
  type Expected = { probability_that_6th_value_is_at_most_kth_smallest_of_first_5: Record<string, number> };
  const { input, expected } = publicCheck<{ values: number[] }, Expected>('conformal-enumeration');
  const orders = permutations(input.values);
  for (let k = 1; k <= 5; k += 1) {
    const within = orders.filter((order) => {
      const past = order.slice(0, 5).map((overrunCents) => ({ overrunCents, estimateCents: 100 }));
      return (order[5] ?? 0) <= (contingency(past, { p: k, q: 6 }).taken?.overrunCents ?? 0);
    });
    const chance = expected.probability_that_6th_value_is_at_most_kth_smallest_of_first_5[`k=${k}`];
    expectWithin(within.length / orders.length, chance ?? Number.NaN, 1e-12);
  }
}

export const exactChecks: Record<string, () => void> = {
  'conformal-ranks': () => {
    type Row = [number, number, number, boolean, number | null];
    const { expected } = publicCheck<unknown, { rows: Row[] }>('conformal-ranks');
    for (const [n, percent, k, isAttainable, guarantee] of expected.rows) {
      const values = Array.from({ length: n }, (_, i) => ({ overrunCents: i + 1, estimateCents: 100 }));
      const one = contingency(values, { p: percent, q: 100 });
      expect([n, percent, rankAt(n, one.level), one.taken !== null, one.guarantee]).toEqual([
        n,
        percent,
        k,
        isAttainable,
        guarantee,
      ]);
    }
  },
  'conformal-enumeration': conformalEnumeration,
  'walk-forward-micro': walkForwardMicro,
  'reserve-exact': () => {
    type Input = { actual: number; estimate_of_that_project: number; new_estimate: number };
    const { input, expected } = publicCheck<Input, { reserve_cents: number }>('reserve-exact');
    const estimateCents = input.estimate_of_that_project;
    const taken = { overrunCents: input.actual - estimateCents, estimateCents };
    expect(reserve(taken, input.new_estimate)).toBe(expected.reserve_cents);
  },
  'vin-1g4ah59h45g118341': vin('vin-1g4ah59h45g118341'),
  'vin-1j9rp1a36a1644345': vin('vin-1j9rp1a36a1644345'),
  'vin-1m8gdm9axkp042788': vin('vin-1m8gdm9axkp042788'),
  'vin-11111111111111111': vin('vin-11111111111111111'),
  'vin-1hgcm82633a004352': vin('vin-1hgcm82633a004352'),
  'vin-km8k2cab4pu001140': vin('vin-km8k2cab4pu001140'),
  'vin-invalid': () => {
    const { input, expected } = publicCheck<string[], { valid: boolean; expected_digit?: string }[]>('vin-invalid');
    for (const [i, text] of input.entries()) {
      const { isValid, expectedDigit } = checkVin(text);
      expect(isValid).toBe(expected[i]?.valid);
      expect(expectedDigit).toBe(expected[i]?.expected_digit ?? (isValid ? expectedDigit : null));
    }
  },
  'rounding-table': () => {
    const { input, expected } = publicCheck<{ values: number[] }, { half_up_away_from_zero: number[] }>(
      'rounding-table',
    );
    const rounded = input.values.map((value) => Number(divideRounded(BigInt(Math.round(value * 10)), 10n)));
    expect(rounded).toEqual(expected.half_up_away_from_zero);
  },
  'largest-remainder': () => {
    const { input, expected } = publicCheck<{ total: number; weights: number[] }[], number[][]>('largest-remainder');
    expect(input.map(({ total, weights }) => splitCents(total, weights))).toEqual(expected);
  },
};
