import type { Comparison, WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import type { Formatter } from '#shared/formatter.ts';
import { capital, counted, ENOUGH, listed, mark, type Said, type Sentence, said, say } from './parts.ts';

export const PAY_VIEWS = ['per-hour', 'on-cost'] as const;
export type PayView = (typeof PAY_VIEWS)[number];
export type Group = Comparison['groups'][number];

/** The fits that a view shows. */
export function fitsOf(answer: WhatPaysAnswer, view: PayView) {
  return view === 'per-hour' ? answer.perHour : answer.returnOnCost;
}

/** A value of a view: `$21 an hour`, `14% on cost`. */
export function payText(value: number, view: PayView, format: Formatter): string {
  return view === 'per-hour' ? `${format.money(value, 'never')} an hour` : `${format.percent(value)} on cost`;
}

/** Which wrecks pay? Kinds where there are enough of them, else damage and class each by itself. */
export function sayWhatPays(answer: WhatPaysAnswer, view: PayView, format: Formatter): Said {
  return { answer: sentence(answer, view, format), cautions: cautions(answer, view, format) };
}

function sentence(answer: WhatPaysAnswer, view: PayView, format: Formatter): Sentence {
  const { cells, classes, damages } = fitsOf(answer, view);
  if (answer.totals.n === 0) return ['Nothing has been finished yet, so nothing can be said of what pays.'];
  if (cells.n === 0) return ['Hours are not known for any finished rebuild, so nothing can be said by the hour.'];
  const kinds = extremes(cells);
  if (kinds) return say`${capital(nameOf(kinds.best))} ${pays(kinds, view, format)}.`;
  const parts = [
    { by: 'By damage', found: extremes(damages) },
    { by: 'By class', found: extremes(classes) },
  ].flatMap(({ by, found }) => (found ? [{ by, found }] : []));
  if (parts.length > 0) {
    const clauses = parts.map(
      ({ by, found }, at) =>
        say`${at === 0 ? by : `; ${by.toLowerCase()}`}, ${nameOf(found.best)} ${pays(found, view, format)}`,
    );
    return [...clauses.flat(), '.'];
  }
  const enough = [...cells.groups, ...classes.groups, ...damages.groups].some((group) => !group.isThin);
  return enough ? noDifference(answer, view, format) : tooFew(answer, format);
}

type Extremes = { best: Group; worst: Group };

/** First by the lower end, and the one whose upper end is lowest; null where nothing is ranked or no difference shows. */
export function extremes({ groups, average }: Comparison): Extremes | null {
  const ranked = groups.filter((group) => group.rank !== null);
  if (ranked.length < 2 || !average || average.betweenVariance === 0) return null;
  const best = ranked.reduce((a, b) => ((a.rank ?? 0) < (b.rank ?? 0) ? a : b));
  const worst = ranked.reduce((a, b) => ((a.pulled?.upper ?? 0) <= (b.pulled?.upper ?? 0) ? a : b));
  return best === worst ? null : { best, worst };
}

/** `hail damage`, `small SUV`, `small SUV with hail damage`. */
export function nameOf(group: Group): string {
  const damage = group.damageName && `${group.damageName} damage`;
  return [group.className, damage].filter(Boolean).join(' with ');
}

function pays({ best, worst }: Extremes, view: PayView, format: Formatter): Sentence {
  const low = worst.pulled?.value ?? 0;
  const verb = low < 0 ? 'loses' : 'brings only';
  return say`pays best (${mark(payText(best.pulled?.value ?? 0, view, format))}) and ${nameOf(worst)} ${verb} ${mark(payText(low < 0 ? -low : low, view, format))}`;
}

function noDifference(answer: WhatPaysAnswer, view: PayView, format: Formatter): Sentence {
  const { average } = fitsOf(answer, view).cells;
  const value =
    average?.mean ?? (view === 'per-hour' ? answer.views.own.pooledCents : answer.totals.returnOnCost.pooled);
  if (value === null) return ['No kind of wreck can be told from another yet.'];
  return say`No kind of wreck can be told from another yet: all together they bring ${mark(payText(value, view, format))}.`;
}

function tooFew({ totals }: WhatPaysAnswer, format: Formatter): Sentence {
  const verb = totals.profitCents < 0 ? 'lost' : 'kept';
  const amount = mark(format.money(Math.abs(totals.profitCents)));
  const all =
    totals.n === 1
      ? 'The one finished rebuild'
      : `${capital(counted(format, totals.n, 'finished rebuild'))} all together`;
  return say`Too few yet to say which wrecks pay. ${all} ${verb} ${amount} so far.`;
}

function cautions(answer: WhatPaysAnswer, view: PayView, format: Formatter): string[] {
  const { cells } = fitsOf(answer, view);
  if (cells.n === 0) return [];
  const thin = cells.groups.filter((group) => group.isThin).length;
  return said(
    cells.average &&
      `Figures are pulled toward the shop's average of ${payText(cells.average.mean, view, format)} where there are few rebuilds; ranges are 95% intervals of the mean, and the order goes by their lower end.`,
    thin > 0 &&
      `${capital(counted(format, thin, 'kind'))} of wreck ${thin === 1 ? 'has' : 'have'} fewer than ${format.number(ENOUGH)} rebuilds: too few yet.`,
    surelyLosing(answer, view),
    view === 'on-cost' && 'Your own hours are not a cost here.',
    `Every way out counts, parted out and scrapped too; unsold ones do not.`,
  );
}

/** Margins and cells whose whole interval lies below zero. */
function surelyLosing(answer: WhatPaysAnswer, view: PayView): string | null {
  const { cells, classes, damages } = fitsOf(answer, view);
  const losing = [...damages.groups, ...classes.groups, ...cells.groups].filter(
    (group) => group.rank !== null && (group.pulled?.upper ?? 0) < 0,
  );
  return losing.length === 0 ? null : `${capital(listed(losing.map(nameOf)))}: the whole range lies below zero.`;
}
