/**
 * Vehicle identification number: does its check digit fit? (definitions §14; 49 CFR 565.15). 17 characters, digits and
 * letters except I, O and Q; Σ value × weight mod 11 must be character 9, 10 being X. Failing is a warning and no
 * refusal: the digit is a duty in North America only. Example: 1HGCM82633A004352 sums to 311, 311 mod 11 = 3.
 */
export interface VinCheck {
  /** As read: trimmed, upper case. */
  readonly vin: string;
  readonly isValid: boolean;
  /** Why not; null = it fits. */
  readonly problem: 'length' | 'character' | 'check digit' | null;
  /** Sum of products, and the check digit that it asks for; null = not 17 allowed characters. */
  readonly sum: number | null;
  readonly expectedDigit: string | null;
  /** Numbers that fit and differ only by characters easily misread. */
  readonly suggestions: readonly string[];
}

const LENGTH = 17;
const CHECK_PLACE = 8;
const WEIGHTS = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2];
/** Letters at the place of their value; the dots are the letters that a VIN never has, and the gap before S. */
const LETTER_ROWS = ['.ABCDEFGH', '.JKLMN.P.R', '..STUVWXYZ'];
const NEVER = new Map([
  ['I', '1'],
  ['O', '0'],
  ['Q', '0'],
]);
const MISREAD = new Map([
  ['S', '5'],
  ['5', 'S'],
  ['B', '8'],
  ['8', 'B'],
]);

/** Checks a typed number and offers likely corrections. */
export function checkVin(text: string): VinCheck {
  const vin = text.trim().toUpperCase();
  if (vin.length !== LENGTH) return { vin, ...unreadable('length'), suggestions: [] };
  const mended = vin.replace(/[IOQ]/g, (letter) => NEVER.get(letter) ?? letter);
  const sum = sumOf(vin);
  if (sum === null) return { vin, ...unreadable('character'), suggestions: fits(mended) ? [mended] : swaps(mended) };
  const expectedDigit = digitOf(sum);
  const isValid = vin[CHECK_PLACE] === expectedDigit;
  return {
    vin,
    isValid,
    problem: isValid ? null : 'check digit',
    sum,
    expectedDigit,
    suggestions: isValid ? [] : swaps(vin),
  };
}

function unreadable(problem: 'length' | 'character'): Omit<VinCheck, 'vin' | 'suggestions'> {
  return { isValid: false, problem, sum: null, expectedDigit: null };
}

/** Numbers with one S/5 or B/8 the other way round that fit. */
function swaps(vin: string): string[] {
  const changed = [...vin].map((character, i) => {
    const other = MISREAD.get(character);
    return other === undefined ? null : vin.slice(0, i) + other + vin.slice(i + 1);
  });
  return changed.filter((other) => other !== null).filter(fits);
}

function fits(vin: string): boolean {
  const sum = sumOf(vin);
  return sum !== null && vin[CHECK_PLACE] === digitOf(sum);
}

function digitOf(sum: number): string {
  return sum % 11 === 10 ? 'X' : String(sum % 11);
}

/** Sum of value × weight; null = a character that no VIN has. */
function sumOf(vin: string): number | null {
  let total = 0;
  for (const [i, character] of [...vin].entries()) {
    const value = valueOf(character);
    if (value === null) return null;
    total += value * (WEIGHTS[i] ?? 0);
  }
  return total;
}

function valueOf(character: string): number | null {
  if (/^\d$/.test(character)) return Number(character);
  if (!/^[A-Z]$/.test(character)) return null;
  const places = LETTER_ROWS.map((row) => row.indexOf(character));
  return places.find((place) => place > 0) ?? null;
}
