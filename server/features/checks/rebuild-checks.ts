import type { CheckGrade, CheckKind, CheckedAnswer } from '#shared/contracts/checks.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import { hasOddDates, isOverwritten } from '../../domain/sets.ts';

/** A fault that one rebuild's facts show by themselves. */
export interface RebuildCheck {
  readonly kind: CheckKind;
  readonly grade: CheckGrade;
  readonly answers: readonly CheckedAnswer[];
  /** The rebuilds that could have it: the answer wants to know how many of how many. */
  readonly isAmong: (rebuild: ShopRebuild) => boolean;
  readonly isFaulty: (rebuild: ShopRebuild) => boolean;
}

const everyone = () => true;
const hasLeft = ({ exit }: ShopRebuild) => exit !== null;
const isSold = ({ exit }: ShopRebuild) => exit?.kind === 'sold';
const isPlanned = (rebuild: ShopRebuild) => hasLeft(rebuild) && rebuild.estimateCents > 0 && !isOverwritten(rebuild);

/**
 * Money in categories that were never planned: above half of all, the overrun says more about the estimate than
 * about the work (definitions §15).
 */
function isThin({ categories, estimates, planningCents }: ShopRebuild): boolean {
  let unplanned = 0;
  for (const [name, { planningCents: cents }] of categories) {
    if ((estimates.get(name) ?? 0) === 0) unplanned += Math.max(0, cents);
  }
  return planningCents > 0 && unplanned * 2 > planningCents;
}

/** Every such fault, each with the rule of definitions.md that leaves the rebuild out (§4, §5, §6, §7, §9–§11b, §18.1). */
export const REBUILD_CHECKS: readonly RebuildCheck[] = [
  {
    kind: 'no purchase price',
    grade: 'left out',
    answers: ['year', 'what-pays'],
    isAmong: everyone,
    isFaulty: ({ purchaseCents }) => purchaseCents === null,
  },
  {
    kind: 'no purchase day',
    grade: 'left out',
    answers: ['year', 'contingency'],
    isAmong: everyone,
    isFaulty: ({ boughtOn }) => boughtOn === null,
  },
  {
    kind: 'no estimate',
    grade: 'left out',
    answers: ['overruns', 'contingency'],
    isAmong: hasLeft,
    isFaulty: ({ estimateCents }) => estimateCents === 0,
  },
  {
    kind: 'estimate written over',
    grade: 'left out',
    answers: ['overruns', 'contingency'],
    isAmong: hasLeft,
    isFaulty: isOverwritten,
  },
  {
    kind: 'no own hours',
    grade: 'left out',
    answers: ['what-pays', 'year'],
    isAmong: hasLeft,
    isFaulty: ({ ownSeconds }) => ownSeconds === null || ownSeconds === 0,
  },
  {
    kind: 'no planned hours',
    grade: 'left out',
    answers: ['overruns'],
    isAmong: hasLeft,
    isFaulty: ({ plannedSeconds }) => plannedSeconds === null || plannedSeconds === 0,
  },
  {
    kind: 'no listing day',
    grade: 'left out',
    answers: ['time-to-sell'],
    isAmong: isSold,
    isFaulty: ({ listedOn }) => listedOn === null,
  },
  {
    kind: 'dates out of order',
    grade: 'left out',
    answers: ['time-to-sell'],
    isAmong: everyone,
    isFaulty: hasOddDates,
  },
  {
    kind: 'no class',
    grade: 'left out',
    answers: ['what-pays', 'time-to-sell', 'contingency'],
    isAmong: everyone,
    isFaulty: (rebuild) => rebuild.class === null,
  },
  {
    kind: 'no damage',
    grade: 'left out',
    answers: ['what-pays', 'contingency'],
    isAmong: everyone,
    isFaulty: ({ damage }) => damage === null,
  },
  {
    kind: 'foreseen not said',
    grade: 'left out',
    answers: ['overruns', 'contingency'],
    isAmong: hasLeft,
    isFaulty: ({ hasUnknownForeseen }) => hasUnknownForeseen,
  },
  {
    kind: 'seen not said',
    grade: 'left out',
    answers: ['overruns', 'contingency'],
    isAmong: hasLeft,
    isFaulty: ({ seen }) => seen === null,
  },
  {
    kind: 'entry without a day',
    grade: 'left out',
    answers: ['year'],
    isAmong: hasLeft,
    isFaulty: ({ hasUndated }) => hasUndated,
  },
  {
    kind: 'thin estimate',
    grade: 'unsure',
    answers: ['overruns', 'contingency'],
    isAmong: isPlanned,
    isFaulty: isThin,
  },
];
