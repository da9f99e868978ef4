import type { Meaning } from '#shared/contracts/import-reading.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { isCoarseDay } from '../cells/coarse-days.ts';
import { looksLikeDay } from '../cells/days.ts';
import { classReader, damageReader } from '../words/kinds.ts';
import { makeOf } from '../words/vehicles.ts';
import { headingMeanings } from '../words/headings.ts';
import type { Draft } from './draft.ts';
import { type CellAside, type Plan, type RowRead, taken } from './plan.ts';
import { isFigure, isOnlyColor, isTitleBrand, type VehicleTitle } from './sheet-words.ts';
import { readOdometer } from './vehicle-cells.ts';

const DATES = new Set<Meaning>(REBUILD_DATES.map(([field]) => field));
const LONGEST = 60;
const LONGEST_TAG = 40;

/** Reads rows of labels and values about the vehicle itself: `Bought, 4/18/2019, Miles, 124893, salvage title`. */
export function factReader(plan: Plan) {
  const damageOf = damageReader(plan.books.damages);
  const classOf = classReader(plan.books.classes);
  const dayOf = plan.days.get(1);

  const tags = new Set([...plan.books.rebuilds.map(({ tag }) => tag), ...tagsOf(plan)].map((tag) => tag.toLowerCase()));
  /** A stock number is the vehicle's name, unless another has it. */
  function tagBy({ found, existing }: Draft, number: string): void {
    if (existing || number.length > LONGEST_TAG || tags.has(number.toLowerCase())) return;
    tags.add(number.toLowerCase());
    found.tag = number;
  }

  /** What a label may stand for, and its value; false = the value does not suit it. */
  function take(draft: Draft, meanings: readonly Meaning[], value: string): boolean {
    const { found } = draft;
    const date = meanings.find((meaning) => DATES.has(meaning));
    if (date && looksLikeDay(value)) {
      const day = dayOf?.(value);
      if (!day || day === 'bad' || day === 'blank') return true;
      if (date === 'soldOn') draft.soldOn ??= day;
      else found.dates[date] = day;
      return true;
    }
    if (meanings.includes('odometer')) return set(readOdometer(value), (miles) => (found.odometer ??= miles));
    if (value.length > LONGEST || isFigure(value)) return false;
    if (meanings.includes('year'))
      return set(/^(?:19|20)\d\d$/.test(value) ? Number(value) : null, (year) => (found.year ??= year));
    if (meanings.includes('make')) return set(makeOf(value) ?? value, (make) => (found.make ??= make));
    if (meanings.includes('model')) return set(value, (model) => (found.model ??= model));
    if (meanings.includes('stock number')) return set(value, (number) => tagBy(draft, number));
    if (meanings.includes('vin')) return set(value.length <= 20 ? value : null, (vin) => (found.vin ??= vin));
    if (meanings.includes('damage')) return set(damageOf(value), (name) => (found.damageName ??= name));
    if (meanings.includes('title brand')) return set(value, (brand) => (found.titleBrand ??= brand));
    if (meanings.includes('class')) return set(classOf(value), (name) => (found.className ??= name));
    if (meanings.includes('bought from')) return set(value, (from) => (found.boughtFrom ??= from));
    return false;
  }

  return {
    /** Takes what a row says of the vehicle; null = it says nothing, or holds an amount and is more than facts. */
    row(draft: Draft, cells: readonly string[]): RowRead | null {
      const words = cells
        .flatMap((cell) => cell.split(/:\s+/))
        .map((cell) => cell.trim())
        .filter((cell) => cell !== '');
      if (words.some(isFigure)) return null;
      const asides: CellAside[] = [];
      let isTaken = false;
      for (let at = 0; at < words.length; at++) {
        const word = words[at] ?? '';
        const meanings = headingMeanings(word);
        const value = words[at + 1];
        const isDay = meanings.some((meaning) => DATES.has(meaning));
        if (isDay && value !== undefined && isCoarseDay(value)) {
          const col = cells.findIndex((cell) => cell.includes(value)) + 1;
          asides.push({ col, reason: 'bad-date', text: value, cents: null });
          at++;
        } else if (meanings.length > 0 && value !== undefined && take(draft, meanings, value)) {
          isTaken = true;
          at++;
        } else if (isTaken && isTitleBrand(word)) draft.found.titleBrand ??= word;
      }
      return isTaken || asides.length > 0 ? { ...taken([]), draft, cells: asides } : null;
    },
    /** Takes what a title says beside the vehicle's name. */
    title({ found }: Draft, { besides }: VehicleTitle): void {
      for (const part of besides) {
        if (isOnlyColor(part)) continue;
        if (isTitleBrand(part)) found.titleBrand ??= part;
        else found.damageName ??= damageOf(part);
      }
    },
  };
}

function* tagsOf(plan: Plan): Iterable<string> {
  for (const target of plan.vehicles.values()) if (typeof target === 'object') yield target.found.tag;
}

function set<T>(value: T | null, keep: (value: T) => void): boolean {
  if (value === null) return false;
  keep(value);
  return true;
}
