import type { z } from 'zod';
import type { contingencyAnswerSchema } from '#shared/contracts/answers-contingency.ts';
import { MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { Trial } from '../../domain/back-test.ts';
import { byOverrun } from '../../domain/contingency.ts';
import type { PlannedOutcome } from '../../domain/sets.ts';
import { residualCents } from '../../domain/two-part-rule.ts';
import { shopYearOf } from '../../domain/years.ts';
import { type AnswerInput, rebuildOf, refOf } from './input.ts';

type Row = z.input<typeof contingencyAnswerSchema>['trail'][number];

export interface TrailParts {
  readonly outcomes: readonly PlannedOutcome[];
  /** Those where every entry says whether it was foreseen. */
  readonly told: readonly PlannedOutcome[];
  readonly trials: readonly Trial[];
  readonly twoPartTrials: readonly Trial[];
  /** Of today's two-part rule. null = none. */
  readonly creepPercent: number | null;
}

/** Each rebuild against both rules that it would have had; the latest so many, with their places in order of overrun. */
export function trailOf(input: AnswerInput, parts: TrailParts): Row[] {
  const { outcomes, told, trials, creepPercent } = parts;
  const places = placesOf(outcomes.toSorted(byOverrun));
  const twoPart = new Map(parts.twoPartTrials.map((trial) => [trial.id, trial]));
  const lefts = told.map(({ id, ...one }) => ({ id, one, left: residualCents({ id, ...one }, creepPercent ?? 0) }));
  const leftPlaces = placesOf(lefts.toSorted((a, b) => a.left - b.left));
  const toldById = new Map(lefts.map(({ id, one, left }) => [id, { surpriseCents: one.surpriseCents, left }]));
  return trials.slice(-MARKS_AT_MOST).map((trial) => {
    const { id, exitOn, estimateCents, overrunCents, historySize, asked } = trial;
    const said = toldById.get(id);
    return {
      ...refOf(rebuildOf(input, id)),
      exitOn,
      year: shopYearOf(exitOn, input.shop.startMonth),
      estimateCents,
      overrunCents,
      overrun: overrunCents / estimateCents,
      place: places.get(id) ?? 0,
      knownCount: historySize,
      uplift: asked?.uplift ?? null,
      asked,
      twoPart: said
        ? {
            surpriseCents: said.surpriseCents,
            leftCents: said.left,
            place: leftPlaces.get(id) ?? 0,
            asked: twoPart.get(id)?.asked ?? null,
          }
        : null,
    };
  });
}

function placesOf(sorted: readonly { readonly id: string }[]): ReadonlyMap<string, number> {
  return new Map(sorted.map(({ id }, at) => [id, at + 1]));
}
