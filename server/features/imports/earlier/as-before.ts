import { notData, type RowRead } from '../read/plan.ts';
import type { EarlierRow } from './settle-earlier.ts';

/**
 * How a row ends that came in before: not taken again, or, if a person said so of a changed one, in place of what is
 * booked, or beside it. A purchase or sale changes its rebuild then.
 */
export function asBefore(row: EarlierRow | undefined, read: RowRead): RowRead {
  if (!row || read.outcome === 'not data') return read;
  if (row.decision === 'keep') return notData('already in');
  if (read.outcome !== 'taken') return read;
  const isNew = row.decision === 'new';
  for (const { kind, draft, on } of read.lines) {
    if (kind !== 'purchase' && kind !== 'sale') continue;
    draft?.overwrites.add(kind === 'purchase' ? 'purchaseCents' : 'saleCents');
    if (isNew && on !== null) draft?.overwrites.add(kind === 'purchase' ? 'boughtOn' : 'soldOn');
  }
  return isNew ? { ...read, replaces: row.from.map((from) => ({ ...from, col: null })) } : read;
}
