import type { RebuildFound } from '#shared/contracts/import-reading.ts';
import type { Day } from '#shared/day.ts';
import type { ExistingRebuild } from '../books.ts';

/** A rebuild while rows are being read. `place` is its place in the list of those that rows came in for; −1 = none yet. */
export interface Draft {
  readonly found: RebuildFound;
  readonly existing: ExistingRebuild | null;
  /** Facts that take the place of those that the books hold; all others only fill what they do not know. */
  readonly overwrites: Set<string>;
  /** The day of the sale where it stands apart from the price; it counts only beside one. null = it does not. */
  soldOn: Day | null;
  place: number;
}

/** A rebuild of which nothing is known yet but its name. */
export function newDraft(
  tag: string,
  existing: ExistingRebuild | null,
  row: number,
  known: Partial<RebuildFound> = {},
): Draft {
  return {
    place: -1,
    existing,
    overwrites: new Set(),
    soldOn: null,
    found: {
      tag: existing?.tag ?? tag,
      existingId: existing?.id ?? null,
      year: null,
      make: null,
      model: null,
      trim: null,
      vin: null,
      className: null,
      damageName: null,
      secondDamageName: null,
      titleBrand: null,
      odometer: null,
      isSeen: null,
      boughtFrom: null,
      notes: null,
      purchaseCents: null,
      askingCents: null,
      saleCents: null,
      expectedSaleCents: null,
      dates: {},
      spellings: [],
      vehicleId: null,
      isOverwritten: false,
      sheet: 1,
      row,
      ...known,
    },
  };
}

const LONGEST = 40;

/** The first so many characters of a text, never half of one. */
const cut = (text: string, most: number) => text.slice(0, most).replace(/[\uD800-\uDBFF]$/, '');

/** Gives out tags that neither the shop nor this file has yet: `13 F-150`, then `13 F-150 (2)`. */
export function tagMaker(taken: Iterable<string>): (wanted: string) => string {
  const used = new Set([...taken].map((tag) => tag.toLowerCase()));
  return (wanted) => {
    const base = cut(wanted.trim(), 34).trim() || 'no name';
    let tag = base;
    for (let number = 2; used.has(tag.toLowerCase()); number++) {
      const ending = ` (${number})`;
      tag = cut(base, LONGEST - ending.length) + ending;
    }
    used.add(tag.toLowerCase());
    return tag;
  };
}
