import { type FormEvent, useState } from 'react';
import type { BidFields } from '#shared/contracts/bids.ts';
import { parseCents } from '#shared/money.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { MoneyField } from '../../ui/money-field.tsx';
import { notify } from '../../ui/toast.tsx';
import { feesOf, type StepText } from './fee-text.ts';
import { useChangeFeeTable } from './mutations.ts';
import { plainMoney } from './sheet-form.ts';
import type { SheetFormApi } from './use-sheet.ts';

type Props = {
  form: SheetFormApi;
  /** The sheet as it stands, whose usual costs go with the fees; null = a field cannot be read. */
  sheet: BidFields | null;
  /** Of the shop's fee table; 0 = none set yet. */
  version: number;
  mayWrite: boolean;
  onClose: () => void;
};

/** The fee table in steps: for this sheet, or with the sheet's usual costs as the shop's own. */
export function FeeDialog({ form, sheet, version, mayWrite, onClose }: Props) {
  const format = useFormatter();
  const [start] = useState(() => form.getValues(['feeSteps', 'feeFlatCents', 'bidStepCents']));
  const text = (cents: number) => plainMoney(cents, format.decimal);
  const [steps, setSteps] = useState<StepText[]>(() =>
    start[0].map(([from, fee]) => ({ from: text(from), fee: text(fee) })),
  );
  const [flat, setFlat] = useState(text(start[1]));
  const [step, setStep] = useState(text(start[2]));
  const [problem, setProblem] = useState<string>();
  const changeShop = useChangeFeeTable();
  const { fees, errors } = feesOf({ steps, flat, step }, format.decimal);
  const edit = (at: number, change: Partial<StepText>) =>
    setSteps((all) => all.map((one, i) => (i === at ? { ...one, ...change } : one)));

  const onUse = async (event: FormEvent, isForShop: boolean) => {
    event.preventDefault();
    // The dialog stands within the sheet's own form.
    event.stopPropagation();
    if (!fees) return;
    for (const name of ['feeSteps', 'feeFlatCents', 'bidStepCents'] as const)
      form.setValue(name, fees[name], { shouldDirty: true });
    if (!isForShop || !sheet) return onClose();
    try {
      await changeShop({ ...sheet, ...fees }, version);
      notify('Kept as the shop’s fees and usual costs');
      onClose();
    } catch (refused) {
      if (!(refused instanceof ApiProblem)) throw refused;
      setProblem([refused.message, ...refused.errors.map(({ detail }) => detail)].join(' '));
    }
  };
  return (
    <Dialog open stay onClose={onClose} title="Fees and bid step" note="From each bid on, the fee beside it is paid.">
      <form noValidate onSubmit={(event) => void onUse(event, false)} className="grid gap-4">
        <div className="grid grid-cols-[1fr_1fr_auto] items-start gap-x-3 gap-y-2">
          <span className="field-label">From a bid of</span>
          <span className="field-label">Fee</span>
          <span />
          {steps.map((one, at) => (
            <StepRow
              key={at}
              at={at}
              step={one}
              errors={errors[at] ?? {}}
              onChange={(change) => edit(at, change)}
              onDrop={() => setSteps((all) => all.filter((_, i) => i !== at))}
            />
          ))}
        </div>
        <Button
          size="small"
          className="touch justify-self-start"
          onClick={() => setSteps((all) => [...all, { from: '', fee: '' }])}
        >
          Add a step
        </Button>
        <div className="grid grid-cols-2 gap-4">
          <MoneyField
            label="On top, whatever the bid"
            value={flat}
            onChange={(event) => setFlat(event.target.value)}
            error={flat.trim() !== '' && parseCents(flat, format.decimal) === null ? 'Not an amount.' : undefined}
          />
          <MoneyField
            label="Bids go up by"
            value={step}
            onChange={(event) => setStep(event.target.value)}
            error={(parseCents(step, format.decimal) ?? 0) < 1 ? 'More than nothing.' : undefined}
          />
        </div>
        <ErrorSummary message={problem} />
        <DialogActions>
          <Button kind="main" type="submit" disabled={!fees}>
            Use on this sheet
          </Button>
          {mayWrite && (
            <Button disabled={!fees || !sheet} onClick={(event) => void onUse(event, true)}>
              Use, and keep for the shop
            </Button>
          )}
          <Button kind="plain" onClick={onClose}>
            Cancel
          </Button>
        </DialogActions>
        {mayWrite && (
          <p className="text-label text-soft">
            Kept for the shop are also tax, transport, title, selling, holding and profit as they stand on this sheet.
            Every new sheet starts with them.
          </p>
        )}
      </form>
    </Dialog>
  );
}

type RowProps = {
  at: number;
  step: StepText;
  errors: Partial<StepText>;
  onChange: (change: Partial<StepText>) => void;
  onDrop: () => void;
};

function StepRow({ at, step, errors, onChange, onDrop }: RowProps) {
  return (
    <>
      <MoneyField
        label={`From a bid of, step ${at + 1}`}
        hideLabel
        value={step.from}
        onChange={(event) => onChange({ from: event.target.value })}
        error={errors.from}
      />
      <MoneyField
        label={`Fee, step ${at + 1}`}
        hideLabel
        value={step.fee}
        onChange={(event) => onChange({ fee: event.target.value })}
        error={errors.fee}
      />
      <button type="button" className="row-act min-h-10" aria-label={`Take out step ${at + 1}`} onClick={onDrop}>
        Take out
      </button>
    </>
  );
}
