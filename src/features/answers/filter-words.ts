import type { FilterOptions, FilterQuery } from '#shared/contracts/answers-parts.ts';

const SEEN_WORDS = { yes: 'seen before buying', no: 'bought unseen', unknown: 'seen or not: not said' };

/** What the filters let through, in words: `All rebuilds`, `2024 to 2026 · compact car · bought unseen`. */
export function filterWords(filter: FilterQuery, options: FilterOptions): string {
  const nameOf = (list: readonly { id: string; name: string }[], id: string, unknown: string) =>
    id === 'unknown' ? unknown : (list.find((one) => one.id === id)?.name ?? 'one that is not there');
  const parts = [
    yearWords(filter),
    filter.class && nameOf(options.classes, filter.class, 'class not known'),
    filter.damage && nameOf(options.damages, filter.damage, 'damage not known'),
    filter.seen && SEEN_WORDS[filter.seen],
  ].filter(Boolean);
  return parts.length === 0 ? 'All rebuilds' : parts.join(' · ');
}

function yearWords({ from, to }: FilterQuery): string | null {
  if (from === undefined && to === undefined) return null;
  if (from === to) return `${from}`;
  if (to === undefined) return `since ${from}`;
  return from === undefined ? `up to ${to}` : `${from} to ${to}`;
}

/** Is anything filtered? */
export function isFiltered(filter: FilterQuery): boolean {
  return Object.values(filter).some((value) => value !== undefined);
}
