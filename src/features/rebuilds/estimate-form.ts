import { z } from 'zod';
import { type Estimate, estimateFieldsSchema } from '#shared/contracts/estimates.ts';
import { into, optionalCount, optionalText } from '../../lib/form-text.ts';
import { hoursToText, optionalHoursTextSchema } from '../../lib/hours-text.ts';
import { centsToText, optionalCentsTextSchema } from '../../lib/money-text.ts';

/** Typed text to an estimate: a category left empty has no line. `amounts` is keyed by category. */
export const estimateFormSchema = (decimal: '.' | ',') =>
  z
    .object({
      amounts: z.record(z.string(), optionalCentsTextSchema(decimal)),
      plannedSeconds: optionalHoursTextSchema,
      expectedSaleCents: optionalCentsTextSchema(decimal),
      expectedDays: optionalCount,
      note: optionalText,
    })
    .transform(({ amounts, ...rest }) => ({
      ...rest,
      lines: Object.entries(amounts).flatMap(([categoryId, cents]) => (cents === null ? [] : [{ categoryId, cents }])),
    }))
    .transform(into(estimateFieldsSchema));

/** An estimate as text; null = a new one. Every category offered has a field. */
export function estimateForm(estimate: Estimate | null, categoryIds: readonly string[], decimal: '.' | ',') {
  const cents = new Map(estimate?.lines.map((line) => [line.categoryId, line.cents]));
  const amounts = categoryIds.map((id) => [id, centsToText(cents.get(id) ?? null, decimal)]);
  return {
    amounts: Object.fromEntries(amounts) as Record<string, string>,
    plannedSeconds: hoursToText(estimate?.plannedSeconds ?? null),
    expectedSaleCents: centsToText(estimate?.expectedSaleCents ?? null, decimal),
    expectedDays: estimate?.expectedDays == null ? '' : String(estimate.expectedDays),
    note: estimate?.note ?? '',
  };
}

/** "The plan", or "Revision 2". */
export function estimateName(estimate: Pick<Estimate, 'revision'>): string {
  return estimate.revision === 0 ? 'The plan' : `Revision ${estimate.revision}`;
}

/** Σ of its lines, cents. */
export function estimateTotal(estimate: Pick<Estimate, 'lines'>): number {
  return estimate.lines.reduce((total, line) => total + line.cents, 0);
}
