import { zodResolver } from '@hookform/resolvers/zod';
import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { ledgerApi, receiptSchema } from '#shared/contracts/ledger.ts';
import { call, newIdempotencyKey } from '../../lib/api.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { into, optionalText } from '../../lib/form-text.ts';
import { centsTextSchema } from '../../lib/money-text.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { CheckField, type Option, SelectField, TextField } from '../../ui/text-field.tsx';
import { notify } from '../../ui/toast.tsx';

type Props = { rebuildId: string; subject: string; categories: readonly Option[]; onClose: () => void };

const schemaOf = (rebuildId: string, decimal: '.' | ',') =>
  z
    .object({
      categoryId: z.string().min(1, { error: 'Choose a category.' }),
      cents: centsTextSchema(decimal),
      vendor: optionalText,
      what: z.string(),
      isSurprise: z.boolean(),
    })
    .transform((fields) => ({ ...fields, rebuildId }))
    .transform(into(receiptSchema));

/** A surprise or a receipt, from the one who found or bought it. The amount goes in and is not shown again. */
export function NoteReceipt({ rebuildId, subject, categories, onClose }: Props) {
  const { decimal } = useFormatter();
  const [key] = useState(newIdempotencyKey);
  const form = useForm({
    resolver: zodResolver(schemaOf(rebuildId, decimal)),
    defaultValues: { categoryId: '', cents: '', vendor: '', what: '', isSurprise: true },
  });
  const { register, control, formState } = form;
  const { errors } = formState;
  const note = useMutation({
    mutationFn: (body: z.output<typeof receiptSchema>) => call(ledgerApi.noteReceipt, { body, idempotencyKey: key }),
  });
  const onSubmit = form.handleSubmit(async (body) => {
    try {
      await note.mutateAsync(body);
      notify('Noted', { detail: body.what });
      onClose();
    } catch (problem) {
      applyProblem(form, problem);
    }
  });
  return (
    <Dialog open onClose={onClose} title={`Note a surprise or receipt on ${subject}`}>
      <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-4">
        <TextField label="What" {...register('what')} error={errors.what?.message} />
        <SelectField
          label="Category"
          none="Choose"
          {...register('categoryId')}
          options={categories}
          error={errors.categoryId?.message}
        />
        <FormMoney control={control} name="cents" label="Amount on the receipt" hint="0 if it cost nothing yet." />
        <TextField label="Where bought" {...register('vendor')} error={errors.vendor?.message} />
        <CheckField label="Nobody had planned for this" {...register('isSurprise')} />
        <ErrorSummary message={errors.root?.['server']?.message} />
        <DialogActions>
          <Button kind="main" size="large" type="submit" busy={formState.isSubmitting}>
            Note it
          </Button>
          <Button size="large" onClick={onClose}>
            Cancel
          </Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
