import { useState } from 'react';
import { useWatch } from 'react-hook-form';
import type { BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { bidFee } from '#shared/measures/walk-away-bid.ts';
import { Button } from '../../ui/button.tsx';
import { FormMoney } from '../../ui/form-fields.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { Panel } from '../../ui/panel.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { FeeDialog } from './fee-dialog.tsx';
import type { SheetFormApi } from './use-sheet.ts';

type Props = { form: SheetFormApi; sheet: BidFields | null; basis: BidBasis; mayWrite: boolean };

/** What else a purchase costs, and what should be left. Fees stand in steps, in a dialog of their own. */
export function CostFields({ form, sheet, basis, mayWrite }: Props) {
  const format = useFormatter();
  const [isOpen, setOpen] = useState(false);
  const { register, control, formState } = form;
  const [feeSteps, feeFlatCents, bidStepCents] = useWatch({
    control,
    name: ['feeSteps', 'feeFlatCents', 'bidStepCents'],
  });
  const example = 4000_00;
  const isEmpty = feeSteps.length === 0 && feeFlatCents === 0;
  return (
    <Panel title="What else it costs" subtitle="What stands in the plan is not entered here again. Empty is nothing.">
      <div className="grid grid-cols-2 gap-4">
        <FormMoney control={control} name="transportCents" label="Transport" />
        <FormMoney control={control} name="titleCents" label="Title and inspection" />
        <FormMoney control={control} name="sellingCents" label="Selling" />
        <TextField
          label="Tax on the bid, %"
          inputMode="decimal"
          {...register('taxPercent')}
          error={formState.errors.taxPercent?.message}
        />
        <FormMoney control={control} name="wantedProfitCents" label="Profit wanted besides pay" />
      </div>
      <div className="mt-4 flex flex-wrap items-center justify-between gap-x-4 gap-y-2 border-t border-rule pt-3">
        <p className={isEmpty ? 'font-semibold' : ''}>
          {isEmpty
            ? 'No fees are set: the bid takes none off.'
            : `Fees in ${format.count(feeSteps.length, 'step')}: ${format.money(bidFee(example, { feeSteps, feeFlatCents }))} at a bid of ${format.money(example)}.`}
          <span className="block text-label text-soft">Bids go up by {format.money(bidStepCents)}.</span>
        </p>
        <Button size="small" className="touch" onClick={() => setOpen(true)}>
          Fees and bid step
        </Button>
      </div>
      {isOpen && (
        <FeeDialog
          form={form}
          sheet={sheet}
          version={basis.feeTable.version}
          mayWrite={mayWrite}
          onClose={() => setOpen(false)}
        />
      )}
    </Panel>
  );
}
