import { Controller } from 'react-hook-form';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { optionsOf } from '../../lib/lists.ts';
import { Panel } from '../../ui/panel.tsx';
import { ChipChoice } from '../../ui/segmented.tsx';
import { SelectField, TextField } from '../../ui/text-field.tsx';
import type { SheetFormApi } from './use-sheet.ts';

const SEEN = [
  { value: 'yes', label: 'Yes, in person' },
  { value: 'no', label: 'No, from pictures' },
];

/** Which car, as far as its past tells something: class, damage, seen or not. The rest can wait in its fold. */
export function CarFields({ form, basis }: { form: SheetFormApi; basis: BidBasis }) {
  const { register, control, formState, getValues } = form;
  const { errors } = formState;
  return (
    <Panel title="The car">
      <div className="grid grid-cols-2 gap-4">
        <TextField
          label="What you call it"
          placeholder="Lot number, color, place"
          className="col-span-2"
          {...register('name')}
          error={errors.name?.message}
        />
        <SelectField
          label="Class"
          none="Not said"
          options={optionsOf(basis.classes, getValues('classId'))}
          {...register('classId')}
          error={errors.classId?.message}
        />
        <SelectField
          label="Damage"
          none="Not said"
          options={optionsOf(basis.damages, getValues('damageId'))}
          {...register('damageId')}
          error={errors.damageId?.message}
        />
        <div className="col-span-2">
          <Controller
            control={control}
            name="isSeen"
            render={({ field }) => (
              <ChipChoice
                label="Seen before bidding?"
                large
                options={SEEN}
                value={field.value}
                onChange={field.onChange}
              />
            )}
          />
        </div>
      </div>
      <MoreOfTheCar form={form} basis={basis} />
    </Panel>
  );
}

function MoreOfTheCar({ form, basis }: { form: SheetFormApi; basis: BidBasis }) {
  const { register, formState, getValues } = form;
  const { errors } = formState;
  return (
    <details className="mt-4">
      <summary className="inline-flex min-h-11 items-center text-steel underline underline-offset-3">
        More about the car
      </summary>
      <div className="mt-2 grid grid-cols-2 gap-4">
        <TextField label="Year" inputMode="numeric" {...register('year')} error={errors.year?.message} />
        <TextField label="Make" {...register('make')} error={errors.make?.message} />
        <TextField label="Model" {...register('model')} error={errors.model?.message} />
        <TextField label="Odometer" inputMode="numeric" {...register('odometer')} error={errors.odometer?.message} />
        <TextField label="VIN" className="col-span-2" {...register('vin')} error={errors.vin?.message} />
        <TextField label="Title brand" {...register('titleBrand')} error={errors.titleBrand?.message} />
        <TextField label="Where it is sold" {...register('seller')} error={errors.seller?.message} />
        <SelectField
          label="Second damage"
          none="None"
          options={optionsOf(basis.damages, getValues('secondDamageId'))}
          {...register('secondDamageId')}
          error={errors.secondDamageId?.message}
        />
      </div>
    </details>
  );
}
