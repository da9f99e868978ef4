import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { type Control, useFieldArray, useForm, useWatch } from 'react-hook-form';
import type { z } from 'zod';
import type { newSplitSchema } from '#shared/contracts/ledger.ts';
import { parseCents, splitCents } from '#shared/money.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { FormMoney, FormPick } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import type { PickOption } from '../../ui/pick-field.tsx';
import { CheckField, DayField, TextField } from '../../ui/text-field.tsx';
import { notify } from '../../ui/toast.tsx';
import { useSplitBill } from './mutations.ts';
import { type ShareForm, type SplitForm, splitFormSchema } from './split-form.ts';

const NO_SHARE: ShareForm = { rebuildId: '', weight: '1' };

type SplitControl = Control<SplitForm, unknown, z.output<typeof newSplitSchema>>;

type Props = { today: string; rebuilds: readonly PickOption[]; categories: readonly PickOption[]; onClose: () => void };

/** One bill over several rebuilds: a donor car, a drum of paint. Shows each share as it will be. */
export function SplitDialog({ today, rebuilds, categories, onClose }: Props) {
  const { decimal } = useFormatter();
  const [key] = useState(newIdempotencyKey);
  const form = useForm({
    resolver: zodResolver(splitFormSchema(decimal)),
    defaultValues: {
      datedOn: today,
      categoryId: '',
      cents: '',
      vendor: '',
      what: '',
      isSurprise: false,
      shares: [NO_SHARE, NO_SHARE],
    },
  });
  const { register, control, formState } = form;
  const { errors } = formState;
  const shares = useFieldArray({ control, name: 'shares' });
  const split = useSplitBill();

  const onSubmit = form.handleSubmit(async (body) => {
    try {
      const entries = await split.mutateAsync({ body, idempotencyKey: key });
      notify(`Bill split into ${entries.length} shares`);
      onClose();
    } catch (problem) {
      applyProblem(form, problem);
    }
  });

  return (
    <Dialog
      open
      onClose={onClose}
      title="Split one bill"
      note="Each share is an entry; together they are the bill to the cent."
    >
      <form onSubmit={(event) => void onSubmit(event)} noValidate className="grid gap-4">
        <div className="grid gap-4 sm:grid-cols-2">
          <DayField label="Day" {...register('datedOn')} error={errors.datedOn?.message} />
          <FormPick control={control} name="categoryId" label="Category" options={categories} />
          <FormMoney control={control} name="cents" label="Whole bill" />
          <TextField label="Vendor" {...register('vendor')} error={errors.vendor?.message} />
          <TextField label="What" {...register('what')} error={errors.what?.message} />
          <CheckField label="A surprise" {...register('isSurprise')} className="self-end pb-2" />
        </div>
        <fieldset className="grid gap-2">
          <legend className="field-label mb-1">Over which, by which weight</legend>
          {shares.fields.map((share, at) => (
            <div key={share.id} className="grid grid-cols-[1fr_5rem_6rem] items-start gap-3">
              <FormPick
                control={control}
                name={`shares.${at}.rebuildId`}
                label={`Rebuild ${at + 1}`}
                hideLabel
                options={rebuilds}
                placeholder="Overhead"
              />
              <TextField
                label={`Weight ${at + 1}`}
                hideLabel
                inputMode="numeric"
                {...register(`shares.${at}.weight`)}
                error={errors.shares?.[at]?.weight?.message}
              />
              <ShareCents control={control} at={at} />
            </div>
          ))}
          {errors.shares?.root?.message && <p className="field-error">{errors.shares.root.message}</p>}
          {errors.shares?.message && <p className="field-error">{errors.shares.message}</p>}
          <div className="flex gap-3">
            <Button size="small" onClick={() => shares.append(NO_SHARE)}>
              One more
            </Button>
            {shares.fields.length > 2 && (
              <Button size="small" kind="plain" onClick={() => shares.remove(shares.fields.length - 1)}>
                One less
              </Button>
            )}
          </div>
        </fieldset>
        <ErrorSummary message={errors.root?.['server']?.message} />
        <DialogActions>
          <Button kind="main" type="submit" busy={formState.isSubmitting}>
            Save the bill
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

/** What a share comes to, by the same rule as on the server. */
function ShareCents({ control, at }: { control: SplitControl; at: number }) {
  const format = useFormatter();
  const [cents, shares] = useWatch({ control, name: ['cents', 'shares'] });
  const total = parseCents(cents, format.decimal);
  const weights = shares.map((share) => (/^\d{1,6}$/.test(share.weight) ? Number(share.weight) : 0));
  if (total === null || weights.length === 0) return <span />;
  return (
    <span className="pt-2 text-right tabular-nums">{format.money(splitCents(total, weights)[at] ?? 0, 'always')}</span>
  );
}
