import type { SheetPlace } from '#shared/contracts/bids-basis.ts';

const PLACES: readonly (readonly [SheetPlace, RegExp])[] = [
  ['title', /title|registration|inspection/i],
  ['transport', /transport|haul|\btow|freight/i],
  ['selling', /selling|advert|commission/i],
  ['holding', /insurance|storage|interest/i],
  ['tax', /\btax/i],
  ['fee', /auction|\bfees?\b/i],
];

/** The field of a pre-bid sheet that a cost category has for itself, told by its name. null = it is planned as a line. */
export function sheetPlace({ name, isPaidLabor }: { name: string; isPaidLabor: boolean }): SheetPlace | null {
  if (isPaidLabor) return 'paid labor';
  return PLACES.find(([, words]) => words.test(name))?.[0] ?? null;
}
