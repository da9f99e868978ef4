import type { z } from 'zod';
import type { contingencyAnswerSchema } from '#shared/contracts/answers-contingency.ts';
import { MARKS_AT_MOST } from '#shared/contracts/answers-parts.ts';
import type { Trial } from '../../domain/back-test.ts';
import type { PlannedOutcome } from '../../domain/sets.ts';
import { residualCents } from '../../domain/two-part-rule.ts';
import { shopYearOf } from '../../domain/years.ts';
import { type AnswerInput, rebuildOf, refOf } from './input.ts';

type Row = z.input<typeof contingencyAnswerSchema>['trail'][number];

export interface TrailParts {
  /** All of them, in order of overrun. */
  readonly sorted: readonly PlannedOutcome[];
  /** Those where every entry says whether it was foreseen. */
  readonly told: readonly PlannedOutcome[];
  readonly trials: readonly Trial[];
  readonly twoPartTrials: readonly Trial[];
  /** Of today's two-part rule. null = none. */
  readonly creepPercent: number | null;
}

/** Each rebuild against both rules that it would have had; the latest so many, with their places in order of overrun. */
export function trailOf(input: AnswerInput, parts: TrailParts): Row[] {
  const shown = parts.trials.slice(-MARKS_AT_MOST);
  const places = placesOf(parts.sorted);
  const twoPart = twoPartOf(parts);
  return shown.map((trial) => {
    const { id, exitOn, estimateCents, overrunCents, historySize, asked } = trial;
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
      twoPart: twoPart(id),
    };
  });
}

/** What the two-part rule sees of a rebuild. null = foreseen is not said of every entry. */
function twoPartOf({ told, twoPartTrials, creepPercent }: TrailParts): (id: string) => Row['twoPart'] {
  const lefts = told.map((one) => ({ one, id: one.id, leftCents: residualCents(one, creepPercent ?? 0) }));
  const places = placesOf(lefts.toSorted((a, b) => a.leftCents - b.leftCents));
  const at = new Map<string, number>();
  for (const [i, { id }] of told.entries()) at.set(id, i);
  return (id) => {
    const left = lefts[at.get(id) ?? -1];
    if (!left) return null;
    // Trials stand in the order of the rebuilds that they are of.
    const asked = twoPartTrials[at.get(id) ?? -1]?.asked ?? null;
    return { surpriseCents: left.one.surpriseCents, leftCents: left.leftCents, place: places.get(id) ?? 0, asked };
  };
}

function placesOf(sorted: readonly { readonly id: string }[]): ReadonlyMap<string, number> {
  const places = new Map<string, number>();
  for (const { id } of sorted) places.set(id, places.size + 1);
  return places;
}
