import { useState } from 'react';
import type { Bid } from '#shared/contracts/bids.ts';
import { parseCents } from '#shared/money.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { usePlainForm } from '../../lib/use-plain-form.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { MoneyField } from '../../ui/money-field.tsx';
import { DayField, TextField } from '../../ui/text-field.tsx';
import { useSheetOutcome } from './mutations.ts';

const NAMES = ['tag', 'hammerCents', 'boughtOn'] as const;

type Props = { bid: Bid; home: string; today: string; onBought: (rebuildId: string) => void; onClose: () => void };

/** The sheet becomes a rebuild: its tag, what the hammer fell at, and the day. */
export function BoughtDialog({ bid, home, today, onBought, onClose }: Props) {
  const format = useFormatter();
  const [key] = useState(newIdempotencyKey);
  const { buy } = useSheetOutcome(home);
  const read = (text: string) => parseCents(text, format.decimal);
  const { onSubmit, isBusy, errors, message } = usePlainForm({
    names: NAMES,
    check: ({ tag, hammerCents, boughtOn }) => ({
      ...(tag.trim() === '' ? { tag: 'Give it the shop’s own short name.' } : {}),
      ...(read(hammerCents) === null ? { hammerCents: 'Type what the hammer fell at.' } : {}),
      ...(boughtOn === '' ? { boughtOn: 'Give the day.' } : {}),
    }),
    save: async ({ tag, hammerCents, boughtOn }) =>
      onBought(await buy(bid, { tag, boughtOn, hammerCents: read(hammerCents) ?? 0 }, key)),
  });
  const most = bid.figures.bidCents === null ? '' : `You would walk away above ${format.money(bid.figures.bidCents)}.`;
  return (
    <Dialog
      open
      onClose={onClose}
      title="Bought it"
      note="The sheet becomes a rebuild. Its plan is locked as the estimate, and every overrun is measured against it."
    >
      <form noValidate onSubmit={onSubmit} className="grid gap-4">
        <TextField name="tag" label="Tag" hint="The shop’s own short name for the rebuild." error={errors.tag} />
        <MoneyField name="hammerCents" label="The hammer fell at" note={most} error={errors.hammerCents} />
        <DayField name="boughtOn" label="Bought on" defaultValue={today} error={errors.boughtOn} />
        <p className="text-label text-soft">
          Fees and tax are entries of their own: enter them in the ledger when billed.
        </p>
        <ErrorSummary message={message} />
        <DialogActions>
          <Button kind="main" type="submit" busy={isBusy}>
            Make it a rebuild
          </Button>
          <Button onClick={onClose}>Not yet</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
