import { useMemo } from 'react';
import { useWatch } from 'react-hook-form';
import type { Bid } from '#shared/contracts/bids.ts';
import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { Caution } from '../../ui/answer-header.tsx';
import { Button } from '../../ui/button.tsx';
import { ErrorSummary } from '../../ui/error-summary.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { AnswerStrip } from './answer-strip.tsx';
import { BidPaper } from './bid-paper.tsx';
import { CarFields } from './car-fields.tsx';
import { Chances } from './chances.tsx';
import { CostFields } from './cost-fields.tsx';
import { MadeOf } from './made-of.tsx';
import { Moves } from './moves.tsx';
import { Nearest } from './nearest.tsx';
import { NotesFields } from './notes-fields.tsx';
import { PlanFields } from './plan-fields.tsx';
import { RuleFields } from './rule-fields.tsx';
import { SaleFields } from './sale-fields.tsx';
import { cautionsOf, sayBid } from './say.ts';
import { Selling } from './selling.tsx';
import { SheetActs } from './sheet-acts.tsx';
import type { SheetForm } from './sheet-form.ts';
import { SheetCautions } from './sheet-cautions.tsx';
import { type Arrived, useKeeping } from './use-keeping.tsx';
import { useBase, useTyped } from './use-base.ts';
import { useReading, useSheetForm } from './use-sheet.ts';
import { WalkRound } from './walk-round.tsx';
import { WorkFields } from './work-fields.tsx';

type Props = {
  basis: BidBasis;
  /** The kept sheet; null = a new one. */
  bid: Bid | null;
  home: string;
  shop: { id: string; name: string; today: string };
  mayWrite: boolean;
  /** A sheet was kept: where to go on. */
  onKept: (arrived: Arrived) => void;
  onBought: (rebuildId: string) => void;
};

/** One pre-bid sheet: the bid above, what it is worked out from on one side, what it is made of on the other. */
export function Sheet({ basis, bid, home, shop, mayWrite, onKept, onBought }: Props) {
  const format = useFormatter();
  const base = useBase(bid, basis, home);
  const { form, schema } = useSheetForm(base.first.draft?.values ?? base.start);
  const watched = useWatch({ control: form.control });
  const values = useMemo(() => ({ ...base.start, ...watched }) as SheetForm, [base.start, watched]);
  const typed = useTyped(form, values, { ...base, bid, home });
  const reading = useReading(values, schema, basis);
  const { sheet, figures, whole } = reading;
  const keeping = useKeeping({ form, basis, bid, home, typed, errandKey: base.first.key, onKept });
  const isOpen = bid === null || bid.state === 'open';
  const { errors, isSubmitting } = form.formState;
  const fields = { form, basis };
  return (
    <>
      <AnswerStrip
        answer={sayBid(sheet, figures, format)}
        act={
          mayWrite &&
          isOpen &&
          (bid === null || typed.isChanged) && (
            <Button kind="main" type="submit" form="sheet" busy={isSubmitting} className="touch flex-none">
              {bid ? 'Keep changes' : 'Keep it'}
            </Button>
          )
        }
      />
      <div className="no-print mb-6 grid gap-4">
        <Caution>{cautionsOf(sheet, figures, whole, format).join(' ')}</Caution>
        <SheetActs
          {...{ bid, home, shop, typed, mayWrite, onBought }}
          onStartOver={() => typed.restart(base.start, null)}
        />
        <ErrorSummary message={errors.root?.['server']?.message} fields={keeping.wrongFields} />
      </div>
      <div className="sheet-columns no-print">
        <form id="sheet" noValidate onSubmit={(event) => void keeping.onSubmit(event)} className="min-w-0">
          <fieldset disabled={!isOpen} className="grid min-w-0 gap-6">
            <CarFields {...fields} />
            <SaleFields form={form} basis={basis} figures={whole} />
            <PlanFields {...fields} />
            <WorkFields {...fields} />
            <RuleFields {...fields} figures={figures} />
            <CostFields {...fields} sheet={sheet} mayWrite={mayWrite} />
          </fieldset>
        </form>
        {sheet && figures && whole && (
          <div className="grid min-w-0 content-start gap-6">
            <MadeOf sheet={sheet} figures={figures} />
            <Moves sheet={sheet} figures={figures} basis={basis} />
            <Chances figures={whole} isSeen={sheet.isSeen} basis={basis} />
            <Selling sheet={sheet} basis={basis} />
            <Nearest sheet={sheet} planCents={figures.planCents} basis={basis} shopId={shop.id} />
            <SheetCautions sheet={sheet} basis={basis} />
          </div>
        )}
      </div>
      <fieldset disabled={!isOpen} className="no-print mt-6 grid min-w-0 gap-6">
        <WalkRound {...fields} />
        <NotesFields form={form} />
      </fieldset>
      {sheet && whole && (
        <BidPaper {...{ sheet, basis }} figures={whole} shopName={shop.name} madeOn={bid?.madeOn ?? shop.today} />
      )}
      {keeping.conflict}
    </>
  );
}
