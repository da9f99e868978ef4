import type { Choice, Column } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import { looksLikeDay } from '../cells/days.ts';
import { looksLikeMoney } from '../cells/money.ts';
import type { ShopBooks } from '../books.ts';
import { otherCategory, paidWorkCategory } from '../words/categories.ts';
import { headingMeanings, headingWords, plannedPart } from '../words/headings.ts';
import { NOT_IT } from './rival-columns.ts';
import { OWN_WORK } from './vehicle-row-columns.ts';
import { placedId } from './placed-id.ts';

/**
 * Asks about columns of figures that no heading explains: are they costs? When the sheet has a column that adds up
 * its costs without them, they are none, and nothing needs asking.
 */
export function askOfColumns(
  columns: readonly Column[],
  shape: Shape,
  answers: ReadonlyMap<string, string>,
  books: ShopBooks,
): { columns: Column[]; choices: Choice[] } {
  if (shape !== 'vehicles') return { columns: [...columns], choices: [] };
  const hasSum = columns.some((column) => column.meaning === 'derived' && column.why.includes('sum of the costs'));
  const choices: Choice[] = [];
  const hasHours = columns.some(({ meaning }) => meaning === 'hours');
  const settled = columns.map((column) => {
    if (column.why === OWN_WORK && column.samples.length > 0 && !hasHours) {
      const choice = ownLaborChoice(column, answers);
      choices.push(choice);
      if (choice.answer !== 'paid work') return column;
      const { category } = paidWorkCategory(books.categories);
      return { ...column, meaning: 'cost' as const, category, why: 'You said so.' };
    }
    if (hasSum || !isUnexplained(column)) return column;
    const id = placedId('columns', column.sheet, column.col);
    const answer = answers.get(id) ?? null;
    choices.push(choiceOf(column, id, answer));
    if (answer !== 'cost') return column;
    return { ...column, meaning: 'cost' as const, category: otherCategory(books.categories), why: 'You said so.' };
  });
  return { columns: settled, choices };
}

function isUnexplained(column: Column): boolean {
  if (
    column.meaning !== 'ignore' ||
    column.why === OWN_WORK ||
    column.why === NOT_IT ||
    column.why === 'You said so.' ||
    column.samples.length === 0
  )
    return false;
  if (
    plannedPart(column.heading) !== null ||
    !column.samples.every((cell) => looksLikeMoney(cell) && !looksLikeDay(cell))
  )
    return false;
  const looksPaid = column.samples.some((cell) => /[.,]\d\d\b|[$€£]/.test(cell)) || areRound(column.samples);
  const isOther = headingMeanings(column.heading).some((meaning) => meaning.endsWith('On') || meaning === 'asking');
  return looksPaid && !isOther && headingWords(column.heading) !== '';
}

const FEWEST_ROUND = 2;

/** Whole sums of money are mostly round; lot numbers, keys and the like are not all so. */
const areRound = (samples: readonly string[]) =>
  samples.length >= FEWEST_ROUND && samples.every((cell) => /^[1-9][\d.,]*[05]$/.test(cell.trim()));

function ownLaborChoice(column: Column, answers: ReadonlyMap<string, string>): Choice {
  const id = placedId('own-labor', column.sheet, column.col);
  return {
    id,
    kind: 'own-labor',
    column: column.heading,
    question: `Column “${column.heading}” holds money for labor and no hours. Was it your own time?`,
    options: [
      { value: 'leave out', label: 'yes: leave it out, own time is no money' },
      { value: 'paid work', label: 'no: it was paid to somebody' },
    ],
    preset: 'leave out',
    answer: answers.get(id) ?? null,
    mustAsk: true,
    why: 'Own time counts in hours and never as a cost; work that somebody was paid for is a cost.',
  };
}

function choiceOf(column: Column, id: string, answer: string | null): Choice {
  return {
    id,
    kind: 'columns',
    column: column.heading,
    question: `Does column “${column.heading}” hold costs of its own?`,
    options: [
      { value: 'cost', label: 'yes: count them' },
      { value: 'ignore', label: 'no: leave them out' },
    ],
    preset: 'ignore',
    answer,
    mustAsk: true,
    why: 'It holds amounts, and nothing in the file tells what they are.',
  };
}
