import { namesPart } from './parts.ts';
import { type CategoryMeaning, categoryReader, otherCategory, tradeMeaning } from './categories.ts';

const PARTS = /[,;+&]|\s(?:and|und|y|et)\s/;

/**
 * Reads the kind of cost out of what a row says of itself: a whole text or part of it that is a word of the trade, else
 * the section that it stands under, else a guess from a word in it. `null` texts say nothing.
 */
export function categoryGuesser(shopCategories: readonly string[]) {
  const categoryOf = categoryReader(shopCategories);
  const other = otherCategory(shopCategories);
  const parts = categoryOf('parts') ?? { category: other };
  return (texts: readonly (string | null)[], section: string | null): CategoryMeaning => {
    const known = texts.filter((text) => text !== null);
    const pieces = known.flatMap((text) => [text, ...text.split(PARTS)]);
    const exact = pieces.find((part) => tradeMeaning(part)?.isExact);
    const found = exact === undefined ? null : categoryOf(exact);
    if (found) return found;
    if (section !== null) return { category: section, isSure: true };
    const guess = known.map(categoryOf).find((one) => one !== null);
    if (guess) return { category: guess.category, isSure: false };
    return { category: known.some(namesPart) ? parts.category : other, isSure: false };
  };
}
