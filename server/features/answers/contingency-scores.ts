import type { z } from 'zod';
import type { contingencyAnswerSchema } from '#shared/contracts/answers-contingency.ts';
import { type BackTestLevel, FLAT_PERCENTS, type RuleName } from '../../domain/back-test.ts';

type BackTest = z.input<typeof contingencyAnswerSchema>['backTest'];
type Shown = BackTest['scores'][number]['rule'];

export const FLAT_RULES = FLAT_PERCENTS.map((percent) => `flat${percent}` as const);

const SHOWN: Readonly<Record<RuleName, Shown>> = {
  percent: 'percent',
  twoPart: 'two-part',
  flat10: 'flat 10',
  flat15: 'flat 15',
  flat20: 'flat 20',
  flat25: 'flat 25',
};

/** How each of these rules did, all on the same rebuilds. */
export function backTestOf(test: BackTestLevel | undefined, rules: readonly RuleName[]): BackTest {
  return {
    skippedCount: test?.skippedCount ?? 0,
    tooFewCount: test?.notAttainableCount ?? 0,
    scores: rules.flatMap((rule) => {
      const score = test?.scores[rule];
      return score ? [{ rule: SHOWN[rule], ...score }] : [];
    }),
  };
}
