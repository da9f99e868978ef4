import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import type { z } from 'zod';
import type { Estimate, estimateFieldsSchema } from '#shared/contracts/estimates.ts';
import { parseCents } from '#shared/money.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { type Option, TextAreaField, TextField } from '../../ui/text-field.tsx';
import { estimateForm, estimateFormSchema } from './estimate-form.ts';

type Props = {
  title: string;
  note: string;
  /** What the fields start with: the estimate being changed, or the last one for a revision. null = empty. */
  start: Estimate | null;
  categories: readonly Option[];
  onSave: (body: z.output<typeof estimateFieldsSchema>) => Promise<void>;
  onClose: () => void;
};

/** The plan by category, with hours, the sale expected and the days. */
export function EstimateDialog({ title, note, start, categories, onSave, onClose }: Props) {
  const format = useFormatter();
  const ids = categories.map((category) => category.value);
  const form = useForm({
    defaultValues: estimateForm(start, ids, format.decimal),
    resolver: zodResolver(estimateFormSchema(format.decimal)),
  });
  const { register, control, formState } = form;
  const { errors } = formState;
  const amounts = useWatch({ control, name: 'amounts' });
  const total = Object.values(amounts).reduce((sum, text) => sum + (parseCents(text, format.decimal) ?? 0), 0);
  const onSubmit = form.handleSubmit(async (body) => {
    try {
      await onSave(body);
    } catch (problem) {
      applyProblem(form, problem);
    }
  });
  return (
    <Dialog open onClose={onClose} title={title} note={note} stay>
      <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-4">
        <div className="grid gap-x-4 gap-y-3 sm:grid-cols-2">
          {categories.map((category) => (
            <FormMoney
              key={category.value}
              control={control}
              name={`amounts.${category.value}`}
              label={category.label}
            />
          ))}
        </div>
        <p className="border-t border-ink pt-2 text-right text-lead font-[680] tabular-nums">
          {format.money(total, 'always')} in all
        </p>
        <div className="grid gap-4 sm:grid-cols-3">
          <TextField
            label="Hours"
            inputMode="decimal"
            {...register('plannedSeconds')}
            error={errors.plannedSeconds?.message}
          />
          <FormMoney control={control} name="expectedSaleCents" label="Sale expected" />
          <TextField
            label="Days expected"
            inputMode="numeric"
            {...register('expectedDays')}
            error={errors.expectedDays?.message}
          />
        </div>
        <TextAreaField label="Note" rows={2} {...register('note')} error={errors.note?.message} />
        <ErrorSummary message={errors.root?.['server']?.message} />
        <DialogActions>
          <Button kind="main" type="submit" busy={formState.isSubmitting}>
            Save
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
