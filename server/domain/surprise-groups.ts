import { grouped } from './grouped.ts';
import { median, sum } from './statistics.ts';
import { byCodePoint } from './text-order.ts';

/** One surprise as it was booked: cents > 0, no chosen extra. */
export interface SurpriseEntry {
  readonly rebuildId: string;
  readonly category: string;
  readonly what: string | null;
  readonly cents: number;
}

interface Found {
  /** Rebuilds that had it. */
  readonly x: number;
  /** Median of what it cost a rebuild that had it. */
  readonly medianCents: number;
}

export interface SurpriseGroup extends Found {
  readonly category: string;
  /** What was written most often, dearest first of equals. */
  readonly whats: readonly (Found & { readonly what: string })[];
}

const CATEGORIES_AT_MOST = 5;
const WHATS_AT_MOST = 3;
const WHAT_LENGTH = 60;

/**
 * What surprised on rebuilds of one kind, by category and by what was written, the most frequent first and the
 * rare ones left out. `ids` = the
 * rebuilds of the kind that tell of every entry whether it was foreseen. Words that differ in capitals or spaces only are
 * the same. Nothing surprised: none.
 */
export function surpriseGroups(entries: readonly SurpriseEntry[], ids: ReadonlySet<string>): SurpriseGroup[] {
  const mine = entries.filter(({ rebuildId }) => ids.has(rebuildId));
  const groups = grouped(mine, ({ category }) => category);
  return [...groups]
    .map(([category, of]) => ({ category, ...foundIn(of), whats: whatsOf(of) }))
    .sort((a, b) => b.x - a.x || b.medianCents - a.medianCents || byCodePoint(a.category, b.category))
    .slice(0, CATEGORIES_AT_MOST);
}

function whatsOf(entries: readonly SurpriseEntry[]): SurpriseGroup['whats'] {
  const written = entries.filter(({ what }) => what !== null && what.trim() !== '');
  const groups = grouped(written, ({ what }) => (what ?? '').trim().toLowerCase().replaceAll(/\s+/g, ' '));
  return [...groups.values()]
    .map((of) => ({ what: (of[0]?.what ?? '').trim().slice(0, WHAT_LENGTH), ...foundIn(of) }))
    .sort((a, b) => b.x - a.x || b.medianCents - a.medianCents || byCodePoint(a.what, b.what))
    .slice(0, WHATS_AT_MOST);
}

function foundIn(entries: readonly SurpriseEntry[]): Found {
  const each = [...grouped(entries, ({ rebuildId }) => rebuildId).values()].map((of) =>
    sum(of.map(({ cents }) => cents)),
  );
  return { x: each.length, medianCents: median(each) ?? 0 };
}
