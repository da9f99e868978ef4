import type { Formatter } from '#shared/formatter.ts';

/** Figures of a rule that can be adopted. */
export type RuleFigures = { percent: number; flatCents: number | null };

/** `24%`, or `12% and $450`. */
export function ruleText({ percent, flatCents }: RuleFigures, format: Formatter): string {
  const share = format.percent(percent / 100);
  return flatCents === null ? share : `${share} and ${format.money(flatCents)}`;
}

/** What to do with it: `Add 24% to every locked repair estimate.` */
export function ruleOrder({ percent, flatCents }: RuleFigures, format: Formatter): string {
  const share = format.percent(percent / 100);
  if (flatCents !== null)
    return `Add ${share} for known work costing more, and ${format.money(flatCents)} for surprises, to every locked repair estimate.`;
  return percent === 0 ? 'Add nothing: the estimate stands as it is.' : `Add ${share} to every locked repair estimate.`;
}
