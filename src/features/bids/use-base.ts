import { useEffect, useMemo, useRef, useState } from 'react';
import type { Bid } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { newIdempotencyKey } from '../../lib/api.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { draftOf, dropDraft, useDraft } from './drafts.ts';
import { newSheet, type SheetForm, sheetForm } from './sheet-form.ts';
import type { SheetFormApi } from './use-sheet.ts';
import { waitingSheets } from './waiting.ts';

/** What a sheet starts with: as it is kept, or new; and over that what was typed here and has not arrived yet. */
export function useBase(bid: Bid | null, basis: BidBasis, home: string) {
  const { decimal } = useFormatter();
  const start = useMemo(() => (bid ? sheetForm(bid, basis, decimal) : newSheet(basis, decimal)), [bid, basis, decimal]);
  const [first] = useState(() => {
    const waiting = bid && waitingSheets(home).find(({ changes }) => changes?.bidId === bid.id);
    const waits = waiting
      ? { values: sheetForm(waiting.body, basis, decimal), version: waiting.changes?.version ?? null }
      : null;
    return { draft: draftOf(home, bid?.id ?? null, start) ?? waits, key: waiting?.key ?? newIdempotencyKey() };
  });
  return { start, first };
}

/**
 * Is anything typed that is not kept? Follows what stands on the server while nothing is; keeps what is typed in this
 * browser. `version` is that which was read when the typing began.
 */
export function useTyped(
  form: SheetFormApi,
  values: SheetForm,
  { bid, start, first, home }: ReturnType<typeof useBase> & { bid: Bid | null; home: string },
) {
  const now = bid?.version ?? null;
  const base = useRef({ start, version: first.draft ? first.draft.version : now });
  const isChanged = stamp(values) !== stamp(base.current.start);
  // A new sheet that was kept is done with, though it still stands there for a moment.
  const isDone = useRef(false);
  useDraft(home, bid?.id ?? null, { values, version: base.current.version }, isChanged && !isDone.current);
  const restart = (from: SheetForm, version: number | null) => {
    base.current = { start: from, version };
    form.reset(from);
  };
  useEffect(() => {
    const { current } = base;
    if (isDone.current || isChanged || (now === current.version && stamp(start) === stamp(current.start))) return;
    base.current = { start, version: now };
    form.reset(start);
  }, [form, isChanged, now, start]);
  const forget = () => {
    isDone.current = bid === null;
    dropDraft(home, bid?.id ?? null);
  };
  return { isChanged, version: base.current.version, restart, forget };
}

/** Two forms that say the same have the same; an amount that was emptied is none. */
function stamp({ amounts, ...rest }: SheetForm): string {
  const filled = Object.entries(amounts).filter(([, text]) => text);
  return JSON.stringify([Object.entries(rest), filled].map((pairs) => pairs.sort(([a], [b]) => (a < b ? -1 : 1))));
}
