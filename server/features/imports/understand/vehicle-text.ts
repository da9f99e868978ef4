import { fold } from '../cells/fold.ts';
import { fullYear, looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { isColor, makeOf } from '../words/vehicles.ts';

/** A vehicle as someone typed it, taken apart. `key` = the model's letters and digits, by which spellings are compared. */
export interface VehicleText {
  readonly year: number | null;
  readonly make: string | null;
  readonly model: string | null;
  readonly key: string;
}

// Whoever wrote more than this told a story, not a model; it stays with the row.
const LONGEST_MODEL = 60;
const FOUR = /^(19[3-9]\d|20\d\d)$/;
const TWO = /^\d\d$/;

/** Reads `13 F-150`, `'05 Altima`, `2012 Dodge Caravan silver`, `Escape 06`. Unknown parts are null. */
export function readVehicle(text: string, thisYear: number): VehicleText {
  const words = text
    .replace(/['’`"]/g, ' ')
    .split(/[\s,;/]+/)
    .filter((word) => fold(word) !== '');
  const year = takeYear(words, thisYear);
  const make = takeMake(words);
  const left = words.filter((word) => !isColor(word));
  const model = (left.length > 0 ? left : words).join(' ') || null;
  const key = modelKey(model ?? make ?? text);
  return { year, make, model: model !== null && model.length > LONGEST_MODEL ? null : model, key };
}

/** Does a cell read as a vehicle: a year beside a model? */
export function looksLikeVehicle(cell: string, thisYear: number): boolean {
  const { year, model } = readVehicle(cell, thisYear);
  return year !== null && model !== null && /\p{L}{2}/u.test(model) && !looksLikeMoney(cell) && !looksLikeDay(cell);
}

/** What of a model's name is compared: letters and digits alone. */
export function modelKey(model: string): string {
  return fold(model).replaceAll(' ', '');
}

function takeYear(words: string[], thisYear: number): number | null {
  const four = words.findIndex((word) => FOUR.test(word));
  if (four >= 0 && words.length > 1) return Number(words.splice(four, 1)[0]);
  for (const at of [0, words.length - 1]) {
    const word = words[at];
    if (words.length > 1 && word !== undefined && TWO.test(word)) {
      words.splice(at, 1);
      return fullYear(word, thisYear);
    }
  }
  return null;
}

function takeMake(words: string[]): string | null {
  for (let at = 0; at < words.length; at++) {
    for (const size of [2, 1]) {
      const make = words.length > size ? makeOf(words.slice(at, at + size).join(' ')) : null;
      if (make) {
        words.splice(at, size);
        return make;
      }
    }
  }
  return null;
}

const digitsOf = (text: string) => text.replace(/\D+/g, ' ');

/**
 * Is one text a slip of the pen away from the other: one letter more, less, changed, or two swapped? Digits never
 * count as a slip (an F-150 is no F-250), nor do words too short to tell.
 */
export function isSlip(a: string, b: string): boolean {
  if (a === b || Math.min(a.length, b.length) < 4 || Math.abs(a.length - b.length) > 1 || digitsOf(a) !== digitsOf(b))
    return false;
  let start = 0;
  while (start < a.length && a[start] === b[start]) start++;
  let end = 0;
  while (end < Math.min(a.length, b.length) - start && a[a.length - 1 - end] === b[b.length - 1 - end]) end++;
  const leftA = a.slice(start, a.length - end);
  const leftB = b.slice(start, b.length - end);
  if (Math.max(leftA.length, leftB.length) <= 1) return true;
  return leftA.length === 2 && leftB.length === 2 && leftA[0] === leftB[1] && leftA[1] === leftB[0];
}
