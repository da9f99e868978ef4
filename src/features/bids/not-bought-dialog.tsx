import { useState } from 'react';
import type { Bid } from '#shared/contracts/bids.ts';
import { parseCents } from '#shared/money.ts';
import { usePlainForm } from '../../lib/use-plain-form.ts';
import { Button } from '../../ui/button.tsx';
import { Dialog, DialogActions } from '../../ui/dialog.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { MoneyField } from '../../ui/money-field.tsx';
import { ChipChoice } from '../../ui/segmented.tsx';
import { TextField } from '../../ui/text-field.tsx';
import { useSheetOutcome } from './mutations.ts';

const REASONS = [
  'went above the bid',
  'looked worse up close',
  'title or papers',
  'seller did not let it go',
  'took another one',
  'something else',
] as const;

const NAMES = ['reason', 'bidMadeCents', 'hammerCents'] as const;

/** Why it was not bought, and what was bid, as far as known: so that the bids can be judged later. */
export function NotBoughtDialog({ bid, home, onClose }: { bid: Bid; home: string; onClose: () => void }) {
  const format = useFormatter();
  const [reason, setReason] = useState<(typeof REASONS)[number]>(REASONS[0]);
  const { setOutcome } = useSheetOutcome(home);
  const read = (text: string) => (text.trim() === '' ? null : parseCents(text, format.decimal));
  const unread = (text: string) => text.trim() !== '' && read(text) === null;
  const { onSubmit, isBusy, errors, message } = usePlainForm({
    names: NAMES,
    check: (typed) => ({
      ...(reason === 'something else' && typed.reason.trim() === '' ? { reason: 'Say what it was.' } : {}),
      ...(unread(typed.bidMadeCents) ? { bidMadeCents: 'This cannot be read as an amount.' } : {}),
      ...(unread(typed.hammerCents) ? { hammerCents: 'This cannot be read as an amount.' } : {}),
    }),
    save: async (typed) => {
      const words = typed.reason.trim();
      const why = reason === 'something else' ? words : [reason, words].filter(Boolean).join(': ');
      const known = { bidMadeCents: read(typed.bidMadeCents), hammerCents: read(typed.hammerCents) };
      await setOutcome(bid, { state: 'not bought', reason: why, ...known });
      onClose();
    },
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title="Not bought"
      note="Kept all the same: lots that you let go tell about your bids too."
    >
      <form noValidate onSubmit={onSubmit} className="grid gap-4">
        <ChipChoice
          label="Why"
          options={REASONS.map((value) => ({ value, label: value.charAt(0).toUpperCase() + value.slice(1) }))}
          value={reason}
          onChange={setReason}
        />
        <TextField name="reason" label="In words" maxLength={250} error={errors.reason} />
        <div className="grid grid-cols-2 gap-4">
          <MoneyField name="bidMadeCents" label="Your last bid" note="If you made one." error={errors.bidMadeCents} />
          <MoneyField name="hammerCents" label="The hammer fell at" note="If you know." error={errors.hammerCents} />
        </div>
        <ErrorSummary message={message} />
        <DialogActions>
          <Button kind="main" type="submit" busy={isBusy}>
            Keep that
          </Button>
          <Button onClick={onClose}>Not yet</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
