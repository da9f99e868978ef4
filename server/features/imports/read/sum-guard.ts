import type { Control } from '#shared/contracts/import-reading.ts';
import { FileRefusal } from '../refusal.ts';
import type { Draft } from './draft.ts';
import type { DraftLine } from './plan.ts';

/** What one figure of the books may be, in cents. */
const MOST = 1_000_000_000_000;
/** What all figures of a file may add up to, in cents: far from where whole numbers end to be exact. */
const MOST_IN_ALL = 1_000_000_000_000_000;

/** Refuses a file at the row that makes its sums, or one rebuild's purchase, sale or plan, more than the books can hold. */
export function sumGuard() {
  const plans = new Map<Draft, Map<string, number>>();

  function planned({ draft, category, cents }: DraftLine): number {
    if (!draft) return 0;
    const plan = plans.get(draft) ?? new Map<string, number>();
    plans.set(draft, plan);
    const sum = (plan.get(category ?? '') ?? 0) + cents;
    plan.set(category ?? '', sum);
    return sum;
  }

  return (line: DraftLine, control: Control, sheet: number): void => {
    const { kind, draft, category, row } = line;
    const { costCents, creditCents, saleCents, estimateCents, centsByCategory } = control;
    const all = [costCents, creditCents, saleCents, estimateCents, centsByCategory[category ?? ''] ?? 0];
    const own = kind === 'estimate' ? planned(line) : kind === 'purchase' ? (draft?.found.purchaseCents ?? 0) : 0;
    const sale = kind === 'sale' ? (draft?.found.saleCents ?? 0) : 0;
    const isTooMuch =
      all.some((cents) => Math.abs(cents) > MOST_IN_ALL) || Math.abs(own) > MOST || Math.abs(sale) > MOST;
    if (!isTooMuch) return;
    const place = sheet === 1 ? `Row ${row}` : `Row ${row} of sheet ${sheet}`;
    throw new FileRefusal(
      'too-large',
      `${place} brings a sum to more than the books can hold. Put its amount right in the file, and bring it in again.`,
      row,
    );
  };
}
