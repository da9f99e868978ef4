import { useWatch } from 'react-hook-form';
import type { BidBasis, Start } from '#shared/contracts/bids-basis.ts';
import type { Formatter } from '#shared/formatter.ts';
import { startFor } from '#shared/measures/like-cars.ts';
import { parseCents } from '#shared/money.ts';
import { capital } from '../../lib/capital.ts';
import { hoursToText } from '../../lib/hours-text.ts';
import { Button } from '../../ui/button.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { biasWords, kindWords } from './words.ts';
import { plainMoney } from './sheet-form.ts';
import { type SheetFormApi, useCar } from './use-sheet.ts';

/** Planned repair by category, started from what such cars were planned at, with the shop's own bias beside each. */
export function PlanFields({ form, basis }: { form: SheetFormApi; basis: BidBasis }) {
  const format = useFormatter();
  const amounts = useWatch({ control: form.control, name: 'amounts' });
  const start = startFor(basis.starts, useCar(form));
  const planned = basis.categories.filter(({ id, place, isRetired }) => amounts[id] || (place === null && !isRetired));
  const total = Object.values(amounts).reduce((sum, text) => sum + (parseCents(text, format.decimal) ?? 0), 0);
  return (
    <Panel
      title="Planned repair"
      subtitle="As you would plan it, without cushion: that is put on top by the rule below."
      actions={
        start &&
        start.n > 0 && (
          <Button size="small" className="touch" onClick={() => fillFrom(start, basis, form, format)}>
            Start from {format.count(start.n, 'rebuild')}
          </Button>
        )
      }
    >
      {start && start.n > 0 && (
        <p className="mb-3 text-label text-soft">
          Starting from {kindWords(start, basis, format)}: half planned more, half less. Hours and the costs below are
          filled in too, from what they came to.
        </p>
      )}
      <div className="grid grid-cols-2 gap-x-4 gap-y-3">
        {planned.map(({ id, name }) => (
          <FormMoney
            key={id}
            control={form.control}
            name={`amounts.${id}`}
            label={capital(name)}
            note={biasOf(basis, id, amounts[id] ?? '', format)}
          />
        ))}
      </div>
      <p className="mt-4 flex justify-between border-t border-ink pt-2 text-lead font-[680] tabular-nums">
        <span>Plan in all</span>
        <span>{format.money(total)}</span>
      </p>
    </Panel>
  );
}

function biasOf(basis: BidBasis, categoryId: string, text: string, format: Formatter): string {
  const bias = basis.bias.find((one) => one.categoryId === categoryId);
  if (!bias) return '';
  return biasWords({ n: bias.n, plan: bias.planCents, actual: bias.actualCents }, format, {
    planned: parseCents(text, format.decimal),
    write: (cents) => format.money(Math.round(cents)),
  });
}

/** Fields of the sheet that take a category's cost; they are not cushioned, so they start from what it came to. */
const OWN_FIELD = {
  transport: 'transportCents',
  title: 'titleCents',
  selling: 'sellingCents',
  'paid labor': 'paidLaborCents',
} as const;

/** Puts the middle plan of such cars into the fields, in tens, and their hours; what is typed already stays. */
function fillFrom(start: Start, basis: BidBasis, form: SheetFormApi, format: Formatter): void {
  const change = { shouldDirty: true } as const;
  const tens = (cents: number) => plainMoney(Math.round(cents / 1000) * 1000, format.decimal);
  const own: Partial<Record<(typeof OWN_FIELD)[keyof typeof OWN_FIELD], number>> = {};
  for (const { categoryId, planCents, actualCents } of start.lines) {
    const place = basis.categories.find(({ id }) => id === categoryId)?.place ?? null;
    const name = `amounts.${categoryId}` as const;
    if (place === null) {
      if (!form.getValues(name) && planCents >= 500) form.setValue(name, tens(planCents), change);
    } else if (place in OWN_FIELD) {
      const field = OWN_FIELD[place as keyof typeof OWN_FIELD];
      own[field] = (own[field] ?? 0) + actualCents;
    }
  }
  for (const [field, cents] of Object.entries(own)) {
    const name = field as keyof typeof own;
    if (!form.getValues(name) && cents >= 500) form.setValue(name, tens(cents), change);
  }
  const { ownSeconds, actualSeconds } = start.hours;
  const whole = (seconds: number) => hoursToText(Math.round(seconds / 3600) * 3600);
  if (ownSeconds !== null && !form.getValues('ownSeconds')) form.setValue('ownSeconds', whole(ownSeconds), change);
  const paid = actualSeconds !== null && ownSeconds !== null ? actualSeconds - ownSeconds : 0;
  if (paid >= 3600 && !form.getValues('paidSeconds')) form.setValue('paidSeconds', whole(paid), change);
}
