import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { countInWords } from '#shared/formatter.ts';
import { AnswerHeader, Mark } from '../../ui/answer-header.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { type RebuildFilters, rebuildsQuery } from './queries.ts';

/** The head of the list: how those that have left did, and what is still tied up. */
export function RebuildsAnswer({
  filters,
  isFiltered,
  actions,
}: {
  filters: RebuildFilters;
  isFiltered: boolean;
  actions: ReactNode;
}) {
  const format = useFormatter();
  const { data } = useInfiniteQuery(rebuildsQuery(filters));
  const summary = data?.pages[0]?.summary;
  const head = { question: 'How did each one go?', title: 'Rebuilds', filters: actions };
  if (!summary) return <AnswerHeader {...head} answer="Looking through the rebuilds …" />;
  if (summary.total === 0) {
    return (
      <AnswerHeader {...head} answer={isFiltered ? 'No rebuild matches this.' : 'No rebuild is in the books yet.'} />
    );
  }
  const { leftCount, lossCount, noPurchaseCount, keptCents, openCount, openCostCents } = summary;
  const judged = leftCount - noPurchaseCount;
  const { locale } = format.style;
  const open = `${countInWords(openCount, { locale, capital: judged === 0 })} ${openCount === 1 ? 'is' : 'are'} still in the shop`;
  return (
    <AnswerHeader
      {...head}
      answer={
        judged === 0 ? (
          <>
            {open} and {openCount === 1 ? 'holds' : 'hold'} <Mark>{format.money(openCostCents)}</Mark>.
          </>
        ) : judged === 1 ? (
          <>
            The one that has left {keptCents < 0 ? 'lost' : 'kept'} <Mark>{format.money(Math.abs(keptCents))}</Mark>.
          </>
        ) : (
          <>
            <Mark>
              {format.number(judged - lossCount)} of {format.number(judged)}
            </Mark>{' '}
            lost nothing; all {format.number(judged)} together {keptCents < 0 ? 'lost' : 'kept'}{' '}
            <Mark>{format.money(Math.abs(keptCents))}</Mark>.
          </>
        )
      }
      caution={
        <>
          {judged > 0 &&
            openCount > 0 &&
            `${open[0]?.toUpperCase()}${open.slice(1)} with ${format.money(openCostCents)} in them, not counted. `}
          {noPurchaseCount > 0 &&
            `${format.count(noPurchaseCount, 'rebuild')} with an unknown purchase ${noPurchaseCount === 1 ? 'is' : 'are'} in no money figure. `}
          Kept is what came in less purchase and entries; own hours are not a cost.
        </>
      }
    />
  );
}
