import type { DemoCategory, DemoEntry } from './demo-book.ts';
import { DEMO_TODAY, FIRST_YEAR } from './parameters.ts';
import { random } from './random.ts';

const TOOLS = [
  'frame gauge',
  'spray gun kit',
  'scan tool',
  'engine hoist',
  'creeper and stands',
  'plastic welder',
] as const;

/** What the yard costs whatever it buys: its share of the rent, tools, insurance, subscriptions. In all some 2,500 a year. */
export function overhead(seed: number): DemoEntry[] {
  const chance = random(seed, 'overhead');
  const entries: DemoEntry[] = [];
  const add = (datedOn: string, cents: number, category: DemoCategory, vendor: string, what: string) => {
    if (datedOn <= DEMO_TODAY)
      entries.push({ category, datedOn, cents, vendor, what, foreseen: 'foreseen', isExtra: false });
  };
  for (let year = FIRST_YEAR; year <= Number(DEMO_TODAY.slice(0, 4)); year += 1) {
    const since = year - FIRST_YEAR;
    for (let month = 1; month <= 12; month += 1) {
      const two = String(month).padStart(2, '0');
      add(`${year}-${two}-01`, 9_500 + 300 * since, 'other', 'Junction Sheds', 'rent, our share');
      if (month % 3 === 0)
        add(`${year}-${two}-10`, 5_985 + 225 * since, 'other', 'repair manuals', 'subscription, quarter');
    }
    add(`${year}-02-15`, 41_200 + 1_850 * since, 'insurance', 'Ottermere Mutual', 'yard liability, year');
    add(
      `${year}-0${chance.whole(3, 9)}-1${chance.whole(0, 9)}`,
      chance.whole(9_000, 46_000),
      'supplies',
      'Junction Tool',
      TOOLS[since] ?? 'tool',
    );
    add(
      `${year}-11-0${chance.whole(1, 9)}`,
      chance.whole(6_500, 14_000),
      'supplies',
      'Ottermere Hardware',
      'welding gas, abrasives',
    );
  }
  return entries;
}
