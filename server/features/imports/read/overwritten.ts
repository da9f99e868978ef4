import type { Draft } from './draft.ts';
import type { DraftLine } from './plan.ts';

const FEWEST = 3;

interface Sums {
  planned: number;
  actual: number;
}

/**
 * Finds the rebuilds whose plan was written over with what came of it: it equals the costs to the cent in every category
 * planned, three at least. Such a plan says nothing of overrun.
 */
export function overwrittenFinder() {
  const of = new Map<Draft, Map<string, Sums>>();
  return {
    add({ draft, kind, category, cents }: DraftLine): void {
      if (draft === null || category === null || (kind !== 'entry' && kind !== 'estimate')) return;
      const sums = of.get(draft) ?? new Map<string, Sums>();
      of.set(draft, sums);
      const sum = sums.get(category) ?? { planned: 0, actual: 0 };
      sums.set(category, sum);
      if (kind === 'estimate') sum.planned += cents;
      else sum.actual += cents;
    },
    /** Marks them, when all rows are through. */
    mark(): void {
      for (const [draft, sums] of of) {
        const planned = [...sums.values()].filter((sum) => sum.planned > 0);
        draft.found.isOverwritten = planned.length >= FEWEST && planned.every((sum) => sum.planned === sum.actual);
      }
    },
  };
}

/** What to say of them; null = there are none. */
export function overwrittenRemark(drafts: readonly Draft[]): string | null {
  const tags = drafts.filter(({ found }) => found.isOverwritten).map(({ found }) => `“${found.tag}”`);
  if (tags.length === 0) return null;
  const named = tags.length > 3 ? `${tags.slice(0, 3).join(', ')} and ${tags.length - 3} more` : tags.join(', ');
  return `The plan equals what it came to, to the cent and in every category: ${named}. It was written over, so it says nothing of overrun.`;
}
