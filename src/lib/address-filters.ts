import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { z } from 'zod';

/** Filters and sorting as the address holds them, so that a page can be bookmarked and sent. */
export function useAddressFilters<S extends z.ZodObject>(
  schema: S,
): { filters: z.output<S>; set: (change: Readonly<Record<string, string | null>>) => void; isFiltered: boolean } {
  const [search, setSearch] = useSearchParams();
  const text = search.toString();
  const filters = useMemo(() => readFilters(schema, new URLSearchParams(text)), [schema, text]);
  const set = (change: Readonly<Record<string, string | null>>) =>
    setSearch(
      (before) => {
        const after = new URLSearchParams(before);
        for (const [name, value] of Object.entries(change)) {
          if (value) after.set(name, value);
          else after.delete(name);
        }
        return after;
      },
      { replace: true },
    );
  const isFiltered = Object.keys(filters).some((name) => name !== 'sort' && name !== 'order');
  return { filters, set, isFiltered };
}

/** What of an address the schema takes, one name at a time: an old or mistyped filter is left out, not an error. */
export function readFilters<S extends z.ZodObject>(schema: S, search: URLSearchParams): z.output<S> {
  const found: Record<string, unknown> = {};
  for (const [name, part] of Object.entries(schema.shape)) {
    const value = search.get(name);
    const parsed = value === null || name === 'cursor' ? null : (part as z.ZodType).safeParse(value);
    if (parsed?.success) found[name] = parsed.data;
  }
  return found as z.output<S>;
}
