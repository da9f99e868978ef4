import { type CellStyle, clockText, dayOfSerial, numberText, percentText } from './number-formats.ts';

// Numbers that short are written without the noise of binary fractions.
const SURE = 12;

/** Gives the text that a stored number of an .xlsx cell stands for. Days repeat, so each is worked out once. */
export function numberReader(is1904: boolean): (stored: string, style: CellStyle) => string {
  const days = new Map<string, string | null>();
  const dayOf = (stored: string): string | null => {
    let day = days.get(stored);
    if (day === undefined) days.set(stored, (day = dayOfSerial(Number(stored), is1904)));
    return day;
  };
  return (stored, { kind, decimals, sign }) => {
    if (kind === 'day') return dayOf(stored) ?? plain(stored, decimals);
    if (kind === 'number') return sign + plain(stored, decimals);
    const number = Number(stored);
    if (!Number.isFinite(number)) return stored;
    if (kind === 'percent') return percentText(number);
    return number >= 0 ? clockText(number) : plain(stored, decimals);
  };
}

function plain(stored: string, decimals: number | null): string {
  const point = stored.indexOf('.');
  const shown = point < 0 ? 0 : stored.length - point - 1;
  if (stored.length <= SURE && shown <= (decimals ?? SURE) && !/e/i.test(stored)) return stored;
  const number = Number(stored);
  return Number.isFinite(number) ? numberText(number, decimals) : stored;
}

const ESCAPED = /_x([0-9a-f]{4})_/gi;

/** A text as it was typed: workbooks write characters that XML forbids as `_x000D_`. */
export function unescapedText(text: string): string {
  return text.includes('_x') ? text.replace(ESCAPED, (whole, hex: string) => characterOf(whole, hex)) : text;
}

function characterOf(whole: string, hex: string): string {
  const code = Number.parseInt(hex, 16);
  if (code === 9 || code === 10) return String.fromCharCode(code);
  if (code < 32) return '';
  // Half a character is none: it stays as it is written.
  return code >= 0xd800 && code <= 0xdfff ? whole : String.fromCharCode(code);
}
