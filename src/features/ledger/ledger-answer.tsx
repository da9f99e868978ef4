import { useInfiniteQuery } from '@tanstack/react-query';
import type { LedgerQuery } from '#shared/contracts/ledger.ts';
import { AnswerHeader, Mark } from '../../ui/answer-header.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { entriesQuery } from './queries.ts';

/** The ledger's head: what everything that is shown comes to. */
export function LedgerAnswer({ filters, isFiltered }: { filters: LedgerQuery; isFiltered: boolean }) {
  const format = useFormatter();
  const { data } = useInfiniteQuery(entriesQuery(filters));
  const totals = data?.pages[0]?.totals;
  const question = 'What was spent, on what?';
  if (!totals) return <AnswerHeader question={question} title="Ledger" answer="Adding up the ledger …" />;
  if (totals.count === 0) {
    const answer = isFiltered ? 'No entry matches this.' : 'Nothing is in the ledger yet.';
    return <AnswerHeader question={question} title="Ledger" answer={answer} />;
  }
  const free = totals.freeValueCents;
  const [matches, comes] = totals.count === 1 ? ['matches', 'comes'] : ['match', 'come'];
  const verb = isFiltered ? `${matches} and ${comes}` : comes;
  return (
    <AnswerHeader
      question={question}
      title="Ledger"
      answer={
        <>
          {format.count(totals.count, 'entry', 'entries')} {verb} to <Mark>{format.money(totals.cents, 'always')}</Mark>
          .
        </>
      }
      caution={
        <>
          Purchases stand with the rebuilds, not here. Void entries are in no sum.
          {free > 0 && ` Things worth ${format.money(free)} came free; they count for planning only.`}
        </>
      }
    />
  );
}
