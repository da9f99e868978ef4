import { dayFromNumber, dayNumber, isDay } from '#shared/day.ts';

/** What the numbers of a cell stand for, by its format. */
export type NumberKind = 'number' | 'day' | 'time' | 'percent';

/** What the format of a cell says of its numbers. */
export interface CellStyle {
  readonly kind: NumberKind;
  /** How many decimals it shows; null = it does not say. */
  readonly decimals: number | null;
  /** The sign of a currency that is no kind of dollar, or the code of any; '' = it names none. */
  readonly sign: string;
}

export const PLAIN_STYLE: CellStyle = { kind: 'number', decimals: null, sign: '' };

// The formats that every workbook has without naming them.
const BUILT_IN_DAYS = new Set([14, 15, 16, 17, 22, 27, 30, 36, 50, 57]);
const BUILT_IN_TIMES = new Set([18, 19, 20, 21, 45, 46, 47]);
const BUILT_IN_PERCENTS = new Set([9, 10]);
const QUOTED = /"[^"]*"|\\.|\[(?:\$[^\]]*|[a-z]+\d*|[<>=][^\]]*)\]|_.|\*./gi;
const SIGN = /[€£¥]|zł|Kč|\b(?:EUR|GBP|CHF|SEK|NOK|DKK|PLN|CZK|CAD|AUD|NZD|MXN|USD)\b|\bkr\b|[ACN]\$/;

/** What a format shows: `yyyy-mm-dd` a day, `[h]:mm` a time, `0.0%` a share, everything else a number. */
export function cellStyle(id: number, code: string | undefined): CellStyle {
  if (code === undefined) return { ...PLAIN_STYLE, kind: builtIn(id), decimals: decimalsOf(undefined, id) };
  const sign = SIGN.exec(code)?.[0] ?? '';
  return { kind: kindOf(code), decimals: decimalsOf(code, id), sign: sign.length > 1 ? `${sign} ` : sign };
}

function builtIn(id: number): NumberKind {
  if (BUILT_IN_DAYS.has(id)) return 'day';
  if (BUILT_IN_TIMES.has(id)) return 'time';
  return BUILT_IN_PERCENTS.has(id) ? 'percent' : 'number';
}

function kindOf(code: string): NumberKind {
  const isElapsed = /\[(?:h+|m+|s+)\]/i.test(code);
  const [first = ''] = code.split(';');
  const plain = first.replace(QUOTED, '').toLowerCase();
  if (isElapsed) return 'time';
  if (/general|standard/.test(plain)) return 'number';
  if (/[yd]/.test(plain) || /^m+$/.test(plain)) return 'day';
  if (/h|s/.test(plain)) return 'time';
  return plain.includes('%') ? 'percent' : 'number';
}

const FIRST_1900 = dayNumber('1899-12-30');
const FIRST_1904 = dayNumber('1904-01-01');

/** The day that a serial number stands for; null = none, 1950 to 2100. The 1900 system counts a day that never was. */
export function dayOfSerial(serial: number, is1904: boolean): string | null {
  if (!(serial > 0 && serial < 100_000)) return null;
  const day = dayFromNumber(Math.floor(serial) + (is1904 ? FIRST_1904 : FIRST_1900));
  return isDay(day) ? day : null;
}

/** A share of a day as hours and minutes: 0.14583 → `3:30`. */
export function clockText(days: number): string {
  const minutes = Math.round(days * 1440);
  return `${Math.floor(minutes / 60)}:${String(minutes % 60).padStart(2, '0')}`;
}

/** A share as people write it: 0.0625 → `6.25%`. */
export const percentText = (share: number) => `${Number((share * 100).toPrecision(12))}%`;

/** A number as people would type it: without the noise of binary fractions, amounts to the cent where they are shown so. */
export function numberText(value: number, decimals: number | null): string {
  if (decimals !== null && decimals >= 2) return trimmed(value.toFixed(decimals));
  // Numbers that short carry no noise, and most are.
  const plain = String(value);
  const text = plain.length <= 12 ? plain : String(Number(value.toPrecision(14)));
  return text.includes('e') ? trimmed(value.toFixed(decimals ?? 10)) : text;
}

const trimmed = (text: string) => (text.includes('.') ? text.replace(/0+$/, '').replace(/\.$/, '') : text);

/** How many decimals a format shows: `#,##0.00` 2; null = it does not say. */
function decimalsOf(code: string | undefined, id: number): number | null {
  if (code === undefined) return id === 2 || id === 4 || (id >= 39 && id <= 44) ? 2 : null;
  const [first = ''] = code.split(';');
  const shown = /0\.(0+)/.exec(first.replace(QUOTED, ''));
  return shown && !/%|,$|,["k]/i.test(first) ? (shown[1] ?? '').length : null;
}
