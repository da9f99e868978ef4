import type { Day } from './day.ts';
import {
  type CentsShown,
  decimalMark,
  formatAxisMoney,
  formatCount,
  formatHours,
  formatMoney,
  formatNumber,
  formatPercent,
  formatPerHour,
  formatSigned,
  type MoneyStyle,
} from './format.ts';
import { formatDay, formatDayShort, formatMonth } from './format-day.ts';

/** Every way of writing a number, bound to one shop's currency and locale. Pages, tables and charts share it. */
export type Formatter = ReturnType<typeof createFormatter>;

/** The formatter of a shop. */
export function createFormatter(style: MoneyStyle) {
  const { locale } = style;
  return {
    /** Currency and locale that it is bound to. */
    style,
    /** The mark between units and cents. */
    decimal: decimalMark(locale),
    money: (cents: number, shown: CentsShown = 'auto') => formatMoney(cents, { ...style, cents: shown }),
    signed: (cents: number, shown: CentsShown = 'auto') => formatSigned(cents, { ...style, cents: shown }),
    axisMoney: (cents: number) => formatAxisMoney(cents, style),
    perHour: (cents: number, shown: CentsShown = 'auto') => formatPerHour(cents, { ...style, cents: shown }),
    percent: (rate: number, digits = 0) => formatPercent(rate, { locale, digits }),
    signedPercent: (rate: number, digits = 0) => formatPercent(rate, { locale, digits, signed: true }),
    number: (value: number, digits = 0) => formatNumber(value, { locale, digits }),
    count: (count: number, one: string, many?: string) => formatCount(count, one, many, locale),
    days: (days: number) => formatCount(Math.round(days), 'day', 'days', locale),
    hours: (seconds: number, exact = false) => formatHours(seconds, { locale, exact }),
    day: (day: Day) => formatDay(day),
    dayShort: (day: Day) => formatDayShort(day),
    month: (day: Day) => formatMonth(day),
  };
}

const WORDS = [
  'none',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** A count for a sentence: words up to twelve, figures above. `capital` for the start of one. */
export function countInWords(count: number, options: { locale: string; capital?: boolean }): string {
  const word = WORDS[count] ?? formatNumber(count, { locale: options.locale });
  return options.capital ? word.charAt(0).toUpperCase() + word.slice(1) : word;
}
