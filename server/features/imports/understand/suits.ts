import type { Meaning } from '#shared/contracts/import-reading.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { weekdayOf } from '../words/weekdays.ts';
import { type ColumnFacts, holdsDays, holdsHours, holdsMoney, holdsText, holdsYears } from './column-facts.ts';

const DATES = new Set<Meaning>(['date', ...REBUILD_DATES.map(([field]) => field)]);
const MONEY = new Set<Meaning>(['amount', 'credit', 'estimate', 'purchase', 'sale', 'asking', 'expected sale']);
const HOURS = new Set<Meaning>(['hours', 'estimated hours']);
const NUMBERS = new Set<Meaning>(['odometer', 'stock number', 'vin', 'notes', 'vehicle', 'model', 'trim', 'derived']);

/** Do the cells of a column suit what its heading says? */
export function suits(meaning: Meaning, facts: ColumnFacts): boolean {
  if (DATES.has(meaning)) return holdsDays(facts) || holdsYears(facts);
  if (HOURS.has(meaning)) return holdsHours(facts) || weekdayOf(facts.heading) !== null;
  if (meaning === 'year') return facts.filled === 0 || facts.modelYear >= 0.6;
  if (NUMBERS.has(meaning)) return meaning === 'vin' || facts.day < 0.6 || meaning === 'derived';
  return MONEY.has(meaning) ? holdsMoney(facts) : holdsText(facts);
}
