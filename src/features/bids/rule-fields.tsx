import { Controller, useWatch } from 'react-hook-form';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { BidFigures } from '#shared/contracts/bids-parts.ts';
import { LEVELS } from '#shared/vocabulary.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { ChipChoice, Segmented } from '../../ui/segmented.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { cushionWords } from './say.ts';
import { type SheetFormApi, useCar } from './use-sheet.ts';
import { levelWords } from './words.ts';

/** How the plan is cushioned, and how often the cushion should hold. */
export function RuleFields({
  form,
  basis,
  figures,
}: {
  form: SheetFormApi;
  basis: BidBasis;
  figures: BidFigures | null;
}) {
  const format = useFormatter();
  const { register, control, formState } = form;
  const kind = useWatch({ control, name: 'ruleKind' });
  const { isSeen } = useCar(form);
  const year = basis.ruleInForce?.year;
  const kinds = [
    ...(year || kind === 'in force' ? [{ value: 'in force' as const, label: `Rule of ${year ?? 'this year'}` }] : []),
    { value: 'two-part' as const, label: 'Percentage and sum' },
    { value: 'percent' as const, label: 'One percentage' },
    { value: 'flat' as const, label: 'My own' },
    { value: 'none' as const, label: 'None' },
  ];
  return (
    <Panel title="Cushion" subtitle="For known work costing more, and for surprises.">
      <div className="grid gap-4">
        <Controller
          control={control}
          name="ruleKind"
          render={({ field }) => (
            <ChipChoice label="Rule" large options={kinds} value={field.value} onChange={field.onChange} />
          )}
        />
        {(kind === 'percent' || kind === 'two-part') && (
          <Controller
            control={control}
            name="level"
            render={({ field }) => (
              <div className="grid justify-items-start gap-1.5">
                <span className="field-label">It should hold</span>
                <Segmented
                  label="It should hold"
                  options={LEVELS.map((value) => ({ value, label: levelWords(value) }))}
                  value={field.value}
                  onChange={field.onChange}
                />
              </div>
            )}
          />
        )}
        {kind === 'flat' && (
          <TextField
            label="Percent on top of the plan"
            inputMode="numeric"
            className="max-w-48"
            {...register('flatPercent')}
            error={formState.errors.flatPercent?.message}
          />
        )}
        {figures && <p className="text-soft">{cushionWords(figures, isSeen, format)}</p>}
      </div>
    </Panel>
  );
}
