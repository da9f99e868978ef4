import type { z } from 'zod';
import type { contingencyAnswerSchema } from '#shared/contracts/answers-contingency.ts';
import type { Day } from '#shared/day.ts';
import { type Contingency, type Level, wholePercent } from '../../domain/contingency.ts';
import { drift } from '../../domain/drift.ts';
import type { PlannedOutcome } from '../../domain/sets.ts';

type Drift = z.input<typeof contingencyAnswerSchema>['drift'];

/** The last 24 months beside all years and the years before. */
export function driftOf(outcomes: readonly PlannedOutcome[], level: Level, today: Day): Drift {
  const { all, recent, before, ...rest } = drift(outcomes, level, today);
  return { ...rest, all: figureOf(all), recent: figureOf(recent), before: figureOf(before) };
}

function figureOf({ n, k, uplift, taken }: Contingency): Drift['all'] {
  return { n, k, uplift, percent: taken && wholePercent(taken) };
}
