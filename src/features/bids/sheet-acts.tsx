import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Bid } from '#shared/contracts/bids.ts';
import { Button } from '../../ui/button.tsx';
import { ErrorState } from '../../ui/states.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { BoughtDialog } from './bought-dialog.tsx';
import { useSheetOutcome } from './mutations.ts';
import { NotBoughtDialog } from './not-bought-dialog.tsx';
import type { useTyped } from './use-base.ts';

type Props = {
  bid: Bid | null;
  home: string;
  shop: { id: string; today: string };
  typed: ReturnType<typeof useTyped>;
  mayWrite: boolean;
  onBought: (rebuildId: string) => void;
  onStartOver: () => void;
};

/** What can be done with the sheet besides keeping it, and what became of it. */
export function SheetActs({ bid, home, shop, typed, mayWrite, onBought, onStartOver }: Props) {
  const [open, setOpen] = useState<'bought' | 'not bought' | null>(null);
  const [problem, setProblem] = useState<unknown>(null);
  const { setOutcome } = useSheetOutcome(home);
  const close = () => setOpen(null);
  const canEnd = mayWrite && bid?.state === 'open';
  const onReopen = () =>
    bid &&
    setOutcome(bid, {
      state: 'open',
      reason: null,
      bidMadeCents: bid.bidMadeCents,
      hammerCents: bid.hammerCents,
    }).catch(setProblem);
  return (
    <>
      {bid && <Became bid={bid} shopId={shop.id} />}
      <div className="flex flex-wrap items-center gap-3">
        {canEnd && (
          <>
            <Button className="touch" disabled={typed.isChanged} onClick={() => setOpen('bought')}>
              Bought it
            </Button>
            <Button className="touch" disabled={typed.isChanged} onClick={() => setOpen('not bought')}>
              Not bought
            </Button>
          </>
        )}
        {mayWrite && bid?.state === 'not bought' && (
          <Button className="touch" onClick={() => void onReopen()}>
            Open it again
          </Button>
        )}
        <Button className="touch" onClick={() => window.print()}>
          Print
        </Button>
        {bid === null && typed.isChanged && (
          <Button kind="plain" className="touch" onClick={onStartOver}>
            Start over
          </Button>
        )}
        <a href="#made-of" className="sheet-jump">
          What it is made of
        </a>
        <a href="#walk-round" className="sheet-jump">
          Walk round it
        </a>
        {canEnd && typed.isChanged && (
          <span className="text-soft">Keep the changes first, then say what became of it.</span>
        )}
      </div>
      {problem !== null && <ErrorState error={problem} />}
      {bid && open === 'bought' && (
        <BoughtDialog bid={bid} home={home} today={shop.today} onBought={onBought} onClose={close} />
      )}
      {bid && open === 'not bought' && <NotBoughtDialog bid={bid} home={home} onClose={close} />}
    </>
  );
}

function Became({ bid, shopId }: { bid: Bid; shopId: string }) {
  const format = useFormatter();
  if (bid.state === 'open') {
    return (
      <p className="text-soft">
        Kept on {format.day(bid.madeOn)} by {bid.madeByName}.
      </p>
    );
  }
  const fell = bid.hammerCents === null ? '' : ` The hammer fell at ${format.money(bid.hammerCents)}.`;
  return (
    <p className="border-l-4 border-ink pl-3">
      {bid.state === 'bought' && bid.rebuildId ? (
        <>
          Bought: it is rebuild <Link to={`/s/${shopId}/rebuilds/${bid.rebuildId}`}>{bid.rebuildTag}</Link> now.{fell}
        </>
      ) : (
        <>
          Not bought: {bid.reason ?? 'nobody said why'}.{fell}
        </>
      )}
    </p>
  );
}
