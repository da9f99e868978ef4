import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import type { StripDot, StripRow } from '../../../charts/dot-strip-layout.ts';
import { capital } from '../../../lib/capital.ts';

type Spread = OverrunsAnswer['total'] | OverrunsAnswer['hours'];
type Path = (id: string) => string;

/** Categories that somebody planned for, most cents over first. */
export function byMoneyOver(categories: OverrunsAnswer['categories']): OverrunsAnswer['categories'] {
  const over = (one: OverrunsAnswer['categories'][number]) => one.actualCents - one.estimateCents;
  return categories.filter((one) => one.n > 0).toSorted((a, b) => over(b) - over(a));
}

/** All together, hours, then each category: what the dot strip draws. Middle and spread are left out where too few. */
export function stripRows(answer: OverrunsAnswer, path: Path): StripRow[] {
  const { total, hours, categories } = answer;
  return [
    { ...rowOf('All together', total, path), surpriseShare: total.parts.surpriseShare },
    ...(hours.n > 0 ? [{ ...rowOf('Hours worked', hours, path), surpriseShare: null }] : []),
    ...byMoneyOver(categories).map((one) => ({
      ...rowOf(capital(one.name), one, path),
      surpriseShare: shareOf(one.parts.surpriseShare),
    })),
  ];
}

/** More may be surprise than ran over in all (the rest came in under); the sign then is simply full. */
function shareOf(share: number | null): number | null {
  return share === null ? null : Math.min(1, Math.max(0, share));
}

function rowOf(label: string, spread: Spread, path: Path): Omit<StripRow, 'surpriseShare'> {
  const dots: StripDot[] = spread.dots.map((dot) => ({ rate: dot.rate, label: dot.tag, href: path(dot.id) }));
  const say = (figure: number | null) => (spread.isThin ? null : figure);
  return { label, n: spread.n, dots, middle: say(spread.median), low: say(spread.q10), high: say(spread.q90) };
}
