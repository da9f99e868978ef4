/**
 * Money is a whole number of cents. Nothing here goes through a binary fraction of a dollar.
 */
export type Cents = number;

/** The largest amount the books take, either way: ten billion dollars in cents. */
export const MAX_CENTS = 1_000_000_000_000;

/** Quotient of two integers rounded half away from zero (2.5 → 3, −2.5 → −3), exactly. Definitions §12. */
export function divideRounded(numerator: bigint, denominator: bigint): bigint {
  if (denominator === 0n) throw new RangeError('division by zero');
  const negative = numerator < 0n !== denominator < 0n;
  const n = numerator < 0n ? -numerator : numerator;
  const d = denominator < 0n ? -denominator : denominator;
  const rounded = (2n * n + d) / (2n * d);
  return negative ? -rounded : rounded;
}

/**
 * Splits cents over weights by largest remainder: parts add up to the total exactly; ties go to the earlier
 * item; a negative total splits its absolute value; weights that sum to 0 count as equal. Definitions §12.
 * Weights are non-negative integers; at least one is needed.
 */
export function splitCents(total: Cents, weights: readonly number[]): Cents[] {
  if (weights.length === 0) throw new RangeError('nothing to split over');
  if (total < 0) return splitCents(-total, weights).map((part) => (part === 0 ? 0 : -part));
  const isWeighted = weights.some((weight) => weight !== 0);
  const shares = weights.map((weight) => (isWeighted ? BigInt(weight) : 1n));
  const whole = shares.reduce((a, b) => a + b, 0n);
  const parts = shares.map((w) => (BigInt(total) * w) / whole);
  const order = shares
    .map((w, index) => ({ index, remainder: (BigInt(total) * w) % whole }))
    .sort((a, b) => (a.remainder === b.remainder ? a.index - b.index : a.remainder > b.remainder ? -1 : 1));
  const left = Number(BigInt(total) - parts.reduce((a, b) => a + b, 0n));
  for (const { index } of order.slice(0, left)) parts[index] = (parts[index] ?? 0n) + 1n;
  return parts.map(Number);
}

/**
 * Reads money as people type it, into cents: `1,250` `1250.5` `$1 250.50` `(45.00)` `45-` `-3`.
 * `decimal` is the shop's decimal mark; the other mark, a space or an apostrophe groups thousands (`12 50` is not 1,250).
 * null = not readable, or finer than a cent.
 */
export function parseCents(text: string, decimal: '.' | ',' = '.'): Cents | null {
  const group = decimal === '.' ? ',' : '.';
  let rest = text
    .normalize('NFKC')
    .replace(/(?<=\d)[\s\u2019'](?=\d)/g, group)
    .replace(/\s/g, '')
    .replace(/[\u2212\u2013]/g, '-');
  let negative = false;
  const bracketed = /^\((.*)\)$/.exec(rest);
  if (bracketed) {
    negative = true;
    rest = bracketed[1] ?? '';
  }
  rest = rest.replace(/^([+-]?)[$€£]/, '$1').replace(/[$€£]$/, '');
  if (/^-|-$/.test(rest)) {
    if (negative) return null;
    negative = true;
    rest = rest.replace(/^-|-$/, '').replace(/^[$€£]/, '');
  }
  rest = rest.replace(/^\+/, '');
  const mark = decimal === '.' ? '\\.' : ',';
  const grouped = new RegExp(`^(\\d+|\\d{1,3}(?:\\${group}\\d{3})+)?(?:${mark}(\\d{0,2}))?$`).exec(rest);
  if (!grouped || (grouped[1] === undefined && !grouped[2])) return null;
  const whole = (grouped[1] ?? '0').replaceAll(group, '');
  const cents = Number(whole + (grouped[2] ?? '').padEnd(2, '0'));
  if (!Number.isSafeInteger(cents) || cents > MAX_CENTS) return null;
  return negative && cents !== 0 ? -cents : cents;
}
