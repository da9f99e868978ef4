import { weekdayOf } from '../words/weekdays.ts';
import { calendarYearOf, type Day, dayFromNumber, dayFromParts, daysBetween, isDay } from '#shared/day.ts';

export type DateOrder = 'MDY' | 'DMY';

const MONTHS = [
  'jan januar january ene enero janv janvier',
  'feb februar february febr febrero fev fevrier',
  'mar marz march mrz marzo mars',
  'apr april abr abril avr avril',
  'may mai mayo',
  'jun june juni junio juin',
  'jul july juli julio juillet',
  'aug august ago agosto aout',
  'sep sept september septiembre septembre',
  'oct okt october oktober octubre octobre',
  'nov november noviembre novembre',
  'dec dez december dezember dic diciembre decembre',
];
const MONTH_OF = new Map(MONTHS.flatMap((names, index) => names.split(' ').map((name) => [name, index + 1] as const)));

/** The month that a word names, 1–12; null = none. */
export const monthOf = (word: string): number | null => MONTH_OF.get(plain(word)) ?? null;

const ISO = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})(?:[T ].*)?$/;
const NUMERIC = /^(\d{1,2})([-/.])(\d{1,2})\2(\d{4}|\d{2})(?:,? \d{1,2}:\d{2}.*)?$/;
const DAY_FIRST =
  /^(?:le |el )?(\d{1,2})(?:st|nd|rd|th|er)?[-. /]*(?:of |de )?([\p{L}]{3,})[-., /]*(?:de |del )?['’]?(\d{4}|\d{2})$/u;
const MONTH_FIRST = /^([\p{L}]{3,})[-. /]*(\d{1,2})(?:st|nd|rd|th)?[-, /]+['’]?(\d{4}|\d{2})$/u;

const SERIAL = /^(\d{5})(?:\.\d+)?$/;
const FIRST_SERIAL = 25_569;
const YEARLESS = /^(\d{1,2})([-/.])(\d{1,2})\.?$/;
const YEARLESS_DAY_FIRST = /^(\d{1,2})(?:st|nd|rd|th)?[-. /]*([\p{L}]{3,})\.?$/u;
const YEARLESS_MONTH_FIRST = /^([\p{L}]{3,})[-. /]*(\d{1,2})(?:st|nd|rd|th)?$/u;
const HALF_YEAR = 183;
// `Tue 1/5/16`, `Mo., 04.05.20`, `5/3/21 (Mon)`: a weekday beside the day itself.
const WEEKDAY_BEFORE = /^(\p{L}{2,10})[.,]*[ ,]+(?=\d|\p{L}{3,}[-. /]*\d)/u;
const WEEKDAY_AFTER = /[ ,]+\(?(\p{L}{2,10})\.?\)?$/u;

/** The text of a day without the weekday that stands beside it, and that weekday (0 = Monday); null = none does. */
function withoutWeekday(text: string): { text: string; weekday: number | null } {
  const trimmed = text.trim();
  if (!/\p{L}/u.test(trimmed)) return { text: trimmed, weekday: null };
  const found = WEEKDAY_BEFORE.exec(trimmed) ?? WEEKDAY_AFTER.exec(trimmed);
  const weekday = found ? weekdayOf(found[1] ?? '') : null;
  return weekday === null
    ? { text: trimmed, weekday }
    : { text: trimmed.replace(found?.[0] ?? '', '').trim(), weekday };
}

const plain = (text: string) =>
  text
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .trim();

/** `17` → 2017, `95` → 1995: the latest year with these last digits that is not after next year. */
export function fullYear(digits: string, thisYear: number): number {
  if (digits.length === 4) return Number(digits);
  const year = Math.floor(thisYear / 100) * 100 + Number(digits);
  return year > thisYear + 1 ? year - 100 : year;
}

/** Reads a day as typed. `order` settles what numbers alone cannot. 'bad' = no day that exists, 1950 to 2100. */
export function dayReader(order: DateOrder, today: Day): (text: string) => Day | 'bad' | 'blank' {
  const thisYear = Number(today.slice(0, 4));
  const made = (year: string, month: number | undefined, day: string): Day | 'bad' => {
    const found = month === undefined ? null : dayFromParts(fullYear(year, thisYear), month, Number(day));
    return found !== null && isDay(found) ? found : 'bad';
  };
  const dayOf = (trimmed: string): Day | 'bad' => {
    const iso = ISO.exec(trimmed);
    if (iso) return made(iso[1] ?? '', Number(iso[2]), iso[3] ?? '');
    const numeric = NUMERIC.exec(trimmed);
    if (numeric) {
      const [, first = '', mark, second = '', year = ''] = numeric;
      const isDayFirst = mark === '.' || order === 'DMY';
      return isDayFirst ? made(year, Number(second), first) : made(year, Number(first), second);
    }
    if (looksLikeSerial(trimmed)) return dayFromNumber(Math.floor(Number(trimmed)) - FIRST_SERIAL);
    const words = plain(trimmed);
    const dayFirst = DAY_FIRST.exec(words);
    if (dayFirst) return made(dayFirst[3] ?? '', MONTH_OF.get(dayFirst[2] ?? ''), dayFirst[1] ?? '');
    const monthFirst = MONTH_FIRST.exec(words);
    return monthFirst ? made(monthFirst[3] ?? '', MONTH_OF.get(monthFirst[1] ?? ''), monthFirst[2] ?? '') : 'bad';
  };
  return (text) => {
    const trimmed = text.trim();
    if (trimmed === '') return 'blank';
    const day = dayOf(trimmed);
    if (day !== 'bad') return day;
    const { text: bare, weekday } = withoutWeekday(trimmed);
    return weekday === null ? 'bad' : dayOf(bare);
  };
}

/** A number that stands for a day of 1995 to 2040 when a date lost its format: `43900`. */
export function looksLikeSerial(text: string): boolean {
  const serial = Number(SERIAL.exec(text)?.[1] ?? 0);
  return serial >= 34_700 && serial <= 51_500;
}

/** Month and day of a cell that leaves the year out (`3/4`, `4-Mar`); null = it is no such cell. */
export function yearlessParts(text: string, order: DateOrder): { month: number; day: number } | null {
  const numeric = YEARLESS.exec(text.trim());
  if (numeric) {
    const [first, second] = [Number(numeric[1]), Number(numeric[3])];
    return numeric[2] === '.' || order === 'DMY' ? { month: second, day: first } : { month: first, day: second };
  }
  const words = plain(text);
  const dayFirst = YEARLESS_DAY_FIRST.exec(words);
  const monthFirst = dayFirst ? null : YEARLESS_MONTH_FIRST.exec(words);
  const month = MONTH_OF.get(dayFirst?.[2] ?? monthFirst?.[1] ?? '');
  return month === undefined ? null : { month, day: Number(dayFirst?.[1] ?? monthFirst?.[2]) };
}

/** The day with this month and day that lies nearest to another; null = there is none. */
export function nearestDay({ month, day }: { month: number; day: number }, near: Day): Day | null {
  const year = calendarYearOf(near);
  const all = [year - 1, year, year + 1].map((each) => dayFromParts(each, month, day));
  return all.find((each) => each !== null && Math.abs(daysBetween(near, each)) <= HALF_YEAR) ?? null;
}

/** Does a cell look like a day, whether or not that day exists? */
export function looksLikeDay(text: string): boolean {
  const trimmed = text.trim();
  if (ISO.test(trimmed) || NUMERIC.test(trimmed)) return true;
  const { text: bare, weekday } = withoutWeekday(trimmed);
  if (weekday !== null && looksLikeDay(bare)) return true;
  const words = plain(trimmed);
  const month = DAY_FIRST.exec(words)?.[2] ?? MONTH_FIRST.exec(words)?.[1];
  return month !== undefined && MONTH_OF.has(month);
}

/** A day in numbers whose order the text does not settle: `3/12/2018`. */
export interface UnsettledDay {
  readonly first: number;
  readonly second: number;
  /** Its last two digits; '' = it names no year. */
  readonly year: string;
  /** The weekday that stands beside it, 0 = Monday; null = none. */
  readonly weekday: number | null;
}

/** The two numbers of `3/12/2018` that may be month and day; null where the text itself settles them. */
export function unsettledDay(text: string): UnsettledDay | null {
  const { text: bare, weekday } = withoutWeekday(text);
  const match = NUMERIC.exec(bare) ?? YEARLESS.exec(bare);
  if (!match || match[2] === '.') return null;
  return { first: Number(match[1]), second: Number(match[3]), year: (match[4] ?? '').slice(-2), weekday };
}

/** `12.3.2018`: written with points, the day stands first. */
export function isDotted(text: string): boolean {
  return NUMERIC.exec(text.trim())?.[2] === '.';
}

const NOT_YET = new Set(
  `-|–|—|n/a|na|none|tbd|not yet|in shop|in the shop|in work|in progress|wip|unsold|not sold|for sale|listed|pending|open|still here|have
it|keeping|noch nicht|offen|in arbeit|steht noch|nicht verkauft|pendiente|en venta|en taller|sin vender|no vendido|en cours|a vendre|à
vendre|invendu|non vendu|en vente`
    .replace(/\n/g, ' ')
    .split('|'),
);

/** Does a cell say in words that the day has not come yet? */
export const isNotYet = (text: string) => NOT_YET.has(text.trim().toLowerCase());
