import type { Meaning } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import { fold } from '../cells/fold.ts';
import { headingMeanings, headingRank, likelyMeanings, plannedPart } from '../words/headings.ts';
import { tradeMeaning } from '../words/categories.ts';
import { weekdayOf } from '../words/weekdays.ts';
import { type ColumnFacts, holdsDays, holdsHours, holdsMoney, holdsText } from './column-facts.ts';
import { bySaying, type Guess, ignored } from './guess.ts';
import { suits } from './suits.ts';
import { looksLikeVehicle } from './vehicle-text.ts';

// What stands earlier is settled first where a heading is as usual for one as for the other.
const OF_EXPENSES: readonly Meaning[] = [
  'date',
  'vehicle',
  'stock number',
  'year',
  'make',
  'model',
  'category',
  'vendor',
  'foreseen',
  'what',
  'credit',
  'amount',
  'hours',
  'person',
  'notes',
  'derived',
];
const OF_HOURS: readonly Meaning[] = [
  'date',
  'vehicle',
  'stock number',
  'year',
  'make',
  'model',
  'person',
  'hours',
  'task',
  'notes',
];
const REPEATABLE = new Set<Meaning>(['derived', 'notes']);
// A heading known only by a part of it stands behind every heading known as a whole.
const BY_PART = 1000;

/** What the columns of a list of expenses or of hours hold: each meaning goes to the heading that says it best. */
export function guessOfList(all: readonly ColumnFacts[], shape: Shape, thisYear: number): Guess[] {
  // In a cash book `Soll` stands beside `Haben`, and plans nothing.
  const isCashBook = all.some((facts) => headingMeanings(facts.heading).includes('credit'));
  const plannedOf = (facts: ColumnFacts) =>
    isCashBook && headingMeanings(facts.heading).includes('amount') ? null : plannedGuess(facts, shape);
  const guesses: Guess[] = all.map((facts) => plannedOf(facts) ?? weekdayGuess(facts) ?? unknown(facts));
  const free = all.map((_, i) => guesses[i]?.meaning === 'ignore');
  const used = new Set<Meaning>(guesses.map(({ meaning }) => meaning));
  for (const { at, meaning } of candidates(all, shape === 'hours' ? OF_HOURS : OF_EXPENSES)) {
    if (!free[at] || (used.has(meaning) && !REPEATABLE.has(meaning))) continue;
    free[at] = false;
    used.add(meaning);
    guesses[at] = bySaying(meaning);
  }
  return described(all, byCells(all, guesses, shape, thisYear), shape === 'hours' ? 'task' : 'what');
}

function candidates(all: readonly ColumnFacts[], allowed: readonly Meaning[]) {
  const found: { at: number; meaning: Meaning; rank: number }[] = [];
  all.forEach((facts, at) => {
    const exact = headingMeanings(facts.heading);
    // `Sales tax` is a kind of cost, not sales.
    const isCost = exact.length === 0 && (tradeMeaning(facts.heading)?.isExact ?? false);
    const meanings = isCost ? [] : exact.length > 0 ? exact : likelyMeanings(facts.heading);
    for (const meaning of meanings) {
      const order = allowed.indexOf(meaning);
      if (order < 0 || !suits(meaning, facts) || (meaning === 'stock number' && isVoucher(facts))) continue;
      found.push({ at, meaning, rank: (headingRank(facts.heading, meaning) ?? BY_PART) + order / 100 });
    }
  });
  return found.sort((a, b) => a.rank - b.rank || a.at - b.at);
}

const FEWEST_VOUCHERS = 5;

/** A reference that is another one on every row numbers receipts, not vehicles. */
export const isVoucher = ({ heading, filled, distinct }: ColumnFacts) =>
  filled >= FEWEST_VOUCHERS &&
  distinct === 1 &&
  /^(?:ref|referen|beleg|voucher|receipt|check|cheque)/.test(fold(heading));

