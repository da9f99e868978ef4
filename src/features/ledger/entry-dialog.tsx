import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import type { z } from 'zod';
import type { newEntrySchema } from '#shared/contracts/ledger.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { FormMoney, FormPick } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { DayField, SelectField, TextField } from '../../ui/text-field.tsx';
import { type EntryForm, entryFormSchema, KIND_NOT_SAID, KIND_OPTIONS } from './entry-form.ts';

type Props = {
  title: string;
  note?: string;
  start: EntryForm;
  rebuilds: readonly PickOption[];
  categories: readonly PickOption[];
  /** A share of a bill keeps its amount. */
  keepsAmount?: boolean;
  /** Asks for the market value of something free, too. */
  isFree?: boolean;
  onSave: (body: z.output<typeof newEntrySchema>) => Promise<void>;
  onClose: () => void;
  children?: React.ReactNode;
};

/** Every field of one entry, to change it or to add one that the row has no room for. */
export function EntryDialog({
  title,
  note,
  start,
  rebuilds,
  categories,
  keepsAmount,
  isFree,
  onSave,
  onClose,
  children,
}: Props) {
  const { decimal } = useFormatter();
  const form = useForm({ defaultValues: start, resolver: zodResolver(entryFormSchema(decimal)) });
  const { register, control, formState } = form;
  const { errors } = formState;
  const [hasFree, setFree] = useState(isFree || start.freeValueCents !== '');

  const onSubmit = form.handleSubmit(async (body) => {
    try {
      await onSave(body);
    } catch (problem) {
      applyProblem(form, problem);
    }
  });

  return (
    <Dialog open onClose={onClose} title={title} note={note}>
      <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-2">
          <FormPick control={control} name="rebuildId" label="Rebuild" options={rebuilds} placeholder="Overhead" />
          <FormPick control={control} name="categoryId" label="Category" options={categories} />
          <DayField label="Day" {...register('datedOn')} error={errors.datedOn?.message} />
          {keepsAmount ? (
            <p className="self-end pb-2 text-soft">A share of a bill: its amount stays.</p>
          ) : (
            <FormMoney control={control} name="cents" label="Amount" hint="A credit is negative." />
          )}
          {hasFree && (
            <FormMoney
              control={control}
              name="freeValueCents"
              label="What it would have cost"
              hint="Counts for planning, not for profit."
            />
          )}
          <SelectField label="Kind" {...register('kind')} options={KIND_OPTIONS} none={KIND_NOT_SAID} />
          <TextField label="What" {...register('what')} error={errors.what?.message} />
          <TextField label="Vendor" {...register('vendor')} error={errors.vendor?.message} />
          <TextField
            label="Receipt"
            {...register('receipt')}
            error={errors.receipt?.message}
            hint="Its number, or where it lies."
          />
        </div>
        {!hasFree && !keepsAmount && (
          <Button kind="plain" size="small" className="justify-self-start" onClick={() => setFree(true)}>
            It came free
          </Button>
        )}
        {children}
        <ErrorSummary
          message={errors.root?.['server']?.message}
          fields={formState.isSubmitted ? Object.keys(errors).filter((name) => name !== 'root').length : 0}
        />
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
