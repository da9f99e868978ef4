import { isCoarseDay } from '../cells/coarse-days.ts';
import { looksLikeDay, looksLikeSerial, yearlessParts } from '../cells/days.ts';
import { isFaulty } from '../cells/faulty-cells.ts';
import { readHours } from '../cells/hours.ts';
import { looksLikeMoney, saysNothing } from '../cells/money.ts';
import type { Head } from './head.ts';

/** What the cells below a heading look like, as shares of its filled cells (0–1). */
export interface ColumnFacts {
  /** 1 = the first column. */
  readonly col: number;
  readonly heading: string;
  readonly filled: number;
  readonly money: number;
  readonly day: number;
  /** Days without a year, months of a year, and numbers that may be days: they count where the heading speaks of days. */
  readonly maybeDay: number;
  readonly modelYear: number;
  readonly hours: number;
  /** Share of different texts among the filled cells. */
  readonly distinct: number;
  readonly samples: readonly string[];
}

const MODEL_YEAR = /^(19[5-9]\d|20\d\d)$/;

/** Looks at every column under the headings. */
export function columnFacts(head: Head): ColumnFacts[] {
  const headings = head.heading?.cells ?? [];
  return headings.map((heading, index) => {
    const cells = head.below
      .map((row) => (row.cells[index] ?? '').trim())
      .filter((cell) => cell !== '' && cell !== heading.trim() && !saysNothing(cell) && !isFaulty(cell));
    const share = (test: (cell: string) => boolean) => (cells.length ? cells.filter(test).length / cells.length : 0);
    return {
      col: index + 1,
      heading: heading.trim(),
      filled: cells.length,
      money: share((cell) => looksLikeMoney(cell) && !looksLikeDay(cell)),
      day: share(looksLikeDay),
      maybeDay: share(
        (cell) =>
          looksLikeSerial(cell) || yearlessParts(cell, 'MDY') !== null || (isCoarseDay(cell) && !MODEL_YEAR.test(cell)),
      ),
      modelYear: share((cell) => MODEL_YEAR.test(cell)),
      hours: share((cell) => typeof readHours(cell) === 'number'),
      distinct: cells.length ? new Set(cells).size / cells.length : 0,
      samples: cells.slice(0, 5),
    };
  });
}

const MOSTLY = 0.5;

export const holdsMoney = (facts: ColumnFacts) => facts.filled === 0 || facts.money >= MOSTLY;
export const holdsDays = (facts: ColumnFacts) => facts.filled === 0 || facts.day + facts.maybeDay >= MOSTLY;
/** Nothing but years: where the heading speaks of days, they stand for them. */
export const holdsYears = (facts: ColumnFacts) => facts.filled >= 3 && facts.modelYear === 1;
export const holdsHours = (facts: ColumnFacts) => facts.filled === 0 || facts.hours >= MOSTLY;
export const holdsText = (facts: ColumnFacts) => facts.filled === 0 || (facts.money < MOSTLY && facts.day < MOSTLY);
