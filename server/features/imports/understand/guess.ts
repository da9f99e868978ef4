import type { Column, Meaning } from '#shared/contracts/import-reading.ts';
import type { CategoryMeaning } from '../words/categories.ts';

export type CategoryReader = (text: string) => CategoryMeaning | null;
/** What a column holds, and why. */
export type Guess = Pick<Column, 'meaning' | 'category' | 'why'>;

export const ignored = (why: string): Guess => ({ meaning: 'ignore', category: null, why });
export const bySaying = (meaning: Meaning): Guess => ({
  meaning,
  category: null,
  why: 'The heading says so, and the cells below suit it.',
});
