import { useInfiniteQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { HoursQuery } from '#shared/contracts/hours.ts';
import { AnswerHeader, Mark } from '../../ui/answer-header.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { hoursQuery } from './queries.ts';

/** The head of the hours: what everything that is shown comes to. */
export function HoursAnswer({
  filters,
  isFiltered,
  actions,
}: {
  filters: HoursQuery;
  isFiltered: boolean;
  actions?: ReactNode;
}) {
  const format = useFormatter();
  const { data } = useInfiniteQuery(hoursQuery(filters));
  const totals = data?.pages[0]?.totals;
  const head = { question: 'Where did the hours go?', title: 'Hours', filters: actions };
  if (!totals) return <AnswerHeader {...head} answer="Adding up the hours …" />;
  if (totals.count === 0)
    return <AnswerHeader {...head} answer={isFiltered ? 'No hours match this.' : 'No hours are kept yet.'} />;
  const { ownSeconds, paidSeconds } = totals;
  return (
    <AnswerHeader
      {...head}
      answer={
        <>
          <Mark>{format.hours(ownSeconds + paidSeconds)} hours</Mark>
          {isFiltered ? ' match' : ' are in the books'}: {format.hours(ownSeconds)} of your own,{' '}
          {format.hours(paidSeconds)} paid.
        </>
      }
      caution="Paid hours are in the costs through their wages; “per hour” counts your own. Void hours are in no sum."
    />
  );
}
