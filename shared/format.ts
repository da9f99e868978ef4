/**
 * Numbers and days as people read them. Rounding for people happens here and nowhere else.
 * Money is integer cents, rates are fractions, time is whole seconds, days are `YYYY-MM-DD`.
 * Every minus is U+2212, so that it stands as wide as a plus.
 */
export type MoneyStyle = { currency: string; locale: string };

/**
 * auto: whole units from 100 units up, cents below unless there are none. always: both decimals (ledger,
 * anything that must add up to the eye). never: whole units.
 */
export type CentsShown = 'auto' | 'always' | 'never';
export type MoneyOptions = MoneyStyle & { cents?: CentsShown };

type Sign = 'negative' | 'exceptZero';

const kept = new Map<string, Intl.NumberFormat>();

function numberFormat(locale: string, options: Intl.NumberFormatOptions): Intl.NumberFormat {
  const key = locale + JSON.stringify(options);
  const found = kept.get(key) ?? new Intl.NumberFormat(locale, options);
  kept.set(key, found);
  return found;
}

function print(format: Intl.NumberFormat, value: number): string {
  return format
    .formatToParts(value)
    .map((part) => (part.type === 'minusSign' ? '−' : part.value))
    .join('');
}

function showsCents(cents: number, shown: CentsShown): boolean {
  return shown === 'always' || (shown === 'auto' && Math.abs(cents) < 100_00 && cents % 100 !== 0);
}

function money(cents: number, options: MoneyOptions, signDisplay: Sign): string {
  const digits = showsCents(cents, options.cents ?? 'auto') ? 2 : 0;
  const format = numberFormat(options.locale, {
    style: 'currency',
    currency: options.currency,
    currencyDisplay: 'narrowSymbol',
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
    signDisplay,
  });
  return print(format, cents / 100);
}

/** Cents as money: `$18,420`, `$21.60`, `−$6.88`. */
export function formatMoney(cents: number, options: MoneyOptions): string {
  return money(cents, options, 'negative');
}

/** Cents as a difference, always with its sign: `+$410`, `−$1,250`; zero has none. */
export function formatSigned(cents: number, options: MoneyOptions): string {
  return money(cents, options, 'exceptZero');
}

/** Cents short enough for an axis: `$15k`, `−$500`, `$1.2M`. */
export function formatAxisMoney(cents: number, style: MoneyStyle): string {
  const units = cents / 100;
  const size = Math.abs(units);
  const [divisor, suffix] = size >= 1e6 ? [1e6, 'M'] : size >= 1e3 ? [1e3, 'k'] : [1, ''];
  const format = numberFormat(style.locale, {
    style: 'currency',
    currency: style.currency,
    currencyDisplay: 'narrowSymbol',
    minimumFractionDigits: 0,
    maximumFractionDigits: suffix === '' ? 0 : 1,
    signDisplay: 'negative',
  });
  const parts = format.formatToParts(units / divisor);
  const last = parts.findLastIndex((part) => part.type === 'integer' || part.type === 'fraction');
  return parts.map((part, at) => (part.type === 'minusSign' ? '−' : part.value) + (at === last ? suffix : '')).join('');
}

/** Cents for each hour: `$21.60/h`. */
export function formatPerHour(centsPerHour: number, options: MoneyOptions): string {
  return `${formatMoney(centsPerHour, options)}/h`;
}

/** A fraction as a percentage: 0.224 → `22%`. `signed` puts a plus before gains; `digits` are decimals (0). */
export function formatPercent(rate: number, options: { locale: string; signed?: boolean; digits?: number }): string {
  const format = numberFormat(options.locale, {
    style: 'percent',
    minimumFractionDigits: options.digits ?? 0,
    maximumFractionDigits: options.digits ?? 0,
    signDisplay: options.signed ? 'exceptZero' : 'negative',
  });
  return print(format, rate);
}

/** A plain number with grouping; `digits` is the most decimals shown (0). */
export function formatNumber(value: number, options: { locale: string; digits?: number }): string {
  const format = numberFormat(options.locale, {
    maximumFractionDigits: options.digits ?? 0,
    signDisplay: 'negative',
  });
  return print(format, value);
}

/** `1 rebuild`, `1,204 rebuilds`. The plural may be left out where it only adds an s. */
export function formatCount(count: number, one: string, many = `${one}s`, locale = 'en-US'): string {
  const word = new Intl.PluralRules('en').select(count) === 'one' ? one : many;
  return `${formatNumber(count, { locale })} ${word}`;
}

/**
 * Seconds as decimal hours: `8.25`, `38.5`, `853`: two decimals below ten hours, one below a hundred, then none.
 * `exact` keeps two decimals at any size.
 */
export function formatHours(seconds: number, options: { locale: string; exact?: boolean }): string {
  const hours = seconds / 3600;
  const size = Math.abs(hours);
  const digits = options.exact || size < 10 ? 2 : size < 100 ? 1 : 0;
  return formatNumber(hours, { locale: options.locale, digits });
}

/** The decimal mark of a locale: a point or a comma. */
export function decimalMark(locale: string): '.' | ',' {
  const part = numberFormat(locale, { minimumFractionDigits: 1 })
    .formatToParts(1.5)
    .find((one) => one.type === 'decimal');
  return part?.value === ',' ? ',' : '.';
}
