import type { OverrunsAnswer } from '#shared/contracts/answers-overruns.ts';
import type { Formatter } from '#shared/formatter.ts';
import { capital } from '../../../lib/capital.ts';
import { couldBeLuck, differenceWords, points } from './judged.ts';
import { counted, mark, type Said, type Sentence, said, say, words } from './parts.ts';

type Category = OverrunsAnswer['categories'][number];

/** Where does the money run over? All together, then the category with most money over and the one furthest over. */
export function sayOverruns(answer: OverrunsAnswer, format: Formatter): Said {
  return { answer: sentence(answer, format), cautions: cautions(answer, format) };
}

function sentence(answer: OverrunsAnswer, format: Formatter): Sentence {
  const { total } = answer;
  if (total.n === 0 || total.pooled === null) {
    return ['No finished rebuild has a locked estimate yet, so nothing can be said to run over.'];
  }
  const came = overOrUnder(total.pooled, format);
  if (total.isThin) {
    return say`Too few yet to say where: ${counted(format, total.n, 'finished rebuild')} with an estimate came ${came} so far.`;
  }
  return say`All together the work comes ${came}.${where(answer, format)}`;
}

/** `34% over`, `3% under`, `as estimated`; the figure is marked. */
function overOrUnder(rate: number, format: Formatter): Sentence {
  const text = format.percent(Math.abs(rate));
  if (text === format.percent(0)) return ['to what was estimated'];
  return say`in ${mark(`${text} ${rate > 0 ? 'over' : 'under'}`)} the locked estimates`;
}

const over = (category: Category) => category.actualCents - category.estimateCents;

/** Category with the most cents over, and the one furthest over by its pooled rate; only those with enough rebuilds. */
export function worstCategories(answer: OverrunsAnswer): { most: Category; furthest: Category } | null {
  const said = answer.categories.filter((one) => !one.isThin && one.n > 0 && over(one) > 0);
  const [first] = said;
  if (!first) return null;
  return {
    most: said.reduce((a, b) => (over(b) > over(a) ? b : a), first),
    furthest: said.reduce((a, b) => ((b.pooled ?? 0) > (a.pooled ?? 0) ? b : a), first),
  };
}

function where(answer: OverrunsAnswer, format: Formatter): Sentence {
  const worst = worstCategories(answer);
  if (!worst) return [];
  const { most, furthest } = worst;
  const dollars = mark(format.money(over(most)));
  const rate = mark(format.percent(furthest.pooled ?? 0));
  if (most === furthest) return say` The most goes over on ${most.name}: ${dollars}, or ${rate} more than planned.`;
  return say` The most money goes over on ${most.name}, ${dollars}; the furthest over is ${furthest.name}, by ${rate}.`;
}

function cautions(answer: OverrunsAnswer, format: Formatter): string[] {
  const { total, hours, surprises, categories } = answer;
  const unbudgeted = categories.reduce((sum, one) => sum + one.unbudgetedCents, 0);
  return said(
    total.n > 0 && `Based on ${counted(format, total.n, 'finished rebuild')} with a locked estimate.`,
    total.median !== null &&
      total.q10 !== null &&
      total.q90 !== null &&
      !total.isThin &&
      `Half come in above ${format.signedPercent(total.median)}; 8 in 10 lie between ${format.signedPercent(total.q10)} and ${format.signedPercent(total.q90)}.`,
    hoursWords(hours, format),
    seenWords(answer, format),
    surprises.rate !== null && surprises.n > 0 && surpriseWords(surprises, format),
    unbudgeted > 0 && `${format.money(unbudgeted)} went where nothing had been planned.`,
  );
}

function hoursWords(hours: OverrunsAnswer['hours'], format: Formatter): string | null {
  if (hours.pooled === null || hours.n === 0) return null;
  const rate = format.percent(Math.abs(hours.pooled));
  const way = hours.pooled < 0 ? 'under' : 'over';
  return `Hours run ${rate} ${way} plan${hours.isThin ? `, on ${counted(format, hours.n)}: too few yet` : ''}.`;
}

type Damage = OverrunsAnswer['damages'][number];

/** `Front damage ran +29% seen and +42% unseen; all other +22% and +38%. …`: which of the two goes with the overrun. */
export function lookOrDamage({ name, own, others, damageSeen, damageUnseen }: Damage, format: Formatter): string {
  const rates = [own.seen, own.unseen, others.seen, others.unseen].map(({ pooled }) => pooled);
  const [seen, unseen, otherSeen, otherUnseen] = rates.map((rate) =>
    rate === null ? 'unknown' : format.signedPercent(rate),
  );
  const figures = `${capital(name)} damage ran ${seen} when seen before buying and ${unseen} unseen; all other ${otherSeen} and ${otherUnseen}.`;
  const [a, b, c, d] = rates;
  if (a == null || b == null || c == null || d == null) return `${figures} Too few to tell the look from the damage.`;
  const isLuck = [damageSeen, damageUnseen].every((gap) => gap === null || couldBeLuck(gap));
  const look = Math.min(b - a, d - c);
  if (look > 0 && isLuck) {
    return `${figures} In both the unseen bid runs further over; that ${name} damage differs from the rest could be luck.`;
  }
  return isLuck ? `${figures} That ${name} damage differs from the rest could be luck.` : figures;
}

/** What sold ones alone would have said, where it differs. */
export function oldSheetOverruns({ soldOnly, total }: OverrunsAnswer, format: Formatter): string | null {
  if (soldOnly.pooled === null || total.pooled === null || soldOnly.n === total.n) return null;
  return `An old sheet, with sold ones only, would have said ${format.signedPercent(soldOnly.pooled)} over ${format.count(soldOnly.n, 'rebuild')}.`;
}

function seenWords({ seen, seenDifference }: OverrunsAnswer, format: Formatter): string | null {
  const of = (value: boolean) => seen.find((one) => one.seen === value && !one.isThin && one.pooled !== null);
  const looked = of(true);
  const unseen = of(false);
  if (!looked || !unseen) return null;
  const { overrun } = seenDifference;
  const gap = overrun ? `: ${differenceWords(overrun, (rate) => points(rate, format))}` : '';
  return `Cars seen before buying ran ${format.signedPercent(looked.pooled ?? 0)}, unseen ones ${format.signedPercent(unseen.pooled ?? 0)}${gap}.`;
}

function surpriseWords(surprises: OverrunsAnswer['surprises'], format: Formatter): string {
  return `${capital(words(format, surprises.x))} of ${format.number(surprises.n)} had at least one surprise.`;
}
