import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import type { newHoursSchema } from '#shared/contracts/hours.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { FormPick } from '../../ui/form-fields.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { DayField, type Option, SelectField, TextField } from '../../ui/text-field.tsx';
import { type HoursForm, hoursFormSchema } from './hours-form.ts';

type Props = {
  title: string;
  start: HoursForm;
  rebuilds: readonly PickOption[];
  workers: readonly Option[];
  onSave: (body: z.output<typeof newHoursSchema>) => Promise<void>;
  onClose: () => void;
};

const PAID = [
  { value: 'no', label: 'Own hours, unpaid' },
  { value: 'yes', label: 'Paid: the wage is in the costs' },
];

/** Every field of one row of hours. */
export function HoursDialog({ title, start, rebuilds, workers, onSave, onClose }: Props) {
  const form = useForm({ defaultValues: start, resolver: zodResolver(hoursFormSchema) });
  const { register, control, formState } = form;
  const { errors } = formState;
  const onSubmit = form.handleSubmit(async (body) => {
    try {
      await onSave(body);
    } catch (problem) {
      applyProblem(form, problem);
    }
  });
  return (
    <Dialog open onClose={onClose} title={title}>
      <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-2">
          <FormPick control={control} name="rebuildId" label="Rebuild" options={rebuilds} />
          <SelectField
            label="Who"
            {...register('workerId')}
            options={workers}
            none="Not said"
            error={errors.workerId?.message}
          />
          <DayField label="Day" {...register('workedOn')} error={errors.workedOn?.message} />
          <TextField label="Hours" {...register('seconds')} error={errors.seconds?.message} inputMode="decimal" />
          <TextField label="Doing what" {...register('task')} error={errors.task?.message} />
          <SelectField
            label="Paid"
            {...register('isPaid')}
            options={PAID}
            none="As this person is"
            error={errors.isPaid?.message}
          />
        </div>
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
