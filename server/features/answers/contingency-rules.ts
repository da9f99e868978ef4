import type { z } from 'zod';
import type { contingencyAnswerSchema } from '#shared/contracts/answers-contingency.ts';
import { wholeUnits } from '../../domain/asked-rule.ts';
import { contingency, type Level, wholePercent } from '../../domain/contingency.ts';
import { coverageBand } from '../../domain/coverage-band.ts';
import { type Moves, percentWithoutOne, twoPartWithoutOne } from '../../domain/leave-one-out.ts';
import type { PlannedOutcome } from '../../domain/sets.ts';
import { sum } from '../../domain/statistics.ts';
import { twoPartRule } from '../../domain/two-part-rule.ts';
import { type AnswerInput, rebuildOf, refOf } from './input.ts';

type Answer = z.input<typeof contingencyAnswerSchema>;

/** One percentage: the overrun taken, the rebuild it comes from, and what any one rebuild moves. */
export function percentOf(input: AnswerInput, outcomes: readonly PlannedOutcome[], level: Level): Answer['percent'] {
  const { n, k, guarantee, uplift, taken } = contingency(outcomes, level);
  // The measure hands back the very outcome that it took.
  const outcome = outcomes.find((one) => one === taken);
  const moves = percentWithoutOne(outcomes, level);
  return {
    n,
    k,
    isAttainable: taken !== null,
    guarantee,
    band: coverageBand(n, k),
    uplift,
    percent: taken && wholePercent(taken),
    taken: outcome
      ? {
          ...refOf(rebuildOf(input, outcome.id)),
          estimateCents: outcome.estimateCents,
          overrunCents: outcome.overrunCents,
        }
      : null,
    without: moves && {
      uplift: movesTo(moves, (one) => one.overrunCents / one.estimateCents),
      percent: movesTo(moves, wholePercent),
    },
  };
}

function movesTo<T>({ lowest, highest }: Moves<T>, of: (one: T) => number): Moves<number> {
  return { lowest: of(lowest), highest: of(highest) };
}

/** A percentage for known work costing more and a sum for surprises. */
export function twoPartOf(outcomes: readonly PlannedOutcome[], level: Level): Answer['twoPart'] {
  const { n, k, creepPercent, flatCents } = twoPartRule(outcomes, level);
  return {
    n,
    k,
    isAttainable: flatCents !== null,
    guarantee: flatCents === null ? null : k / (n + 1),
    band: coverageBand(n, k),
    creepPercent,
    creepCents: sum(outcomes.map((one) => one.overrunCents - one.surpriseCents)),
    estimateCents: sum(outcomes.map((one) => one.estimateCents)),
    flatCents,
    adoptFlatCents: flatCents === null ? null : wholeUnits(flatCents),
    without: twoPartWithoutOne(outcomes, level),
  };
}
