import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { newRebuildSchema } from '#shared/contracts/rebuilds.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { into, optionalCount, optionalPick, optionalText } from '../../lib/form-text.ts';
import { optionalCentsTextSchema } from '../../lib/money-text.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { DayField, type Option, SelectField, TextField } from '../../ui/text-field.tsx';
import { SEEN_OPTIONS, seenText } from './rebuild-form.ts';
import { useRebuildWrites } from './mutations.ts';

type Props = {
  classes: readonly Option[];
  damages: readonly Option[];
  onAdded: (id: string) => void;
  onClose: () => void;
};

const schemaOf = (decimal: '.' | ',') =>
  z
    .object({
      tag: z.string(),
      year: optionalCount,
      make: optionalText,
      model: optionalText,
      classId: optionalPick,
      damageId: optionalPick,
      isSeen: seenText,
      boughtOn: optionalText,
      purchaseCents: optionalCentsTextSchema(decimal),
    })
    .transform(into(newRebuildSchema));

const EMPTY = {
  tag: '',
  year: '',
  make: '',
  model: '',
  classId: '',
  damageId: '',
  isSeen: '',
  boughtOn: '',
  purchaseCents: '',
};

/** Adds a rebuild with the little that is known when it is bought; the rest goes on its own page. */
export function AddRebuild({ classes, damages, onAdded, onClose }: Props) {
  const { decimal } = useFormatter();
  const [key] = useState(newIdempotencyKey);
  const { add } = useRebuildWrites();
  const form = useForm({ defaultValues: EMPTY, resolver: zodResolver(schemaOf(decimal)) });
  const { register, control, formState } = form;
  const { errors } = formState;
  const onSubmit = form.handleSubmit(async (body) => {
    try {
      onAdded((await add(body, key)).id);
    } catch (problem) {
      applyProblem(form, problem);
    }
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title="Add a rebuild"
      note="Only the tag is needed. What you leave out stays unknown, never zero."
    >
      <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-2">
          <TextField label="Tag" hint="The shop’s own short name." {...register('tag')} error={errors.tag?.message} />
          <TextField label="Year" inputMode="numeric" {...register('year')} error={errors.year?.message} />
          <TextField label="Make" {...register('make')} error={errors.make?.message} />
          <TextField label="Model" {...register('model')} error={errors.model?.message} />
          <SelectField
            label="Class"
            none="Not said"
            options={classes}
            {...register('classId')}
            error={errors.classId?.message}
          />
          <SelectField
            label="Damage"
            none="Not said"
            options={damages}
            {...register('damageId')}
            error={errors.damageId?.message}
          />
          <DayField label="Bought" {...register('boughtOn')} error={errors.boughtOn?.message} />
          <FormMoney control={control} name="purchaseCents" label="Purchase" />
          <SelectField label="Seen before buying" none="Not said" options={SEEN_OPTIONS} {...register('isSeen')} />
        </div>
        <ErrorSummary message={errors.root?.['server']?.message} />
        <DialogActions>
          <Button kind="main" type="submit" busy={formState.isSubmitting}>
            Add it
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
