import type { z } from 'zod';
import type { contingencyAnswerSchema } from '#shared/contracts/answers-contingency.ts';
import { type BackTestLevel, FLAT_PERCENTS, type RuleName } from '../../domain/back-test.ts';

type BackTest = z.input<typeof contingencyAnswerSchema>['backTest'];

const RULES: readonly (readonly [RuleName, BackTest['scores'][number]['rule']])[] = [
  ['percent', 'percent'],
  ['twoPart', 'two-part'],
  ...FLAT_PERCENTS.map((percent) => [`flat${percent}`, `flat ${percent}`] as const),
];

/** How each rule did, all on the same rebuilds. */
export function backTestOf(test: BackTestLevel | undefined): BackTest {
  return {
    skippedCount: test?.skippedCount ?? 0,
    tooFewCount: test?.notAttainableCount ?? 0,
    scores: RULES.flatMap(([name, rule]) => {
      const score = test?.scores[name];
      return score ? [{ rule, ...score }] : [];
    }),
  };
}
