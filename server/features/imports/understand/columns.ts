import type { Column, Meaning } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';
import { type CategoryMeaning, PURCHASE, SALE } from '../words/categories.ts';
import { weekdayOf } from '../words/weekdays.ts';
import { headingMeanings, likelyMeanings, plannedPart } from '../words/headings.ts';
import { type ColumnFacts, holdsDays, holdsHours, holdsMoney, holdsText } from './column-facts.ts';

type CategoryReader = (text: string) => CategoryMeaning | null;

const DATES = new Set<Meaning>(['date', ...REBUILD_DATES.map(([field]) => field)]);
const MONEY = new Set<Meaning>(['amount', 'credit', 'purchase', 'sale', 'asking', 'expected sale', 'derived']);
const HOURS = new Set<Meaning>(['hours', 'estimated hours']);
const NUMBERS = new Set<Meaning>([
  'year',
  'odometer',
  'stock number',
  'vin',
  'notes',
  'vehicle',
  'model',
  'trim',
  'derived',
]);
const OF_EXPENSES: readonly Meaning[] = [
  'date',
  'vehicle',
  'stock number',
  'year',
  'make',
  'model',
  'category',
  'what',
  'vendor',
  'foreseen',
  'credit',
  'amount',
  'hours',
  'person',
  'notes',
  'derived',
];
const OF_HOURS: readonly Meaning[] = ['date', 'vehicle', 'stock number', 'person', 'hours', 'task', 'notes'];
const NOT_OF_VEHICLES = new Set<Meaning>([
  'date',
  'category',
  'what',
  'vendor',
  'foreseen',
  'amount',
  'credit',
  'person',
  'task',
]);
const REPEATABLE = new Set<Meaning>(['ignore', 'derived', 'notes']);

/** Do the cells of a column suit what its heading says? */
function fits(meaning: Meaning, facts: ColumnFacts): boolean {
  if (DATES.has(meaning)) return holdsDays(facts);
  if (HOURS.has(meaning)) return holdsHours(facts) || weekdayOf(facts.heading) !== null;
  if (meaning === 'year') return facts.filled === 0 || facts.modelYear >= 0.6;
  if (NUMBERS.has(meaning)) return meaning === 'vin' || facts.day < 0.6 || meaning === 'derived';
  return MONEY.has(meaning) ? holdsMoney(facts) : holdsText(facts);
}

/** Guesses what each column holds in a sheet of this shape. Every guess says why. */
export function guessColumns(
  all: readonly ColumnFacts[],
  shape: Shape,
  categoryOf: CategoryReader,
  sheet: number,
): Column[] {
  const used = new Set<Meaning>();
  const columns = all.map((facts): Column => {
    const guess = shape === 'vehicles' ? guessOfVehicles(facts, used, categoryOf) : guessByHeading(facts, used, shape);
    const isRepeatable = REPEATABLE.has(guess.meaning) || weekdayOf(facts.heading) !== null;
    if (!isRepeatable && guess.category === null) used.add(guess.meaning);
    return { sheet, col: facts.col, heading: facts.heading, samples: [...facts.samples], ...guess };
  });
  return shape === 'vehicles' ? columns : describedBy(columns, all, shape === 'hours' ? 'task' : 'what');
}

// No list has a place of its own for notes.
const UNREAD = new Set<Meaning>(['ignore', 'notes']);

/** A list without a column that says what each row was for takes the wordiest one that nothing else explains. */
function describedBy(columns: Column[], all: readonly ColumnFacts[], meaning: 'what' | 'task'): Column[] {
  if (columns.some((column) => column.meaning === meaning)) return columns;
  const [wordiest] = all
    .filter(
      (facts, i) =>
        UNREAD.has(columns[i]?.meaning ?? 'ignore') && facts.filled > 0 && facts.heading !== '' && holdsText(facts),
    )
    .sort((a, b) => b.distinct - a.distinct);
  const why = 'It holds words that no other column explains.';
  return columns.map((column) => (column.col === wordiest?.col ? { ...column, meaning, why } : column));
}

const STOCK_NUMBER = /^[a-z]{0,3}[- ]?\d{1,5}$/i;
type Guess = Pick<Column, 'meaning' | 'category' | 'why'>;
const ignored = (why: string): Guess => ({ meaning: 'ignore', category: null, why });

function guessByHeading(
  facts: ColumnFacts,
  used: Set<Meaning>,
  shape: Shape,
  meaningsOf: (heading: string) => readonly Meaning[] = shape === 'vehicles' ? headingMeanings : likelyMeanings,
): Guess {
  const allowed = shape === 'expenses' ? OF_EXPENSES : shape === 'hours' ? OF_HOURS : null;
  const known = meaningsOf(facts.heading).filter((meaning) =>
    allowed ? allowed.includes(meaning) : !NOT_OF_VEHICLES.has(meaning),
  );
  const ordered = allowed ? allowed.filter((meaning) => known.includes(meaning)) : known;
  const found = ordered.find((candidate) => !used.has(candidate) && fits(candidate, facts));
  const isNumber =
    found === 'vehicle' && shape === 'vehicles' && facts.samples.every((cell) => STOCK_NUMBER.test(cell));
  const meaning = isNumber && !used.has('stock number') ? 'stock number' : found;
  if (meaning) return { meaning, category: null, why: `The heading says so, and the cells below suit it.` };
  if (facts.filled === 0) return ignored('The column is empty.');
  return ignored(
    known.length > 0 ? 'The cells do not suit the heading, or another column holds this.' : 'The heading is not known.',
  );
}

function guessOfVehicles(facts: ColumnFacts, used: Set<Meaning>, categoryOf: CategoryReader): Guess {
  const planned = plannedPart(facts.heading);
  if (planned !== null) {
    const guess = plannedGuess(facts, planned, categoryOf);
    if (guess) return guess;
  }
  const byHeading = guessByHeading(facts, used, 'vehicles');
  if (byHeading.meaning !== 'ignore' || facts.filled === 0) return byHeading;
  if (!holdsMoney(facts)) return guessByHeading(facts, used, 'vehicles', likelyMeanings);
  const category = categoryOf(facts.heading);
  if (category?.category === PURCHASE && !used.has('purchase')) {
    return { meaning: 'purchase', category: null, why: 'The heading names the purchase, and the cells hold money.' };
  }
  if (!category || category.category === PURCHASE || category.category === SALE)
    return guessByHeading(facts, used, 'vehicles', likelyMeanings);
  return {
    meaning: 'cost',
    category: category.category,
    why: 'The heading names a kind of cost, and the cells hold money.',
  };
}

function plannedGuess(facts: ColumnFacts, planned: string, categoryOf: CategoryReader): Guess | null {
  const why = 'The heading says that this was planned.';
  const meanings = headingMeanings(planned);
  if (meanings.includes('hours') && holdsHours(facts)) return { meaning: 'estimated hours', category: null, why };
  if (!holdsMoney(facts)) return null;
  if (meanings.includes('sale')) return { meaning: 'expected sale', category: null, why };
  const category = categoryOf(planned)?.category;
  if (!category || category === PURCHASE || category === SALE) {
    return ignored('A planned figure that belongs to no single category.');
  }
  return { meaning: 'estimate', category, why };
}
