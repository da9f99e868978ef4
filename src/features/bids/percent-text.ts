import { z } from 'zod';

/** A rate as the fraction p/q in lowest terms: 6.5 % is 13/200. */
type Fraction = { readonly p: number; readonly q: number };

/** Reads a percentage as people type it; nothing typed is 0. null = not readable. `decimal` is the shop's decimal mark. */
export function parsePercent(text: string, decimal: '.' | ','): Fraction | null {
  const typed = text.replace(/[\s%]/g, '').replace(decimal, '.');
  if (typed === '') return { p: 0, q: 1 };
  const found = /^(\d{1,3})(?:\.(\d{0,4}))?$/.exec(typed) ?? /^()\.(\d{1,4})$/.exec(typed);
  if (!found) return null;
  const [, whole = '', part = ''] = found;
  const p = Number(whole + part);
  const q = 100 * 10 ** part.length;
  const common = divisor(p, q);
  return { p: p / common, q: q / common };
}

/** A fraction as the text that a field of percent starts with. */
export function percentToText({ p, q }: Fraction, decimal: '.' | ','): string {
  return p === 0 ? '' : String(Number(((p / q) * 100).toFixed(4))).replace('.', decimal);
}

/** A typed percentage, for a form's schema. */
export const percentTextSchema = (decimal: '.' | ',') =>
  z.string().transform((text, context) => {
    const rate = parsePercent(text, decimal);
    if (rate) return rate;
    context.addIssue({ code: 'custom', message: `“${text}” cannot be read as a percentage.` });
    return z.NEVER;
  });

function divisor(a: number, b: number): number {
  return b === 0 ? a || 1 : divisor(b, a % b);
}
