import type { Comparison, WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import type { Formatter } from '#shared/formatter.ts';
import type { PayView } from '#shared/vocabulary.ts';
import { capital } from '../../../lib/capital.ts';
import { counted, ENOUGH, listed, mark, type Said, type Sentence, said, say } from './parts.ts';
import { wageWords } from './year.ts';

export type Group = Comparison['groups'][number];

const PER: Record<PayView, string> = {
  'per-hour': 'an hour',
  'all-hours': 'an hour, all hours counted',
  'after-wage': 'a rebuild after the wage for own hours',
  'on-cost': 'on cost',
};

/** A value of a view: `$21 an hour`, `14% on cost`. */
export function payText(value: number, view: PayView, format: Formatter): string {
  return `${payFigure(value, view, format)} ${PER[view]}`;
}

/** The same with chalk under the figure alone: a line does not break within chalk. */
function markedPay(value: number, view: PayView, format: Formatter): Sentence {
  return say`${mark(payFigure(value, view, format))} ${PER[view]}`;
}

/** A value of a view without what it is of. */
export function payFigure(value: number, view: PayView, format: Formatter): string {
  return view === 'on-cost' ? format.percent(value) : format.money(value, 'never');
}

/** Which wrecks pay? Kinds where there are enough of them, else damage and class each by itself. */
export function sayWhatPays(answer: WhatPaysAnswer, format: Formatter): Said {
  return { answer: sentence(answer, format), cautions: cautions(answer, format) };
}

function sentence(answer: WhatPaysAnswer, format: Formatter): Sentence {
  const { fits, view } = answer;
  const { cells, classes, damages } = fits;
  if (answer.totals.n === 0) return ['Nothing has been finished yet, so nothing can be said of what pays.'];
  if (view === 'after-wage' && answer.views.afterWage.wantedCentsPerHour === null) return noWage(answer, format);
  if (cells.n === 0 && view !== 'on-cost') return noHours(answer, format);
  const [first, second] = leads(fits);
  if (first) {
    const { best } = first.found;
    const rest = second ? say` ${capital(second.by ?? '')}, ${bestAndLeast(second.found, view, format)}.` : [];
    return say`${capital(nameOf(best))} ${bestAndLeast(first.found, view, format, true)}.${rest}`;
  }
  const enough = [...cells.groups, ...classes.groups, ...damages.groups].some((group) => !group.isThin);
  return enough ? noDifference(answer, format) : tooFew(answer, format);
}

type Extremes = { best: Group; worst: Group };

type Lead = { by: string | null; fit: Comparison; found: Extremes };

/** What the answer quotes: kinds where they speak for most rebuilds, else the margins; nothing where no difference shows. */
export function leads({ cells, classes, damages }: WhatPaysAnswer['fits']): Lead[] {
  const lead = (by: string | null, fit: Comparison) => {
    const found = extremes(fit);
    return found ? [{ by, fit, found }] : [];
  };
  const kinds = speaksForMost(cells) ? lead(null, cells) : [];
  return kinds.length > 0 ? kinds : [...lead('by damage', damages), ...lead('by class', classes)];
}

/** Do the kinds that have enough rebuilds hold most of all rebuilds? Else the margins say more. */
function speaksForMost({ groups, n }: Comparison): boolean {
  const ranked = groups.filter((group) => group.rank !== null);
  return ranked.reduce((sum, group) => sum + group.n, 0) * 2 > n;
}

/** First by the lower end, and the one that brings least; null where fewer than two are ranked or no difference shows. */
function extremes({ groups, average }: Comparison): Extremes | null {
  const ranked = groups.filter((group) => group.rank !== null);
  if (ranked.length < 2 || !average || average.betweenVariance === 0) return null;
  const best = ranked.reduce((a, b) => ((a.rank ?? 0) < (b.rank ?? 0) ? a : b));
  const worst = ranked.reduce((a, b) => ((a.pulled?.value ?? 0) <= (b.pulled?.value ?? 0) ? a : b));
  return best === worst ? null : { best, worst };
}

/** `hail damage`, `small SUV`, `small SUV with hail damage`. */
export function nameOf(group: Group): string {
  const damage = group.damageName && `${group.damageName} damage`;
  return [group.className, damage].filter(Boolean).join(' with ');
}

/**
 * `pays best, at $64 an hour; flood damage brings least, $5`: after the best one's name, with the unit. Without it:
 * `pickup pays best, at $53; small car loses $4`.
 */
function bestAndLeast({ best, worst }: Extremes, view: PayView, format: Formatter, isFirst = false): Sentence {
  const top = best.pulled?.value ?? 0;
  const low = worst.pulled?.value ?? 0;
  const name = isFirst ? '' : `${nameOf(best)} `;
  const most = isFirst ? markedPay(top, view, format) : mark(payFigure(top, view, format));
  const least = mark(payFigure(Math.abs(low), view, format));
  return say`${name}pays best, at ${most}; ${nameOf(worst)} ${low < 0 ? 'loses' : 'brings least,'} ${least}`;
}

function noDifference(answer: WhatPaysAnswer, format: Formatter): Sentence {
  const { view } = answer;
  const value = answer.fits.cells.average?.mean ?? allTogether(answer);
  if (value === null) return ['No kind of wreck can be told from another yet.'];
  return say`No kind of wreck can be told from another yet: all together they bring ${markedPay(value, view, format)}.`;
}

/** A view's figure of all finished rebuilds, sum over sum. */
function allTogether({ view, views, totals }: WhatPaysAnswer): number | null {
  const figures: Record<PayView, number | null> = {
    'per-hour': views.own.pooledCents,
    'all-hours': views.all.pooledCents,
    'after-wage': views.afterWage.leftPerRebuildCents,
    'on-cost': totals.returnOnCost.pooled,
  };
  return figures[view];
}

function noWage(answer: WhatPaysAnswer, format: Formatter): Sentence {
  return say`No wanted pay per hour is set on the Shop page, so nothing can be said after a wage. ${inAll(answer, format)}`;
}

function noHours(answer: WhatPaysAnswer, format: Formatter): Sentence {
  return say`Hours are not known for any finished rebuild, so nothing can be said by the hour. ${inAll(answer, format)}`;
}

function tooFew(answer: WhatPaysAnswer, format: Formatter): Sentence {
  return say`Too few yet to say which wrecks pay. ${inAll(answer, format)}`;
}

function inAll({ totals }: WhatPaysAnswer, format: Formatter): Sentence {
  const verb = totals.profitCents < 0 ? 'lost' : 'kept';
  const amount = mark(format.money(Math.abs(totals.profitCents)));
  const all =
    totals.n === 1
      ? 'The one finished rebuild'
      : `${capital(counted(format, totals.n, 'finished rebuild'))} all together`;
  return say`${all} ${verb} ${amount} so far.`;
}

function cautions(answer: WhatPaysAnswer, format: Formatter): string[] {
  const { view } = answer;
  const { cells } = answer.fits;
  if (cells.n === 0) return [];
  const thin = cells.groups.filter((group) => group.isThin).length;
  return said(
    cells.average &&
      `Figures are pulled toward the shop's average of ${payText(cells.average.mean, view, format)} where there are few rebuilds; ranges are 95% intervals of the mean, and the order goes by their lower end.`,
    thin > 0 &&
      `${capital(counted(format, thin, 'kind'))} of wreck ${thin === 1 ? 'has' : 'have'} fewer than ${format.number(ENOUGH)} rebuilds: too few yet.`,
    surelyLosing(answer),
    view === 'on-cost' ? 'Your own hours are not a cost here.' : wageWords(answer.views.afterWage, format),
    `Every way out counts, parted out and scrapped too; unsold ones do not.`,
  );
}

/** Margins and cells whose whole interval lies below zero. */
function surelyLosing({ fits: { cells, classes, damages } }: WhatPaysAnswer): string | null {
  const losing = [...damages.groups, ...classes.groups, ...cells.groups].filter(
    (group) => group.rank !== null && (group.pulled?.upper ?? 0) < 0,
  );
  return losing.length === 0 ? null : `${capital(listed(losing.map(nameOf)))}: the whole range lies below zero.`;
}

const perCar = ({ n, keptCents }: WhatPaysAnswer['oldSheet']['old']) => keptCents / n;

/** What a rebuild kept by the old sheet, by the whole books, and after a wage for own hours. null = nothing sold. */
export function oldSheetPays({ oldSheet, views }: WhatPaysAnswer, format: Formatter): string | null {
  const { old, whole, bills } = oldSheet;
  if (old.n === 0 || whole.n === 0) return null;
  const { wantedCentsPerHour: wage, leftPerRebuildCents: left } = views.afterWage;
  const money = (cents: number) => format.money(cents, 'never');
  const paid = wage === null || left === null ? '' : `; after ${format.money(wage)} for each own hour, ${money(left)}`;
  return (
    `An old sheet, with sold ones only and ${listed(['purchase', ...bills])} as their cost, would have said ` +
    `${money(perCar(old))} a rebuild. Every bill and every way out leave ${money(perCar(whole))}${paid}.`
  );
}
