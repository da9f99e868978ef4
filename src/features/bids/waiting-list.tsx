import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { UnsentList } from '../../ui/unsent-list.tsx';
import { Button } from '../../ui/button.tsx';
import { hasNewDraft, keepDraft } from './drafts.ts';
import { useSendWaiting } from './send-waiting.tsx';
import { sheetForm } from './sheet-form.ts';
import { useIsOnline } from './signal.ts';
import { dropWaiting, type Errand, letWait } from './waiting.ts';

type Props = { home: string; shopId: string; waiting: readonly Errand[] };

/** Sheets kept in this browser that wait for a signal, or that the server refused: nothing typed is lost. */
export function WaitingList({ home, shopId, waiting }: Props) {
  const format = useFormatter();
  const navigate = useNavigate();
  const isOnline = useIsOnline();
  const { send, isBusy } = useSendWaiting(home);
  const [isTaken, setTaken] = useState(false);
  if (waiting.length === 0) return null;
  const count = format.count(waiting.length, 'sheet');
  const onEdit = ({ key, body, changes }: Errand) => {
    const bidId = changes?.bidId ?? null;
    const values = sheetForm(body, { categories: [] }, format.decimal);
    // A new sheet that was begun meanwhile would be lost under this one.
    if (bidId === null && hasNewDraft(home)) return setTaken(true);
    keepDraft(home, bidId, { values, version: changes?.version ?? null });
    if (bidId === null) dropWaiting(home, key);
    void navigate(`/s/${shopId}/pre-bid${bidId ? `/${bidId}` : ''}`);
  };
  return (
    <section className="panel mb-6 border-l-4 border-l-ink" aria-label="Waiting for a signal">
      <h2 className="text-lead font-[660]">{count} kept in this browser, not sent yet</h2>
      <p className="mb-3 text-soft">
        {isOnline ? 'They go out by themselves.' : 'There is no signal. They go out by themselves when there is.'} Do
        not sign out before.
      </p>
      <UnsentList
        unsent={waiting.map((one) => ({
          key: one.key,
          typed: one,
          problem: { message: one.problem ?? 'it waits for a signal.' },
        }))}
        words={({ body, shown }) =>
          `${body.name}${shown?.bidCents == null ? '' : `: walk away above ${format.money(shown.bidCents)}`}`
        }
        onRetry={(key) => {
          const errand = waiting.find((one) => one.key === key);
          if (errand) letWait(home, { ...errand, problem: null });
          void send();
        }}
        onDrop={(key) => dropWaiting(home, key)}
        onEdit={(_key, errand) => onEdit(errand)}
      />
      {isTaken && (
        <p role="alert" className="mt-2 font-semibold">
          A new sheet is begun already: keep it or start it over first.
        </p>
      )}
      {isBusy && (
        <Button size="small" busy>
          Sending
        </Button>
      )}
    </section>
  );
}
