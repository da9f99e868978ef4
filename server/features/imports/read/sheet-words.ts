import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import { readVehicle } from '../understand/vehicle-text.ts';
import { isColor, makeOf } from '../words/vehicles.ts';
import { headingMeanings } from '../words/headings.ts';
import { isOwnWork } from '../words/own-work.ts';
import { tradeMeaning } from '../words/categories.ts';
import { filled } from './row-kinds.ts';

/** A row that opens the part of a sheet about one vehicle. */
export interface VehicleTitle {
  /** As it names the vehicle: `2011 Subaru Outback`. */
  readonly text: string;
  /** What else it says: a damage, a color, a title brand. */
  readonly besides: readonly string[];
}

const MOST_IN_TITLE = 4;
const LONGEST_TITLE = 90;
const OPENING =
  /^\s*(?:(?:estimate|budget|costs?|receipts?|expenses|rebuild|sheet|kosten|belege|gastos|frais)\s+(?:for|of|für|de|pour)|vehicle|car|fahrzeug|coche|voiture)\b\s*:?\s*/i;
const BREAKS = /\s+[-–—|•]+\s+|\s*[;(),]\s*|:\s+/;

/** Does a row name a vehicle and hold no figures of its own? null = it does not. */
export function titleOf(cells: readonly string[], thisYear: number): VehicleTitle | null {
  if (filled(cells) > MOST_IN_TITLE || cells.some((cell) => isFigure(cell) || looksLikeDay(cell))) return null;
  for (const cell of cells) {
    if (cell.length < 4 || cell.length > LONGEST_TITLE || !/\d\d/.test(cell)) continue;
    const parts = cell
      .replace(OPENING, '')
      .replace(/^[\s=*#-]+|[\s=*#-]+$/g, '')
      .split(BREAKS);
    const at = parts.findIndex((part) => namesVehicle(part, thisYear));
    if (at < 0) continue;
    const others = cells.filter((other) => other !== cell && other.trim() !== '');
    return {
      text: parts[at] ?? '',
      besides: [...parts.filter((_, i) => i !== at), ...others].map((part) => part.trim()),
    };
  }
  return null;
}

/** A year beside a known make, or a year of four digits beside a word that is no cost, month or heading. */
export function namesVehicle(text: string, thisYear: number): boolean {
  const { year, make, model } = readVehicle(text, thisYear);
  if (year === null || model === null || text.split(/\s+/).length > 6) return false;
  if (make !== null) return true;
  const isOther = headingMeanings(model).length > 0 || tradeMeaning(model) !== null || makeOf(model) !== null;
  const isName = /\p{L}{2}/u.test(model) || LETTER_AND_NUMBER.test(model);
  return /\b(?:19|20)\d\d\b/.test(text) && !isOther && isName && model.split(' ').length <= 2;
}

/** `F-150`, `A4`, `X5`; but no quarter and no week. */
const LETTER_AND_NUMBER = /^(?!Q[1-4]$|K?W\d)\p{Lu}{1,3}-?\d{1,4}\b/u;

const GENERIC =
  /^(?:sheet|tab|table|tabelle|blatt|hoja|feuil|summary|overview|list|data|notes?|total|totals|misc|old|copy)\b/i;

/** Does the tab of a sheet name its vehicle: `2011 Miata`, `09 Civic`, or `Civic` when it is no word of the trade? */
export function tabNamesVehicle(name: string, thisYear: number): boolean {
  if (namesVehicle(name, thisYear) || /^['’]?\d\d\s+\p{L}{2}/u.test(name)) return true;
  const isWord =
    tradeMeaning(name) !== null || headingMeanings(name).length > 0 || isOwnWork(name) || GENERIC.test(name);
  return /\p{L}{3}/u.test(name) && name.length <= 30 && !isWord;
}

/** An amount with its decimals or a sign, not just any number. */
export const isFigure = (cell: string) =>
  looksLikeMoney(cell) && (/[.,]\d{1,2}(?!\d)|[$€£]/.test(cell) || /^\s*\(/.test(cell));

const BRAND = /\b(?:salvage|rebuilt|reconstructed|clean|clear|flood|junk|branded|certificate)\b/i;

/** Does a text say what the vehicle's title is branded? */
export const isTitleBrand = (text: string) => BRAND.test(text) && text.length < 40;

/** Is everything in a text the name of a color? */
export const isOnlyColor = (text: string) => text.split(/\s+/).every((word) => isColor(word));
