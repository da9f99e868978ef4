import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { BoardRow } from '#shared/contracts/hours.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { EmptyState, ErrorState, LoadingState } from '../../ui/states.tsx';
import { boardQuery } from './queries.ts';

/** Open rebuilds as big rows to press, each with its hours planned and left. No money stands here. */
export function Board({ to }: { to: (rebuildId: string) => string }) {
  const board = useQuery(boardQuery());
  if (board.isPending) return <LoadingState label="Loading open rebuilds" />;
  if (board.isError) return <ErrorState error={board.error} onRetry={() => void board.refetch()} />;
  if (board.data.length === 0) {
    return (
      <EmptyState title="No rebuild is open">As soon as one is bought, it stands here to log hours on.</EmptyState>
    );
  }
  return (
    <ul className="grid gap-3">
      {board.data.map((row) => (
        <li key={row.id}>
          <Link to={to(row.id)} className="board-row">
            <span className="min-w-0">
              <span className="block text-lead font-[660]">
                {row.tag}
                {row.name && ` · ${row.name}`}
              </span>
              <span className="text-soft">{[row.damageName, row.stage].filter(Boolean).join(', ')}</span>
            </span>
            <HoursLeft row={row} />
          </Link>
        </li>
      ))}
    </ul>
  );
}

/** Hours left of the plan, or over it, or just how many so far. */
export function HoursLeft({ row }: { row: BoardRow }) {
  const format = useFormatter();
  const { loggedSeconds, plannedSeconds } = row;
  if (plannedSeconds === null) {
    return <span className="text-right text-soft">{format.hours(loggedSeconds)} h so far, none planned</span>;
  }
  const left = plannedSeconds - loggedSeconds;
  return (
    <span className="text-right">
      <span className={`block text-lead font-[660] tabular-nums ${left < 0 ? 'text-oxide' : ''}`}>
        {left < 0 ? `${format.hours(-left)} h over` : `${format.hours(left)} h left`}
      </span>
      <span className="text-soft tabular-nums">
        {format.hours(loggedSeconds)} of {format.hours(plannedSeconds)}
      </span>
    </span>
  );
}
