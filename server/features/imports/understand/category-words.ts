import type { Choice } from '#shared/contracts/import-reading.ts';
import type { ShopBooks } from '../books.ts';
import { fold } from '../cells/fold.ts';
import { isOwnWork } from '../words/own-work.ts';
import {
  type CategoryMeaning,
  categoryReader,
  otherCategory,
  paidWorkCategory,
  PURCHASE,
  SALE,
} from '../words/categories.ts';

const MOST_ASKED = 100;

/**
 * What the category words of a file mean in this shop. A word that nobody knows goes to the shop's "other" as a
 * guess and is offered for choice; a word known only in part keeps its guess and is offered, too.
 */
export function categoryWords(
  counts: ReadonlyMap<string, number>,
  { categories: shopCategories, retiredCategories: retired }: Pick<ShopBooks, 'categories' | 'retiredCategories'>,
  answers: ReadonlyMap<string, string>,
): { of: Map<string, CategoryMeaning>; choices: Choice[] } {
  const read = categoryReader(shopCategories, retired);
  const other = otherCategory(shopCategories);
  const paidWork = paidWorkCategory(shopCategories);
  const allowed = new Set([...shopCategories, PURCHASE, SALE]);
  const of = new Map<string, CategoryMeaning>();
  const choices = new Map<string, Choice>();
  for (const [word, count] of counts) {
    const found = read(word) ?? (isOwnWork(word) ? paidWork : null);
    const id = `category:${fold(word)}`;
    const answer = answers.get(id);
    const preset = found?.category ?? other;
    of.set(
      word,
      answer !== undefined && allowed.has(answer)
        ? { category: answer, isSure: true }
        : { category: preset, isSure: found?.isSure ?? false },
    );
    if (found?.isSure || choices.has(id) || choices.size >= MOST_ASKED) continue;
    choices.set(id, {
      id,
      kind: 'category',
      column: null,
      question:
        word === ''
          ? count === 1
            ? 'One row names no kind of cost. Where does it belong?'
            : `${count} rows name no kind of cost. Where do they belong?`
          : `What does “${word}” mean? It stands on ${count === 1 ? 'one row' : `${count} rows`}.`,
      options: [
        ...shopCategories.map((name) => ({ value: name, label: name })),
        { value: PURCHASE, label: 'the purchase' },
        { value: SALE, label: 'the sale' },
      ],
      preset,
      answer: answer ?? null,
      mustAsk: false,
      why: found ? 'Only part of it is a word we know.' : 'It is none of your categories, nor a word we know.',
    });
  }
  return { of, choices: [...choices.values()] };
}
