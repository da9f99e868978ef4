import type { FeeTableFields } from '#shared/contracts/bids-parts.ts';
import { parseCents } from '#shared/money.ts';

/** A step of the fee table as typed. */
export type StepText = { from: string; fee: string };

type Fees = { feeSteps: [number, number][] } & Pick<FeeTableFields, 'feeFlatCents' | 'bidStepCents'>;

/** Typed fees as a table, and complaints by step; `fees` null = something cannot be read. A step left empty is none. */
export function feesOf(
  { steps, flat, step }: { steps: readonly StepText[]; flat: string; step: string },
  decimal: '.' | ',',
): { fees: Fees | null; errors: Partial<StepText>[] } {
  const read = steps.map(({ from, fee }) => ({
    isEmpty: from.trim() === '' && fee.trim() === '',
    from: amount(from, decimal),
    fee: amount(fee, decimal),
  }));
  const errors = read.map(({ isEmpty, from, fee }, at): Partial<StepText> => {
    if (isEmpty) return {};
    const before = read.slice(0, at).findLast((one) => one.from !== null)?.from ?? -1;
    return {
      ...(from === null ? { from: 'Not an amount.' } : from <= before ? { from: 'Above the step before.' } : {}),
      ...(fee === null ? { fee: 'Not an amount.' } : {}),
    };
  });
  const feeFlatCents = flat.trim() === '' ? 0 : amount(flat, decimal);
  const bidStepCents = amount(step, decimal);
  const isWrong = errors.some(({ from, fee }) => from !== undefined || fee !== undefined);
  if (isWrong || feeFlatCents === null || !bidStepCents) return { fees: null, errors };
  const feeSteps = read
    .filter(({ isEmpty }) => !isEmpty)
    .map(({ from, fee }): [number, number] => [from ?? 0, fee ?? 0]);
  return { fees: { feeSteps, feeFlatCents, bidStepCents }, errors };
}

/** Cents of at least 0; null = not readable. */
function amount(text: string, decimal: '.' | ','): number | null {
  const cents = parseCents(text, decimal);
  return cents !== null && cents >= 0 ? cents : null;
}
