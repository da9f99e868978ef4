import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { Button } from '../../ui/button.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { type Option, SelectField, TextField } from '../../ui/text-field.tsx';
import { factsSchema, formOf, SEEN_OPTIONS } from './rebuild-form.ts';
import { SectionForm } from './section-form.tsx';
import type { SaveRebuild } from './use-save-rebuild.tsx';
import { useSectionForm } from './use-section-form.ts';

type Props = {
  detail: RebuildDetail;
  classes: readonly Option[];
  damages: readonly Option[];
  canWrite: boolean;
  save: SaveRebuild;
};

/** What the vehicle is, what hit it, where it came from. */
export function FactsForm({ detail, classes, damages, canWrite, save }: Props) {
  const { decimal } = useFormatter();
  const { form, frame } = useSectionForm(formOf(detail.rebuild, decimal).facts, factsSchema(decimal), save);
  const { register, control, formState } = form;
  const { errors } = formState;
  const onTake = (vin: string) => form.setValue('vin', vin, { shouldDirty: true });
  return (
    <SectionForm {...frame} canWrite={canWrite}>
      <div className="grid grid-cols-2 gap-4 lg:grid-cols-4">
        <TextField label="Tag" {...register('tag')} error={errors.tag?.message} />
        <TextField label="Year" inputMode="numeric" {...register('year')} error={errors.year?.message} />
        <TextField label="Make" {...register('make')} error={errors.make?.message} />
        <TextField label="Model" {...register('model')} error={errors.model?.message} />
        <TextField label="Trim" {...register('trim')} error={errors.trim?.message} />
        <TextField label="Odometer" inputMode="numeric" {...register('odometer')} error={errors.odometer?.message} />
        <div className="col-span-2 grid gap-2">
          <TextField
            label="VIN"
            {...register('vin')}
            error={errors.vin?.message}
            hint={vinWords(detail.vinCheck)}
            autoCapitalize="characters"
          />
          {canWrite &&
            detail.vinCheck?.suggestions.map((vin) => (
              <Button key={vin} size="small" className="justify-self-start" onClick={() => onTake(vin)}>
                Take {vin}
              </Button>
            ))}
        </div>
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
        <SelectField
          label="Second damage"
          none="None"
          options={damages}
          {...register('secondDamageId')}
          error={errors.secondDamageId?.message}
        />
        <SelectField label="Seen before buying" none="Not said" options={SEEN_OPTIONS} {...register('isSeen')} />
        <TextField label="Bought from" {...register('boughtFrom')} error={errors.boughtFrom?.message} />
        <FormMoney control={control} name="purchaseCents" label="Purchase" />
        <TextField
          label="Title brand when bought"
          {...register('titleBrandBought')}
          error={errors.titleBrandBought?.message}
        />
        <TextField
          label="Title brand when sold"
          {...register('titleBrandSold')}
          error={errors.titleBrandSold?.message}
        />
      </div>
    </SectionForm>
  );
}

function vinWords(check: RebuildDetail['vinCheck']): string | undefined {
  if (check === null) return undefined;
  if (check.isValid) return 'Its check digit fits.';
  if (check.problem === 'length') return 'Not 17 characters: older or foreign, or a slip? It is kept as typed.';
  if (check.problem === 'character') return 'No VIN holds the letters I, O or Q. It is kept as typed.';
  return 'Its check digit does not fit: a slip, or a foreign vehicle? It is kept as typed.';
}
