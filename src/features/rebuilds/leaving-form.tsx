import { useWatch } from 'react-hook-form';
import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { OTHER_EXITS } from '#shared/vocabulary.ts';
import { Caution } from '../../ui/answer-header.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { DayField, SelectField, TextField } from '../../ui/text-field.tsx';
import { formOf, leavingSchema } from './rebuild-form.ts';
import { SectionForm } from './section-form.tsx';
import type { SaveRebuild } from './use-save-rebuild.tsx';
import { useSectionForm } from './use-section-form.ts';

type Props = { detail: RebuildDetail; canWrite: boolean; save: SaveRebuild };

const EXITS = OTHER_EXITS.map((exit) => ({ value: exit, label: exit.charAt(0).toUpperCase() + exit.slice(1) }));

/** How it leaves the shop: by a sale, or in one other way with what that brought. */
export function LeavingForm({ detail, canWrite, save }: Props) {
  const { decimal } = useFormatter();
  const { form, frame } = useSectionForm(formOf(detail.rebuild, decimal).leaving, leavingSchema(decimal), save);
  const { register, control, formState } = form;
  const { errors } = formState;
  const [soldOn, exitKind] = useWatch({ control, name: ['soldOn', 'exitKind'] });
  const sale = detail.cautions.find((caution) => caution.asked === 'soldOn');
  return (
    <SectionForm {...frame} canWrite={canWrite}>
      <div className="grid grid-cols-2 gap-4">
        <FormMoney control={control} name="askingCents" label="Asking price" />
        <TextField label="Sold through" {...register('buyerChannel')} error={errors.buyerChannel?.message} />
        <DayField label="Sold on" {...register('soldOn')} error={errors.soldOn?.message} />
        <FormMoney control={control} name="saleCents" label="Sale price" />
        <SelectField
          label="Or left otherwise"
          none="No"
          options={EXITS}
          {...register('exitKind')}
          error={errors.exitKind?.message}
        />
        {exitKind !== '' && (
          <>
            <DayField label="Left on" {...register('exitOn')} error={errors.exitOn?.message} />
            <FormMoney control={control} name="exitCents" label="What it brought" hint="0 is a value." />
          </>
        )}
      </div>
      {sale && formState.dirtyFields.soldOn && soldOn && <Caution>{sale.text}</Caution>}
    </SectionForm>
  );
}
