import type { Meaning } from '#shared/contracts/import-reading.ts';
import { PURCHASE, SALE } from '../words/categories.ts';
import { actualPart, dealOf, headingMeanings, isTotalLabel, likelyMeanings, plannedPart } from '../words/headings.ts';
import { isOwnWork, saysHours } from '../words/own-work.ts';
import { type ColumnFacts, holdsDays, holdsHours, holdsMoney } from './column-facts.ts';
import { bySaying, type CategoryReader, type Guess, ignored } from './guess.ts';
import { suits } from './suits.ts';

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
const STOCK_NUMBER = /^[a-z]{0,3}[- ]?\d{1,5}$/i;

/** What the columns of a sheet with one vehicle per row hold. */
export function guessOfVehicles(all: readonly ColumnFacts[], categoryOf: CategoryReader): Guess[] {
  const used = new Set<Meaning>();
  const guesses = all.map((facts) => {
    const guess = guessOne(facts, used, categoryOf);
    if (!REPEATABLE.has(guess.meaning) && guess.category === null) used.add(guess.meaning);
    return guess;
  });
  return besideDays(all, withPurchase(all, guesses));
}

/** Money right beside the day of a deal, which nothing else explains, is what the vehicle was bought, or sold, for. */
function besideDays(all: readonly ColumnFacts[], guesses: readonly Guess[]): Guess[] {
  const settled = [...guesses];
  for (const [day, money] of [
    ['boughtOn', 'purchase'],
    ['soldOn', 'sale'],
  ] as const) {
    const at = settled.findIndex(({ meaning }) => meaning === day) + 1;
    const facts = all[at];
    const isFree = settled[at]?.meaning === 'ignore' && settled[at]?.why !== OWN_WORK;
    if (at === 0 || !facts || !isFree || facts.filled === 0 || !holdsMoney(facts)) continue;
    if (settled.some(({ meaning }) => meaning === money) || plannedPart(facts.heading) !== null) continue;
    settled[at] = { meaning: money, category: null, why: 'It holds money and stands beside the day.' };
  }
  return settled;
}

function guessOne(facts: ColumnFacts, used: ReadonlySet<Meaning>, categoryOf: CategoryReader): Guess {
  const planned = plannedPart(facts.heading);
  const byPlan = planned === null ? null : plannedGuess(facts, planned, categoryOf);
  if (byPlan) return byPlan;
  const exact = byMeaning(facts, headingMeanings(facts.heading), used);
  if (exact) return exact;
  if (facts.filled === 0) return ignored('The column is empty.');
  const deal = dealGuess(facts, used);
  const likely = () => byMeaning(facts, likelyMeanings(facts.heading), used);
  if (!holdsMoney(facts)) return deal ?? likely() ?? unknown(facts);
  if (isOwnWork(facts.heading)) {
    const isTime = !used.has('hours') && saysHours(facts.heading) && holdsHours(facts);
    return isTime ? bySaying('hours') : ignored(OWN_WORK);
  }
  const whole = costGuess(facts, actualPart(facts.heading), categoryOf, true);
  return whole ?? deal ?? costGuess(facts, facts.heading, categoryOf, false) ?? likely() ?? unknown(facts);
}

/** Said of a column of money for own time. */
export const OWN_WORK = 'The heading speaks of own time, which the books count in hours and not in money.';

function unknown(facts: ColumnFacts): Guess {
  const isKnown = likelyMeanings(facts.heading).some((meaning) => !NOT_OF_VEHICLES.has(meaning));
  return ignored(
    isKnown ? 'The cells do not suit the heading, or another column holds this.' : 'The heading is not known.',
  );
}

function byMeaning(facts: ColumnFacts, meanings: readonly Meaning[], used: ReadonlySet<Meaning>): Guess | null {
  const found = meanings.find(
    (meaning) => !NOT_OF_VEHICLES.has(meaning) && !used.has(meaning) && suits(meaning, facts),
  );
  if (!found) return null;
  const names = facts.samples.filter((cell) => !isTotalLabel(cell));
  const isNumber = found === 'vehicle' && names.length > 0 && names.every((cell) => STOCK_NUMBER.test(cell));
  return bySaying(isNumber && !used.has('stock number') ? 'stock number' : found);
}

/** `Date purchased`, `Prix d'achat`, `Vendu`: the day or the money of a deal, as the cells tell. */
function dealGuess(facts: ColumnFacts, used: ReadonlySet<Meaning>): Guess | null {
  const deal = dealOf(facts.heading);
  if (deal === null) return null;
  const meanings: readonly Meaning[] = deal === 'buying' ? ['boughtOn', 'purchase'] : ['soldOn', 'sale'];
  const found = meanings.find(
    (meaning) => !used.has(meaning) && (meaning.endsWith('On') ? holdsDays(facts) : holdsMoney(facts)),
  );
  return found ? bySaying(found) : null;
}

function costGuess(facts: ColumnFacts, words: string, categoryOf: CategoryReader, isWhole: boolean): Guess | null {
  const found = categoryOf(words);
  if (!found || (isWhole && !found.isSure) || found.category === PURCHASE || found.category === SALE) return null;
  const why = 'The heading names a kind of cost, and the cells hold money.';
  return holdsMoney(facts) ? { meaning: 'cost', category: found.category, why } : null;
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

const CALLED_COST = /^(?:(?:car |unit |vehicle )?cost|paid|price|amount|coste|importe|cout|montant|betrag|kosten)$/;

/** Said of a column that is only called `Cost`, beside columns of single costs. */
export const CALLED_SO = 'It stands before the other costs, and no other column holds the purchase.';

/** Where no column holds the purchase, one that is only called `Cost` and stands before the single costs is it. */
function withPurchase(all: readonly ColumnFacts[], guesses: readonly Guess[]): Guess[] {
  if (guesses.some(({ meaning }) => meaning === 'purchase')) return [...guesses];
  const first = guesses.findIndex(({ meaning }) => meaning === 'cost');
  const at = all.findIndex(
    (facts, i) =>
      i < first &&
      guesses[i]?.meaning === 'ignore' &&
      facts.filled > 0 &&
      holdsMoney(facts) &&
      CALLED_COST.test(actualPart(facts.heading) || 'paid'),
  );
  return guesses.map((guess, i) => (i === at ? { meaning: 'purchase', category: null, why: CALLED_SO } : guess));
}
