import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { BidFigures, UsedRule } from '#shared/contracts/bids-parts.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { Rung } from '#shared/measures/ladder-rungs.ts';
import type { LevelName } from '#shared/vocabulary.ts';

type Kind = { readonly classId: string | null; readonly damageId: string | null; readonly n: number };

/** `your 8 finished rebuilds of hail, SUV`; a kind without class or damage is all of them. */
export function kindWords({ classId, damageId, n }: Kind, basis: BidBasis, format: Formatter): string {
  const nameOf = (words: BidBasis['classes'], id: string | null) => words.find((word) => word.id === id)?.name;
  const kind = [nameOf(basis.damages, damageId), nameOf(basis.classes, classId)].filter(Boolean).join(', ');
  return kind === ''
    ? `all your ${format.count(n, 'finished rebuild')}`
    : `your ${format.count(n, 'finished rebuild')} with ${kind}`;
}

/**
 * How plans usually end: `You usually end 17% over, on 41: $2,457` The amount is the typed plan with that on top.
 * '' = no past that tells.
 */
export function biasWords(
  { n, plan, actual }: { n: number; plan: number; actual: number },
  format: Formatter,
  { planned, write }: { planned: number | null; write: (value: number) => string },
): string {
  if (n === 0 || plan <= 0) return '';
  const rate = actual / plan - 1;
  const size = format.percent(Math.abs(rate));
  const side = size === format.percent(0) ? 'as planned' : `${size} ${rate > 0 ? 'over' : 'under'}`;
  const comes = planned ? `: ${write((planned * actual) / plan)}` : '';
  return `You usually end ${side}, on ${format.number(n)}${comes}`;
}

/** ` Looked at: the last 100 that left, of 330.` with its space before; '' = all of them are looked at. */
export function cutWords({ past, pastTotal }: BidBasis, format: Formatter): string {
  if (pastTotal <= past.length) return '';
  return ` Looked at: the last ${format.number(past.length)} that left, of ${format.number(pastTotal)}.`;
}

/** `4 in 5`. */
export function levelWords(level: LevelName): string {
  return level.replace('/', ' in ');
}

/** What a rung has in common with the car: `of this damage, unseen like this one`. */
export function rungWords(rung: Rung, isSeen: boolean | null): string {
  const seen = isSeen ? 'seen before bidding' : 'not seen before bidding';
  switch (rung) {
    case 'class+damage+seen':
      return `of this class and damage, ${seen}`;
    case 'damage+seen':
      return `of this damage, ${seen}`;
    case 'seen':
      return `of every kind, ${seen}`;
    case 'all':
      return 'of every kind';
  }
}

/** The rule in figures: `27% and $930`, `31%`, `20%`; '' = none. */
export function ruleFigures(rule: UsedRule, format: Formatter): string {
  const { overrunCents, estimateCents } = rule;
  const taken = overrunCents !== null && estimateCents ? Math.max(0, overrunCents / estimateCents) : null;
  const rate = rule.percent === null ? taken : rule.percent / 100;
  if (rate === null) return '';
  const share = format.percent(rate);
  return rule.flatCents ? `${share} and ${format.money(rule.flatCents)}` : share;
}

/** A rate as `about 7 times in 10`. */
export function timesInTen(rate: number): string {
  const tens = Math.round(rate * 10);
  if (tens === 0) return 'less than once in 10';
  return tens === 1 ? 'about once in 10' : `about ${tens} times in 10`;
}

/** `All of it together holds about 6 times in 10; it brings what you want about 9 times in 10, …`. '' = nothing tried. */
export function chanceWords({ both, wanted }: NonNullable<BidFigures['joint']>): string {
  if (both.rate === null || wanted.rate === null) return '';
  return `All of it together holds ${timesInTen(both.rate)}; it brings what you want ${timesInTen(wanted.rate)}, since a good sale may pay for a dear repair.`;
}

/** Can the bid be told from these figures? */
export function hasBid(figures: BidFigures | null): figures is BidFigures & { bidCents: number; roomCents: number } {
  return figures !== null && figures.bidCents !== null && figures.roomCents !== null;
}
