import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { sellingFor } from '#shared/measures/like-cars.ts';
import { useWatch } from 'react-hook-form';
import { parseHours } from '../../lib/hours-text.ts';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { type SheetFormApi, useCar } from './use-sheet.ts';
import { biasWords } from './words.ts';

/** Own hours and what an hour should bring, paid help, and the days that the money is out. */
export function WorkFields({ form, basis }: { form: SheetFormApi; basis: BidBasis }) {
  const format = useFormatter();
  const { register, control, formState } = form;
  const { errors } = formState;
  const [own, days] = useWatch({ control, name: ['ownSeconds', 'days'] });
  const held = sellingFor(basis.selling, useCar(form).classId)?.held.median ?? null;
  const { n, plannedSeconds, actualSeconds } = basis.hoursBias;
  const bias = biasWords({ n, plan: plannedSeconds, actual: actualSeconds }, format, {
    planned: parseHours(own),
    write: (seconds) => `${format.hours(Math.round(seconds / 3600) * 3600)}\u00a0h`,
  });
  const onUse = () => form.setValue('days', String(Math.round(held ?? 0)), { shouldDirty: true, shouldValidate: true });
  return (
    <Panel title="Hours and days">
      <div className="grid grid-cols-2 gap-4">
        <TextField
          label="Own hours"
          inputMode="decimal"
          hint={bias}
          {...register('ownSeconds')}
          error={errors.ownSeconds?.message}
        />
        <FormMoney control={control} name="wantedCentsPerHour" label="Wanted pay per hour" />
        <TextField
          label="Hours of paid help"
          inputMode="decimal"
          {...register('paidSeconds')}
          error={errors.paidSeconds?.message}
        />
        <FormMoney control={control} name="paidLaborCents" label="Paid help costs" />
        <TextField
          label="Days, bought to sold"
          inputMode="numeric"
          {...register('days')}
          error={errors.days?.message}
          hint={
            held !== null && (
              <>
                Half are sold within {format.days(held)}.{' '}
                {days !== String(Math.round(held)) && (
                  <button type="button" className="row-act" onClick={onUse}>
                    Use it
                  </button>
                )}
              </>
            )
          }
        />
        <FormMoney control={control} name="holdingCentsPerDay" label="Holding, a day" />
      </div>
    </Panel>
  );
}
