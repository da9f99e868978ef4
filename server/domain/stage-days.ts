import { type Day, dayNumber } from '#shared/day.ts';
import { FEW, quantiles } from './statistics.ts';

/** The days that mark a rebuild's way; null = not known. */
export interface StageDates {
  readonly class: string | null;
  readonly boughtOn: Day | null;
  readonly pickedUpOn: Day | null;
  readonly startedOn: Day | null;
  readonly readyOn: Day | null;
  readonly titleIssuedOn: Day | null;
  readonly listedOn: Day | null;
  readonly exit: { readonly on: Day } | null;
}

/** The stages before the market, and all of a rebuild's time in the shop's hands. Selling has a curve of its own. */
export const WORK_STAGES = ['haul', 'queue', 'build', 'paper', 'listing', 'held'] as const;
export type WorkStage = (typeof WORK_STAGES)[number];

export interface StageDays {
  readonly stage: WorkStage;
  readonly n: number;
  /** Both days known, but the later one comes first: left out. */
  readonly oddCount: number;
  readonly median: number | null;
  readonly q10: number | null;
  readonly q90: number | null;
  readonly isThin: boolean;
}

const ENDS: Record<WorkStage, (one: StageDates) => readonly [Day | null, Day | null]> = {
  haul: ({ boughtOn, pickedUpOn }) => [boughtOn, pickedUpOn],
  queue: ({ pickedUpOn, startedOn }) => [pickedUpOn, startedOn],
  build: ({ startedOn, readyOn }) => [startedOn, readyOn],
  paper: ({ readyOn, titleIssuedOn }) => [readyOn, titleIssuedOn],
  listing: ({ titleIssuedOn, listedOn }) => [titleIssuedOn, listedOn],
  held: ({ boughtOn, exit }) => [boughtOn, exit?.on ?? null],
};

/**
 * Days from one mark to the next (trade dates: bought → picked up → started → roadworthy → title issued → listed; held:
 * bought → left), all together and by class: middle, 10th and 90th percentile (type 7), each over the rebuilds that
 * have both of its days in order. Nothing known: n 0 and null. Example: 3, 5 and 13 days: middle 5.
 */
export function stageDays(rebuilds: readonly StageDates[]) {
  const all = emptyStages();
  const byClass = new Map<string, Stages>();
  for (const one of rebuilds) {
    const own = one.class === null ? null : (byClass.get(one.class) ?? emptyStages());
    if (own && one.class !== null) byClass.set(one.class, own);
    for (const stage of WORK_STAGES) {
      const [from, to] = ENDS[stage](one);
      if (from === null || to === null) continue;
      const days = dayNumber(to) - dayNumber(from);
      for (const stages of own ? [all, own] : [all]) {
        if (days < 0) stages[stage].oddCount += 1;
        else stages[stage].days.push(days);
      }
    }
  }
  return { all: figuresOf(all), classes: new Map([...byClass].map(([name, stages]) => [name, figuresOf(stages)])) };
}

type Stages = Record<WorkStage, { days: number[]; oddCount: number }>;

function emptyStages(): Stages {
  const none = () => ({ days: [], oddCount: 0 });
  return { haul: none(), queue: none(), build: none(), paper: none(), listing: none(), held: none() };
}

function figuresOf(stages: Stages): StageDays[] {
  return WORK_STAGES.map((stage) => {
    const { days, oddCount } = stages[stage];
    // At one half type 7 is the median.
    const [q10 = null, median = null, q90 = null] = quantiles(days, [0.1, 0.5, 0.9]);
    return { stage, n: days.length, oddCount, median, q10, q90, isThin: days.length < FEW };
  });
}
