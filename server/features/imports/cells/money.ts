import { MAX_CENTS, parseCents } from '#shared/money.ts';

export type DecimalMark = '.' | ',';

/** Money of a cell in cents; or nothing stands there, or it cannot be read, or it is only roughly so much. */
export type Money = number | 'blank' | 'bad' | 'rough';

const NOTHING = new Set(['-', '–', '—', 'n/a', 'na', 'free', 'none', 'gratis', 'umsonst', 'kostenlos', 'nil']);
const ROUGH =
  /^(?:~|≈|ca\.?|circa|about|approx\.?|around|roughly|etwa|rund|ungefähr|unos|aprox\.?|environ|env\.?)|(?:ish|\?|k|or so)$|\d\s*[x×*@]\s*\d/i;
const SIGN =
  /(?:\b(?:US|CA|AU|NZ|MX|C|A))?[$€£¥]|\b(?:USD|EUR|GBP|CAD|AUD|NZD|CHF|SEK|NOK|DKK|PLN|CZK|MXN|Kč|kr|zł)\b\.?/gi;

/** Reads money as typed, with this decimal mark. `isCostCell`: `-`, `n/a`, `free` mean that nothing was spent. */
export function moneyReader(decimal: DecimalMark): (text: string, isCostCell?: boolean) => Money {
  return (text, isCostCell = false) => {
    const plain = decimal === '.' ? plainCents(text) : -1;
    if (plain >= 0) return plain <= MAX_CENTS ? plain : 'bad';
    const trimmed = text.trim();
    if (trimmed === '') return 'blank';
    if (saysNothing(trimmed)) return isCostCell ? 'blank' : 'bad';
    const cents = parseCents(trimmed.replace(SIGN, '').replace(/^\+|[.,]-+$/, ''), decimal);
    if (cents !== null) return cents;
    return /\d/.test(trimmed) && (ROUGH.test(trimmed) || OTHER_MARK[decimal].test(trimmed)) ? 'rough' : 'bad';
  };
}

/** An amount that can only be written with the other decimal mark: `61,20` or `1.234,00` among points. */
export const OTHER_MARK: Readonly<Record<DecimalMark, RegExp>> = {
  '.': /^\D*\d{1,3}(?:\.?\d{3})*,\d\d\D*$/,
  ',': /^\D*\d{1,3}(?:,?\d{3})*\.\d\d\D*$/,
};

const BEFORE =
  /^(?:~|≈|ca\.?|circa|about|approx\.?|around|roughly|etwa|rund|ungefähr|unos|aprox\.?|environ|env\.?)\s*/i;
const AFTER = /\s*(?:-?ish|\?+|or so|circa|ca\.?|approx\.?|k)$/i;
const TIMES = /^(\d{1,3})\s*(?:[x×*@]|\bà)\s*(.+)$/i;

/**
 * Money that is only said roughly (`~200`, `1,300 ish`, `$1.2k`, `2x45`), in cents; null = not even that. What comes
 * in by it is marked as a guess.
 */
export function aboutCents(text: string, decimal: DecimalMark): number | null {
  const bare = text.trim().replace(SIGN, '').trim().replace(BEFORE, '').trim();
  const times = TIMES.exec(bare);
  if (times) {
    const each = parseCents((times[2] ?? '').replace(AFTER, ''), decimal);
    return each === null || Number(times[1]) === 0 ? null : Number(times[1]) * each;
  }
  if (OTHER_MARK[decimal].test(bare)) return parseCents(bare, decimal === '.' ? ',' : '.');
  const thousands = /^(\d{1,3})(?:[.,](\d{1,3}))?\s*k$/i.exec(bare);
  if (thousands) return (Number(thousands[1]) * 1000 + Number((thousands[2] ?? '').padEnd(3, '0'))) * 100;
  return parseCents(bare.replace(AFTER, '').replace(AFTER, ''), decimal);
}

/** `1234`, `1,234.5`, `$1,234.56` without a regular expression: most cells of a long file. −1 = another form. */
function plainCents(text: string): number {
  const end = text.length;
  let at = text.charCodeAt(0) === 36 ? 1 : 0;
  const start = at;
  if (end === at || end > 15) return -1;
  let value = 0;
  let sinceComma = -1;
  for (; at < end; at++) {
    const code = text.charCodeAt(at);
    if (code >= 48 && code <= 57) {
      value = value * 10 + code - 48;
      if (sinceComma >= 0) sinceComma++;
    } else if (code === 44) {
      if (at === start || (sinceComma < 0 ? at - start > 3 : sinceComma !== 3)) return -1;
      sinceComma = 0;
    } else break;
  }
  if (at === start || (sinceComma >= 0 && sinceComma !== 3)) return -1;
  if (at === end) return value * 100;
  if (text.charCodeAt(at) !== 46) return -1;
  const tenth = text.charCodeAt(at + 1) - 48;
  const hundredth = end - at === 3 ? text.charCodeAt(at + 2) - 48 : 0;
  if (end - at > 3 || end - at < 2 || !(tenth >= 0 && tenth <= 9 && hundredth >= 0 && hundredth <= 9)) return -1;
  return value * 100 + tenth * 10 + hundredth;
}

/** Does a cell look like money or a plain number, whatever its decimal mark? */
export function looksLikeMoney(text: string): boolean {
  const bare = text
    .trim()
    .replace(/^(?:~|ca\.?|about|approx\.?)|(?:ish|\?|k)$/gi, '')
    .replace(SIGN, '')
    .replace(/[\s'’()+]|^[-−–]|[-−–]+$/g, '')
    .replace(/^[-−–]/, '');
  return bare !== '' && /^\d[\d.,]*$/.test(bare);
}

/** Does a cell say in words that there is no amount? */
export function saysNothing(text: string): boolean {
  return NOTHING.has(text.trim().toLowerCase());
}

/** Which decimal mark a cell speaks for: 1 = point, −1 = comma, 0 = either. */
export function decimalVote(text: string): -1 | 0 | 1 {
  const last = /([.,])(\d+)\D*$/.exec(text);
  if (!last) return 0;
  const [, mark, digits = ''] = last;
  const other = mark === '.' ? ',' : '.';
  const speaks = digits.length !== 3 || text.includes(other);
  const isGrouping = digits.length === 3 && text.split(mark as string).length > 2;
  if (isGrouping) return mark === '.' ? -1 : 1;
  if (!speaks) return 0;
  return mark === '.' ? 1 : -1;
}

const CODES: readonly (readonly [RegExp, readonly string[]])[] = [
  [/€|\bEUR\b/, ['EUR']],
  [/£|\bGBP\b/, ['GBP']],
  [/\bCHF\b/, ['CHF']],
  [/zł|\bPLN\b/, ['PLN']],
  [/Kč|\bCZK\b/, ['CZK']],
  [/\bkr\b|\bSEK\b|\bNOK\b|\bDKK\b/, ['SEK', 'NOK', 'DKK']],
  [/\bCAD\b|C\$/, ['CAD']],
  [/\bAUD\b|A\$/, ['AUD']],
  [/\bUSD\b|US\$/, ['USD']],
  [/\$/, ['USD', 'CAD', 'AUD', 'NZD', 'MXN']],
];

/** The currencies that a sign or code in the text may stand for; null = it names none. */
export function currenciesIn(text: string): readonly string[] | null {
  return CODES.find(([sign]) => sign.test(text))?.[1] ?? null;
}
