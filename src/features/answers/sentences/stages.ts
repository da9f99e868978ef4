import type { StageOfDays, TimeToSellAnswer } from '#shared/contracts/answers-time-to-sell.ts';
import type { Formatter } from '#shared/formatter.ts';

export const STAGE_WORDS: Record<StageOfDays['stage'], { name: string; from: string }> = {
  haul: { name: 'Fetching it', from: 'bought to picked up' },
  queue: { name: 'Waiting for work', from: 'picked up to started' },
  build: { name: 'In the shop', from: 'started to roadworthy' },
  paper: { name: 'Waiting for papers', from: 'roadworthy to title issued' },
  listing: { name: 'Getting it listed', from: 'title issued to listed' },
  sell: { name: 'On the market', from: 'listed to sold, the unsold counted' },
  held: { name: 'Held, all in all', from: 'bought to left' },
};

/** The stage with the most typical days, among those with enough rebuilds; null = too few everywhere. */
export function longestStage(stages: readonly StageOfDays[]): StageOfDays | null {
  const known = stages.filter(({ stage, isThin, median }) => stage !== 'held' && !isThin && median !== null);
  return known.reduce<StageOfDays | null>((a, b) => (a && (a.median ?? 0) >= (b.median ?? 0) ? a : b), null);
}

/** `Most days go in the shop: 82 days, of 149 from the purchase to the end.` */
export function whereTheDaysGo({ stages }: TimeToSellAnswer, format: Formatter): string {
  const longest = longestStage(stages);
  if (!longest || longest.median === null) return 'Too few yet to say which stage takes the most days.';
  const { name } = STAGE_WORDS[longest.stage];
  const held = stages.find(({ stage }) => stage === 'held');
  const all = held && !held.isThin && held.median !== null ? `, of ${format.number(held.median)} in all` : '';
  return `Most days go here: ${name.charAt(0).toLowerCase()}${name.slice(1)}, ${format.days(longest.median)}${all}.`;
}
