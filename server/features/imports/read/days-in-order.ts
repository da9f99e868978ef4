import { type Day, isDay } from '#shared/day.ts';
import { isCoarseDay, isShortMonth } from '../cells/coarse-days.ts';
import { looksLikeSerial, nearestDay, yearlessParts } from '../cells/days.ts';
import type { Plan } from './plan.ts';

/**
 * Reads the days of one column from top to bottom. A day without a year takes the year in the sheet's name or title, else
 * the one that brings it nearest to the day above it; `isGuess` then says of the last one read that it was so. Less than
 * a day (`Mar 2021`) is no day: what it dates comes in without one, as a guess.
 */
export function daysInOrder(plan: Plan, col: number) {
  const read = plan.days.get(col) ?? (() => 'blank' as const);
  const order = plan.orders.get(col) ?? 'MDY';
  const titled = yearOf(plan);
  let before = titled;
  const reader = {
    isGuess: false,
    next(text: string): Day | 'bad' | 'blank' {
      reader.isGuess = false;
      const day = read(text);
      if (day === 'blank') return day;
      if (day !== 'bad') {
        before = day;
        reader.isGuess = looksLikeSerial(text.trim());
        return day;
      }
      if (isCoarseDay(text) || isShortMonth(text, before)) {
        reader.isGuess = true;
        return 'blank';
      }
      const parts = before === null ? null : yearlessParts(text, order);
      const near = parts === null || before === null ? null : nearestDay(parts, titled ?? before);
      if (near === null || !isDay(near)) return 'bad';
      reader.isGuess = true;
      before = near;
      return near;
    },
  };
  return reader;
}

/** The middle of the year that a sheet's name speaks of; null = it speaks of none. */
function yearOf({ sheet, heading }: Plan): Day | null {
  const year = /\b(?:19|20)\d\d\b/.exec(`${sheet.name ?? ''} ${heading.title ?? ''}`)?.[0];
  return year ? `${year}-07-01` : null;
}
