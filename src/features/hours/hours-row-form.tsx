import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { TASKS } from '#shared/vocabulary.ts';
import { useUnsaved } from '../../lib/unsaved.ts';
import { Button } from '../../ui/button.tsx';
import { FormPick } from '../../ui/form-fields.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { DayField, type Option, SelectField, TextField } from '../../ui/text-field.tsx';
import { EMPTY_HOURS, type HoursForm, hoursFormSchema } from './hours-form.ts';

type Props = {
  start: Partial<HoursForm>;
  /** null = the row is for one rebuild, which is not asked for. */
  rebuilds: readonly PickOption[] | null;
  workers: readonly Option[];
  onSend: (typed: HoursForm) => void;
};

/** One line of hours by the keyboard alone. Day, rebuild and person stay for the next; the cursor goes back to the hours. */
export function HoursRowForm({ start, rebuilds, workers, onSend }: Props) {
  const form = useForm({ defaultValues: { ...EMPTY_HOURS, ...start }, resolver: zodResolver(hoursFormSchema) });
  const { register, control, formState } = form;
  const { errors, dirtyFields } = formState;
  useUnsaved(Boolean(dirtyFields.seconds));
  const onSubmit = form.handleSubmit(() => {
    const values = form.getValues();
    onSend(values);
    // Before the reset, which forgets where the fields are.
    form.setFocus('seconds');
    form.reset({ ...values, seconds: '', task: '' });
  });
  return (
    <form
      onSubmit={(event) => void onSubmit(event)}
      noValidate
      aria-label="Add hours"
      className="entry-row"
      data-fields={rebuilds ? 6 : 5}
    >
      <DayField label="Day" {...register('workedOn')} error={errors.workedOn?.message} />
      {rebuilds && <FormPick control={control} name="rebuildId" label="Rebuild" options={rebuilds} />}
      <SelectField label="Who" {...register('workerId')} options={workers} none="Not said" />
      <TextField
        label="Hours"
        {...register('seconds')}
        error={errors.seconds?.message}
        placeholder="3.5 or 3:30"
        inputMode="decimal"
        autoComplete="off"
      />
      <TextField label="Doing what" {...register('task')} error={errors.task?.message} list="tasks" maxLength={200} />
      <datalist id="tasks">
        {TASKS.map((task) => (
          <option key={task} value={task} />
        ))}
      </datalist>
      <Button kind="main" type="submit" className="entry-add">
        Add
      </Button>
    </form>
  );
}
