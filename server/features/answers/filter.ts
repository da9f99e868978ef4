import type { FilterOptions, FilterQuery } from '#shared/contracts/answers-parts.ts';
import type { Day } from '#shared/day.ts';
import type { Named, ShopFacts, ShopRebuild } from '../../books/shop-facts.ts';
import { shopYearOf, yearSpan } from '../../domain/years.ts';
import type { AnswerInput } from './input.ts';

/** The day that puts a rebuild in a year: when it left, or when it was listed. null = in no year yet. */
export type YearOf = FilterOptions['yearOf'];
const DAY: Record<YearOf, (rebuild: ShopRebuild) => Day | null> = {
  left: ({ exit }) => exit?.on ?? null,
  listed: ({ listedOn, exit }) => listedOn ?? exit?.on ?? null,
};

/** The rebuilds that a page's filters let through. With years asked for, one that is in no year yet stays out. */
export function filtered({ shop }: AnswerInput, query: FilterQuery, yearOf: YearOf): ShopRebuild[] {
  return letThrough(shop.rebuilds, shop, query, yearOf);
}

/** Those that left otherwise and that the filters would let through, where the address leaves them out. */
export function otherExitsLeftOut(
  { shop, otherExits }: AnswerInput,
  query: FilterQuery,
  yearOf: YearOf,
): ShopRebuild[] {
  return letThrough(otherExits, shop, query, yearOf);
}

function letThrough(
  rebuilds: readonly ShopRebuild[],
  shop: ShopFacts,
  query: FilterQuery,
  yearOf: YearOf,
): ShopRebuild[] {
  const className = nameFor(shop.classes, query.class);
  const damageName = nameFor(shop.damages, query.damage);
  const [from, to] = [query.from ?? -Infinity, query.to ?? Infinity];
  const asksYears = query.from !== undefined || query.to !== undefined;
  const seen = { yes: true, no: false, unknown: null };
  return rebuilds.filter((rebuild) => {
    if (className !== undefined && rebuild.class !== className) return false;
    if (damageName !== undefined && rebuild.damage !== damageName) return false;
    if (query.seen !== undefined && rebuild.seen !== seen[query.seen]) return false;
    if (!asksYears) return true;
    const day = DAY[yearOf](rebuild);
    const year = day === null ? null : shopYearOf(day, shop.startMonth);
    return year !== null && year >= from && year <= to;
  });
}

/** undefined = not asked; null = the rebuilds that have none. An id that the shop does not know matches none. */
function nameFor(list: readonly Named[], asked: string | undefined): string | null | undefined {
  if (asked === undefined) return undefined;
  return asked === 'unknown' ? null : (list.find(({ id }) => id === asked)?.name ?? '');
}

/** What there is to filter by, with counts over all rebuilds of the shop. */
export function filterOptions({ shop }: AnswerInput, yearOf: YearOf): FilterOptions {
  const years = new Map<number, number>();
  const classes = new Map<string | null, number>();
  const damages = new Map<string | null, number>();
  const seen = { yes: 0, no: 0, unknown: 0 };
  const add = <K>(counts: Map<K, number>, key: K) => counts.set(key, (counts.get(key) ?? 0) + 1);
  for (const rebuild of shop.rebuilds) {
    const day = DAY[yearOf](rebuild);
    if (day !== null) add(years, shopYearOf(day, shop.startMonth));
    add(classes, rebuild.class);
    add(damages, rebuild.damage);
    seen[rebuild.seen === null ? 'unknown' : rebuild.seen ? 'yes' : 'no'] += 1;
  }
  const options = (list: readonly Named[], counts: ReadonlyMap<string | null, number>) =>
    list.map(({ id, name }) => ({ id, name, count: counts.get(name) ?? 0 })).filter(({ count }) => count > 0);
  return {
    yearOf,
    years: [...years]
      .sort(([a], [b]) => a - b)
      .map(([year, count]) => ({ year, ...yearSpan(year, shop.startMonth), count })),
    classes: options(shop.classes, classes),
    damages: options(shop.damages, damages),
    seen,
  };
}
