import { ratio } from '../../domain/statistics.ts';
import { type AnswerInput, rebuildOf } from './input.ts';
import { type AgainstPlan, binsOf } from './spread.ts';

/** Each rebuild as a dot, or all of them as counts. */
export function marksOf(input: AnswerInput, each: readonly AgainstPlan[], isBinned: boolean) {
  if (isBinned) return { dots: [], bins: binsOf(each) };
  const dots = each.map(({ id, plan, actual }) => {
    return { id, tag: rebuildOf(input, id).tag, over: actual - plan, rate: (actual - plan) / plan };
  });
  return { dots, bins: [] };
}

/** What lies over plan, parted into surprises and known work costing more. The share stays within 0 and 1. */
export function partsOf(told: readonly AgainstPlan[], surpriseCents: number) {
  let overCents = 0;
  for (const { plan, actual } of told) overCents += actual - plan;
  const share = ratio(surpriseCents, overCents);
  return {
    n: told.length,
    overCents,
    surpriseCents,
    knownCents: overCents - surpriseCents,
    surpriseShare: share === null ? null : Math.min(1, Math.max(0, share)),
  };
}
