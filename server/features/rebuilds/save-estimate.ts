import type { Estimate, EstimateFields } from '#shared/contracts/estimates.ts';
import type { Books } from '../../books/books.ts';
import { refuseStrangers } from '../../books/references.ts';
import { ProblemError } from '../../platform/problems.ts';

/** An estimate of this rebuild; one of another rebuild is as absent as an unknown one. */
export async function estimateOf(books: Books, rebuildId: string, estimateId: string): Promise<Estimate> {
  const estimate = await books.estimates.get(estimateId);
  if (estimate.rebuildId !== rebuildId) {
    throw new ProblemError(404, { detail: 'There is no such thing in this shop.' });
  }
  return estimate;
}

/** 422 on each line whose category is not one of this shop's. */
export async function refuseUnknownLines(books: Books, lines: EstimateFields['lines'] | undefined): Promise<void> {
  const references = (lines ?? []).map(({ categoryId: id }, i) => ({
    pointer: `/lines/${i}/categoryId`,
    table: 'categories' as const,
    id,
  }));
  await refuseStrangers(books.scope, references);
}
