import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { Bid, BidFields } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { ApiProblem } from '../../lib/api-problem.ts';
import { applyProblem } from '../../lib/apply-problem.ts';
import { ConflictDialog } from '../../ui/conflict.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { useKeepSheet } from './mutations.ts';
import { bidQuery } from './queries.ts';
import { sheetForm } from './sheet-form.ts';
import type { useTyped } from './use-base.ts';
import { figuresAlone, type SheetFormApi } from './use-sheet.ts';
import { dropWaiting, type Errand, type Kept } from './waiting.ts';

/** A sheet that was kept; null = it waits in this browser for a signal. */
export type Arrived = Kept | null;

type Wish = {
  form: SheetFormApi;
  basis: BidBasis;
  bid: Bid | null;
  home: string;
  typed: ReturnType<typeof useTyped>;
  /** Goes with every try to keep this sheet. */
  errandKey: string;
  onKept: (arrived: Arrived) => void;
};

/** Keeps the sheet. What is refused shows at its fields; where somebody else was quicker, both versions are shown. */
export function useKeeping({ form, basis, bid, home, typed, errandKey, onKept }: Wish) {
  const { decimal } = useFormatter();
  const client = useQueryClient();
  const keepSheet = useKeepSheet(home);
  const [clash, setClash] = useState<{ errand: Errand; theirs: Bid } | null>(null);

  const send = async (errand: Errand) => {
    try {
      const arrived = await keepSheet(errand);
      typed.forget();
      if (arrived) {
        dropWaiting(home, errand.key);
        // A new sheet is left as it stands: its page gives way to that of the kept one.
        if (bid) typed.restart(sheetForm(arrived.bid, basis, decimal), arrived.bid.version);
      }
      setClash(null);
      onKept(arrived);
    } catch (problem) {
      const isStale = problem instanceof ApiProblem && problem.status === 412 && bid !== null;
      if (!isStale) return applyProblem(form, problem);
      const theirs = await client.fetchQuery({ ...bidQuery(bid.id, home), staleTime: 0 });
      setClash({ errand, theirs });
    }
  };
  const onSubmit = form.handleSubmit(async (body) => {
    const { repairBudgetCents, roomCents, bidCents } = figuresAlone(body, basis);
    const changes = bid && { bidId: bid.id, version: typed.version ?? bid.version };
    await send({ key: errandKey, body, shown: { repairBudgetCents, roomCents, bidCents }, changes, problem: null });
  });
  const onTheirs = () => {
    if (!clash) return;
    dropWaiting(home, clash.errand.key);
    typed.restart(sheetForm(clash.theirs, basis, decimal), clash.theirs.version);
    setClash(null);
  };
  const onMine = () => {
    if (!clash) return;
    const { errand, theirs } = clash;
    void send({ ...errand, changes: { bidId: theirs.id, version: theirs.version } });
  };
  const conflict = clash && (
    <Clash mine={clash.errand} theirs={clash.theirs} basis={basis} onMine={onMine} onTheirs={onTheirs} />
  );
  const { errors, isSubmitted } = form.formState;
  const wrongFields = isSubmitted ? Object.keys(errors).filter((name) => name !== 'root').length : 0;
  return { onSubmit, conflict, wrongFields };
}

type ClashProps = { mine: Errand; theirs: Bid; basis: BidBasis; onMine: () => void; onTheirs: () => void };

function Clash({ mine, theirs, basis, onMine, onTheirs }: ClashProps) {
  const format = useFormatter();
  const money = (cents: number | null) => (cents === null ? 'none' : format.money(cents));
  const sides = (name: string, of: (sheet: BidFields) => string) => ({ name, theirs: of(theirs), mine: of(mine.body) });
  return (
    <ConflictDialog
      subject={`“${theirs.name}”`}
      fields={[
        sides('Walk away above', (sheet) => money(figuresAlone(sheet, basis).bidCents)),
        sides('Sale expected', (sheet) => money(sheet.expectedSaleCents)),
        sides('Repair plan', (sheet) => money(sheet.lines.reduce((sum, { cents }) => sum + cents, 0))),
        sides('Own hours', (sheet) => format.hours(sheet.ownSeconds)),
        sides('Notes', (sheet) => sheet.notes ?? 'none'),
      ]}
      onMine={onMine}
      onTheirs={onTheirs}
    />
  );
}
