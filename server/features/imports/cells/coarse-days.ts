import { addDays, calendarYearOf, type Day, dayFromParts, dayNumber } from '#shared/day.ts';
import { monthOf } from './days.ts';
import { fold } from './fold.ts';

const MONTH_AND_YEAR = /^(?:(?:0?[1-9]|1[0-2])[-/. ](?:19|20)\d\d|(?:19|20)\d\d[-/. ](?:0?[1-9]|1[0-2]))$/;
const PART_OF_YEAR =
  /^(?:q[1-4]|[1-4]q|h[12]|k?w(?:k|eek)? ?\d{1,2}|(?:woche|semana|semaine) \d{1,2}) ?(?:19|20)?\d\d$|^(?:19|20)\d\d ?(?:q[1-4]|h[12]|k?w ?\d{1,2})$/;
const SEASON =
  /^(?:(?:early|mid|late|spring|summer|fall|autumn|winter|anfang|mitte|ende) )?(\p{L}* ?)(?:de )?(?:19|20)\d\d$/u;
const SHORT_YEAR = /^(\p{L}{3,})\.?(?:-| ?['’])(\d\d)$/u;

/** Does a cell name only a month, a quarter, a week or a year: `Mar 2021`, `3/2021`, `Q2 2021`, `2021-W14`, `2021`? */
export function isCoarseDay(cell: string): boolean {
  const text = cell.trim();
  if (MONTH_AND_YEAR.test(text)) return true;
  const words = fold(text);
  if (PART_OF_YEAR.test(words)) return true;
  const month = SEASON.exec(words)?.[1]?.trim();
  return month !== undefined && (month === '' || monthOf(month) !== null);
}

const WEEK_OF_YEAR =
  /^(?:((?:19|20)\d\d) ?(?:k?w) ?(\d{1,2})|(?:k?w(?:k|eek)?|woche|semana|semaine) ?(\d{1,2}) ((?:19|20)\d\d))$/;

/** The Monday of a week named by its number as ISO 8601 counts them: `2021-W14`, `KW 14/2021`; null = it names none. */
export function firstOfWeek(cell: string): Day | null {
  const [, year, week, week2, year2] = WEEK_OF_YEAR.exec(fold(cell)) ?? [];
  const number = Number(week ?? week2 ?? 0);
  // January 4 always stands in week 1; 1970-01-01 was a Thursday.
  const fourth = dayFromParts(Number(year ?? year2), 1, 4);
  if (number < 1 || number > 53 || fourth === null) return null;
  return addDays(fourth, (number - 1) * 7 - ((dayNumber(fourth) + 3) % 7));
}

/** `Mar-21` is March 2021 as spreadsheets show it, where the days around it are of that year or nobody knows better. */
export function isShortMonth(cell: string, near: Day | null): boolean {
  const [, month = '', year = ''] = SHORT_YEAR.exec(cell.trim()) ?? [];
  if (monthOf(month) === null) return false;
  return near === null || Math.abs((calendarYearOf(near) % 100) - Number(year)) <= 1;
}