function plannedGuess(facts: ColumnFacts, shape: Shape): Guess | null {
  const isPlanned = shape === 'expenses' && plannedPart(facts.heading) !== null && facts.filled > 0;
  const isYesOrNo = headingMeanings(facts.heading).includes('foreseen') && !(facts.money > 0.5);
  if (!isPlanned || isYesOrNo || !holdsMoney(facts)) return null;
  return { meaning: 'estimate', category: null, why: 'The heading says that this was planned.' };
}

/** Each weekday of a weekly grid is a column of hours. */
const weekdayGuess = (facts: ColumnFacts): Guess | null =>
  weekdayOf(facts.heading) !== null && suits('hours', facts) ? bySaying('hours') : null;

function unknown(facts: ColumnFacts): Guess {
  if (facts.filled === 0) return ignored('The column is empty.');
  return ignored(
    likelyMeanings(facts.heading).length > 0
      ? 'The cells do not suit the heading, or another column holds this.'
      : 'The heading is not known.',
  );
}

const NO_OTHER = 'The heading says so, and no other column holds amounts.';
const NAMES: readonly Meaning[] = ['vehicle', 'stock number', 'model'];

/** What a list cannot do without and no heading names is known by its cells: days, vehicles, amounts. */
function byCells(all: readonly ColumnFacts[], guesses: readonly Guess[], shape: Shape, thisYear: number): Guess[] {
  const settled = [...guesses];
  const lacks = (...meanings: Meaning[]) => !settled.some(({ meaning }) => meanings.includes(meaning));
  const take = (meaning: Meaning, test: (facts: ColumnFacts) => boolean, why: string) => {
    const at = all.findIndex((facts, i) => settled[i]?.meaning === 'ignore' && facts.filled > 0 && test(facts));
    if (at >= 0) settled[at] = { meaning, category: null, why };
  };
  if (lacks('date')) take('date', (facts) => facts.day >= 0.7, 'Its cells hold days.');
  if (lacks(...NAMES)) {
    const isVehicle = (facts: ColumnFacts) =>
      holdsText(facts) && facts.samples.every((cell) => looksLikeVehicle(cell, thisYear));
    take('vehicle', isVehicle, 'Its cells read as vehicles.');
  }
  if (shape === 'hours') {
    if (lacks('hours')) take('hours', (facts) => facts.hours >= 0.7 && !holdsDays(facts), 'Its cells hold hours.');
  } else if (lacks('amount', 'credit', 'estimate')) {
    const looksPaid = (facts: ColumnFacts) =>
      holdsMoney(facts) && facts.samples.some((cell) => /[.,]\d\d\b|[$€£]/.test(cell));
    // Beside nothing that a cost is told by, several columns of figures may as well be hours of several people.
    const isTold = !lacks('date', 'category', 'what', 'vendor');
    const figures = all.filter((facts, i) => settled[i]?.meaning === 'ignore' && facts.filled > 0 && holdsMoney(facts));
    const total = all.findIndex(
      (facts, i) =>
        settled[i]?.meaning === 'derived' && holdsMoney(facts) && headingMeanings(facts.heading).includes('amount'),
    );
    if (isTold && total >= 0) settled[total] = { meaning: 'amount', category: null, why: NO_OTHER };
    else if (isTold || figures.length < 2) take('amount', looksPaid, 'Its cells hold amounts.');
  }
  return settled;
}

// No list has a place of its own for notes.
const UNREAD = new Set<Meaning>(['ignore', 'notes']);

/** A list without a column that says what each row was for takes the wordiest one that nothing else explains. */
function described(all: readonly ColumnFacts[], guesses: readonly Guess[], meaning: 'what' | 'task'): Guess[] {
  if (guesses.some((guess) => guess.meaning === meaning)) return [...guesses];
  const [wordiest] = all
    .filter(
      (facts, i) =>
        UNREAD.has(guesses[i]?.meaning ?? 'ignore') && facts.filled > 0 && facts.heading !== '' && holdsText(facts),
    )
    .filter((facts) => !holdsHours(facts))
    .sort((a, b) => b.distinct - a.distinct);
  const why = 'It holds words that no other column explains.';
  return guesses.map((guess, i) => (all[i] === wordiest ? { meaning, category: null, why } : guess));
}
