import type { BidRow, BidState } from '#shared/contracts/bids.ts';
import type { Formatter } from '#shared/formatter.ts';

type Shown = {
  rows: readonly BidRow[];
  /** Of all sheets in this state; null = not known yet. */
  total: number | null;
  state: BidState | null;
  /** Do all of them stand in `rows`? */
  isComplete: boolean;
};

/** What became of the sheets, in one sentence. */
export function sayBids({ rows, total, state, isComplete }: Shown, format: Formatter): string {
  if (total === null) return 'Your kept sheets.';
  if (total === 0) return state === null ? 'No sheet is kept yet.' : `No sheet is ${state}.`;
  const sheets = format.count(total, 'sheet');
  if (state !== null) return `${sheets} ${total === 1 ? 'is' : 'are'} ${state}.`;
  if (!isComplete) return `${sheets} are kept.`;
  const count = (of: BidState) => format.number(rows.filter((row) => row.state === of).length);
  return `Of ${sheets} you bought ${count('bought')} and let ${count('not bought')} go; ${count('open')} open.`;
}
