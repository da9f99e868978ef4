import type { RuleForCar } from '#shared/contracts/answers-rule-for-car.ts';
import type { Formatter } from '#shared/formatter.ts';
import { FEWEST_ON_RUNG, type Rung } from '#shared/measures/ladder-rungs.ts';
import type { Kind } from '../contingency/kind.ts';
import { bandWords, levelWords } from './contingency.ts';

/** What a group of past rebuilds has in common, as a heading and within a sentence. */
export const RUNG_WORDS: Record<Rung, { alike: string; basis: string }> = {
  'class+damage+seen': { alike: 'Class, damage and seen', basis: 'of this class and damage, seen or unseen alike' },
  'damage+seen': { alike: 'Damage and seen', basis: 'of this damage, seen or unseen alike' },
  seen: { alike: 'Seen before buying', basis: 'seen or unseen alike' },
  all: { alike: 'Nothing: all together', basis: 'all together' },
};

/** What to add for such a car, and what that is based on: the kind that the page shows first. */
export function sayForCar(found: RuleForCar, kind: Kind, format: Formatter): { order: string; basis: string }[] {
  const percent = { order: percentOrder(found, format), basis: basisOf(found, found.percent, format) };
  const twoPart = { order: twoPartOrder(found, format), basis: basisOf(found, found.twoPart, format) };
  return kind === 'percent' ? [percent, twoPart] : [twoPart, percent];
}

function percentOrder({ percent: { percent } }: RuleForCar, format: Formatter): string {
  if (percent === null) return 'One percentage: too few yet.';
  return percent === 0 ? 'Add nothing.' : `Add ${format.percent(percent / 100)}.`;
}

function twoPartOrder({ twoPart: { creepPercent, adoptFlatCents } }: RuleForCar, format: Formatter): string {
  if (creepPercent === null || adoptFlatCents === null) return 'Percentage and sum: too few yet.';
  return `Add ${format.percent(creepPercent / 100)} and ${format.money(adoptFlatCents)} for surprises.`;
}

function basisOf(
  { level }: RuleForCar,
  { rung, n, k, band }: RuleForCar['percent'] | RuleForCar['twoPart'],
  format: Formatter,
) {
  if (rung === null) {
    const lacking = Math.max(FEWEST_ON_RUNG - n, k > n ? 1 : 0);
    return `There are ${format.count(n, 'finished rebuild')} to go by; at least ${format.number(lacking)} more are needed.`;
  }
  const could = band ? `, could be ${bandWords(band)}` : '';
  return `Based on ${format.count(n, 'rebuild')} ${RUNG_WORDS[rung].basis}; set to hold ${levelWords(level)}${could}.`;
}
