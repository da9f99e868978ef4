import type { Day } from './day.ts';

const MONTH = new Intl.DateTimeFormat('en-US', { month: 'short', timeZone: 'UTC' });
const LONG_MONTH = new Intl.DateTimeFormat('en-US', { month: 'long', timeZone: 'UTC' });

function parts(day: Day) {
  const date = new Date(`${day}T00:00:00Z`);
  return { date, year: day.slice(0, 4), dayOfMonth: String(Number(day.slice(8, 10))) };
}

/** A day with its month as a word, so that no one mixes up day and month: `14 Nov 2026`. */
export function formatDay(day: Day): string {
  const { date, year, dayOfMonth } = parts(day);
  return `${dayOfMonth} ${MONTH.format(date)} ${year}`;
}

/** A day whose year is plain from around it: `14 Nov`. */
export function formatDayShort(day: Day): string {
  const { date, dayOfMonth } = parts(day);
  return `${dayOfMonth} ${MONTH.format(date)}`;
}

/** A day written out: `15 December 2026`. */
export function formatDayLong(day: Day): string {
  const { date, year, dayOfMonth } = parts(day);
  return `${dayOfMonth} ${LONG_MONTH.format(date)} ${year}`;
}

/** The month of a day: `Nov`. */
export function formatMonth(day: Day): string {
  return MONTH.format(parts(day).date);
}

/** Two days as a range; the year is said once where it is the same: `1 Jan – 30 Nov 2026`. */
export function formatDayRange(from: Day, to: Day): string {
  const sameYear = from.slice(0, 4) === to.slice(0, 4);
  return `${sameYear ? formatDayShort(from) : formatDay(from)} – ${formatDay(to)}`;
}
