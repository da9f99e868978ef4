import { useWatch } from 'react-hook-form';
import type { BidBasis, Start } from '#shared/contracts/bids-basis.ts';
import type { Formatter } from '#shared/formatter.ts';
import { startFor } from '#shared/measures/like-cars.ts';
import { parseCents } from '#shared/money.ts';
import { capital } from '../../lib/capital.ts';
import { hoursToText } from '../../lib/hours-text.ts';
import { centsToText } from '../../lib/money-text.ts';
import { Button } from '../../ui/button.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { biasWords, kindWords } from './words.ts';
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
          <Button size="small" className="touch" onClick={() => fillFrom(start, form, format)}>
            Start from {format.count(start.n, 'rebuild')}
          </Button>
        )
      }
    >
      {start && start.n > 0 && (
        <p className="mb-3 text-label text-soft">
          Starting from {kindWords(start, basis, format)}: half planned more, half less. It fills in hours too.
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

/** Puts the middle plan of such cars into the fields, in tens; what is typed already stays. */
function fillFrom(start: Start, form: SheetFormApi, format: Formatter): void {
  const change = { shouldDirty: true } as const;
  for (const { categoryId, planCents } of start.lines) {
    const name = `amounts.${categoryId}` as const;
    const tens = Math.round(planCents / 1000) * 1000;
    if (!form.getValues(name) && tens > 0)
      form.setValue(name, centsToText(tens, format.decimal).replace(/[.,]00$/, ''), change);
  }
  const { ownSeconds, actualSeconds } = start.hours;
  const whole = (seconds: number) => hoursToText(Math.round(seconds / 3600) * 3600);
  if (ownSeconds !== null && !form.getValues('ownSeconds')) form.setValue('ownSeconds', whole(ownSeconds), change);
  const paid = actualSeconds !== null && ownSeconds !== null ? actualSeconds - ownSeconds : 0;
  if (paid >= 3600 && !form.getValues('paidSeconds')) form.setValue('paidSeconds', whole(paid), change);
}
