import { namesPart } from './parts.ts';
import { type CategoryMeaning, categoryReader, otherCategory, PURCHASE, SALE, tradeMeaning } from './categories.ts';
import { fold } from '../cells/fold.ts';

const PARTS = /[,;+&]|\s(?:and|und|y|et)\s/;
// The vehicle itself changes hands only where a text begins so: `bought new tires` and `for sale sign` are other things.
const BUYS =
  /^(?:(?:winning |high |hammer )?bid|hammer(?: price)?|(?:purchase|buy) price|kaufpreis|zuschlag|einkaufspreis|precio(?: de)? compra|prix d achat)\b|^(?:bought|buy|purchased?|private purchase|paid for|kauf|ankauf|compra(?:do)?|achat|achete)(?:$| (?:\d|.*\b(?:car|vehicle|truck|van|lot|auction|sale|private|dealer|owner|fahrzeug|auto|auktion|privat|coche|vehiculo|subasta|lote|voiture|vehicule|encheres?|particulier)\b))/;
const SELLS =
  /^(?:sold|verkauft?|vendid[oa]|vendue?|venta|vente|sale (?:of|to|price|proceeds)|proceeds|vehicle sale|car sale)\b/;

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
    const guess = known
      .map((text) => ({ text, meaning: categoryOf(text) }))
      .find(({ text, meaning }) => meaning !== null && isMeant(text, meaning.category))?.meaning;
    if (guess) return { category: guess.category, isSure: false };
    return { category: known.some(namesPart) ? parts.category : other, isSure: false };
  };
}

function isMeant(text: string, category: string): boolean {
  if (category === PURCHASE) return BUYS.test(fold(text)) && !namesPart(text);
  return category !== SALE || SELLS.test(fold(text));
}
