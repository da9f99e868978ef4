import type { Choice, Column } from '#shared/contracts/import-reading.ts';
import type { Shape } from '#shared/contracts/import-words.ts';
import { looksLikeMoney } from '../cells/money.ts';
import type { ShopBooks } from '../books.ts';
import { otherCategory } from '../words/categories.ts';
import { headingMeanings, headingWords, plannedPart } from '../words/headings.ts';
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
  if (shape === 'hours') return { columns: [...columns], choices: [] };
  const hasSum =
    shape === 'vehicles' &&
    columns.some((column) => column.meaning === 'derived' && column.why.includes('sum of the costs'));
  const choices: Choice[] = [];
  const settled = columns.map((column) => {
    if (hasSum || !isUnexplained(column, shape)) return column;
    const id = placedId('columns', column.sheet, column.col);
    const answer = answers.get(id) ?? null;
    choices.push(choiceOf(column, shape, id, answer));
    if (answer !== 'cost') return column;
    return shape === 'vehicles'
      ? { ...column, meaning: 'cost' as const, category: otherCategory(books.categories), why: 'You said so.' }
      : { ...column, meaning: 'amount' as const, category: null, why: 'You said so.' };
  });
  return { columns: settled, choices };
}

function isUnexplained(column: Column, shape: Shape): boolean {
  if (column.meaning !== 'ignore' || column.why === 'You said so.' || column.samples.length === 0) return false;
  if (plannedPart(column.heading) !== null || !column.samples.every((cell) => looksLikeMoney(cell))) return false;
  const looksPaid = column.samples.some((cell) => /[.,]\d\d\b|[$€£]/.test(cell));
  const isDate = headingMeanings(column.heading).some((meaning) => meaning.endsWith('On'));
  return (
    looksPaid &&
    !isDate &&
    headingWords(column.heading) !== '' &&
    (shape === 'vehicles' || headingMeanings(column.heading).includes('amount'))
  );
}

function choiceOf(column: Column, shape: Shape, id: string, answer: string | null): Choice {
  return {
    id,
    kind: shape === 'vehicles' ? 'columns' : 'amount-column',
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
