import { useSearchParams } from 'react-router-dom';
import {
  type AnswerQuery,
  type FilterQuery,
  filterQuerySchema,
  yearQuerySchema,
} from '#shared/contracts/answers-parts.ts';
import { LEVELS, type LevelName, PAY_VIEWS, type PayView } from '#shared/vocabulary.ts';

const FILTERS = ['from', 'to', 'class', 'damage', 'seen'] as const;
export type FilterName = (typeof FILTERS)[number];

/** The filters that an address asks for; what cannot be read is left out, one by one. */
export function filterOf(search: URLSearchParams): FilterQuery {
  const filter: Record<string, unknown> = {};
  for (const name of FILTERS) {
    const read = filterQuerySchema.safeParse({ [name]: search.get(name) ?? undefined });
    if (read.success && read.data[name] !== undefined) filter[name] = read.data[name];
  }
  return filter;
}

/** The shop year that an address asks for; null = the one that runs. */
export function yearOf(search: URLSearchParams): number | null {
  const read = yearQuerySchema.safeParse({ year: search.get('year') ?? undefined });
  return (read.success && read.data.year) || null;
}

/** `sold` where an address asks to count as an old sheet would. */
export function exitsOf(search: URLSearchParams): AnswerQuery['exits'] {
  return search.get('exits') === 'sold' ? 'sold' : undefined;
}

/** What an address asks to compare kinds of wreck by. */
export function payViewOf(search: URLSearchParams): PayView {
  return PAY_VIEWS.find((one) => one === search.get('view')) ?? 'per-hour';
}

/** The contingency level that an address asks for, written `4-5`. */
export function levelOf(search: URLSearchParams): LevelName {
  return LEVELS.find((level) => level.replace('/', '-') === search.get('level')) ?? '4/5';
}

/** What the address says, and a way to change it: a value of null takes the name out. */
export function useAddress() {
  const [search, setSearch] = useSearchParams();
  const change = (values: Readonly<Record<string, string | null>>) =>
    setSearch(
      (old) => {
        const next = new URLSearchParams(old);
        for (const [name, value] of Object.entries(values)) {
          if (value === null || value === '') next.delete(name);
          else next.set(name, value);
        }
        return next;
      },
      { replace: true, preventScrollReset: true },
    );
  const filter = filterOf(search);
  const exits = exitsOf(search);
  return { search, filter, asked: exits === undefined ? filter : { ...filter, exits }, change };
}
