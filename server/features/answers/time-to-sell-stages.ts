import type { StageOfDays, TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import type { ShopRebuild } from '../../books/shop-facts.ts';
import type { DaysToSell, SellingTime } from '../../domain/days-to-sell.ts';
import { type StageDays, stageDays } from '../../domain/stage-days.ts';
import type { AnswerInput } from './input.ts';

type Stages = Pick<TimeToSellAnswer, 'stages' | 'classStages'>;

/** Days in each stage, all together and by class in the shop's order. Selling stands before all of it together. */
export function stagesOf({ shop }: AnswerInput, rebuilds: readonly ShopRebuild[], selling: DaysToSell): Stages {
  const { all, classes } = stageDays(rebuilds);
  const classStages = shop.classes.flatMap(({ id, name }) => {
    const own = classes.get(name);
    const curve = selling.classes.find((one) => one.class === name);
    return own ? [{ classId: id, name, stages: withSelling(own, curve) }] : [];
  });
  return { stages: withSelling(all, selling.overall, selling.oddDatesCount), classStages };
}

function withSelling(stages: readonly StageDays[], time: SellingTime | undefined, oddCount = 0): StageOfDays[] {
  const before = stages.filter(({ stage }) => stage !== 'held');
  const held = stages.filter(({ stage }) => stage === 'held');
  return [...before, sellingStage(time, oddCount), ...held];
}

/** The curve's days at which nine, five and one of ten are still unsold, so that those who wait count too. */
function sellingStage(time: SellingTime | undefined, oddCount: number): StageOfDays {
  const dayAt = (share: number) => time?.curve.points.find(({ unsold }) => unsold <= share + 1e-9)?.days ?? null;
  return {
    stage: 'sell',
    n: time?.n ?? 0,
    oddCount,
    median: time?.median.days ?? null,
    q10: dayAt(0.9),
    q90: dayAt(0.1),
    isThin: time?.isThin ?? true,
  };
}
