import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import type { BoardRow } from '#shared/contracts/hours.ts';
import { EmptyState } from '../../ui/states.tsx';
import { Board } from './board.tsx';
import { LogHours } from './log-hours.tsx';
import { OwnHoursList } from './own-hours-list.tsx';
import { boardQuery } from './queries.ts';

type Props = {
  /** The rebuild to log on, from the address; null = choose one first. */
  rebuildId: string | null;
  today: string;
  /** The address that logs on a rebuild, and the one that chooses again. */
  to: (rebuildId: string) => string;
  back: string;
  /** What else can be done on the chosen one. */
  beside: (row: BoardRow) => ReactNode;
};

/** One's own hours on the phone: choose the rebuild, log, see what was logged. */
export function OwnHoursView({ rebuildId, today, to, back, beside }: Props) {
  const { data: board } = useQuery(boardQuery());
  const row = board?.find((one) => one.id === rebuildId);
  return (
    <div className="grid gap-8">
      {rebuildId === null ? (
        <section className="grid gap-4">
          <h2 className="answer">Which one are you on?</h2>
          <Board to={to} />
        </section>
      ) : row ? (
        <section className="grid max-w-[30rem] gap-5">
          <LogHours key={row.id} row={row} today={today} back={back} />
          {beside(row)}
        </section>
      ) : (
        board && <EmptyState title="This one is not open any more">Choose another one from the list.</EmptyState>
      )}
      <section className="grid gap-2">
        <h2 className="text-lead font-[660]">Your latest hours</h2>
        <OwnHoursList />
      </section>
    </div>
  );
}
