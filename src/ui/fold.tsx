import { type ReactNode, useMemo, useSyncExternalStore } from 'react';
import type { Column } from './table.tsx';

/** Below these widths the columns that say so move beneath their row's heading. */
const NARROW = { phone: '(width < 40rem)', tablet: '(width < 64rem)' } as const;
export type Narrow = keyof typeof NARROW;

type Folded<Row> = { columns: readonly Column<Row>[]; foot: Readonly<Record<string, ReactNode>> | undefined };

/** Columns and sums as this window has room for them: what is `under` stands in its row's heading cell (or the first one left). */
export function useFolded<Row>(
  columns: readonly Column<Row>[],
  foot?: Readonly<Record<string, ReactNode>>,
): Folded<Row> {
  const isPhone = useMatches(NARROW.phone);
  const isTablet = useMatches(NARROW.tablet);
  return useMemo(() => {
    const isUnder = ({ under }: Column<Row>) => (under === 'phone' && isPhone) || (under === 'tablet' && isTablet);
    const moved = columns.filter(isUnder);
    const left = columns.filter((column) => !isUnder(column));
    const home = left.find((column) => column.heads) ?? left[0];
    if (moved.length === 0 || !home) return { columns, foot };
    const withMoved: Column<Row> = {
      ...home,
      cell: (row, index) => (
        <>
          {home.cell(row, index)}
          <Under columns={moved} valueOf={(column) => column.cell(row, index)} />
        </>
      ),
    };
    return {
      columns: left.map((column) => (column === home ? withMoved : column)),
      foot: foot && {
        ...foot,
        [home.id]: (
          <>
            {foot[home.id]}
            <Under columns={moved} valueOf={(column) => foot[column.id]} />
          </>
        ),
      },
    };
  }, [columns, foot, isPhone, isTablet]);
}

/** Each value with its column's name before it, where the value does not speak for itself. */
function Under<Row>(props: { columns: readonly Column<Row>[]; valueOf: (column: Column<Row>) => ReactNode }) {
  const pairs = props.columns
    .map((column) => ({ column, value: props.valueOf(column) }))
    .filter(({ value }) => value !== null && value !== undefined && value !== '' && value !== false);
  if (pairs.length === 0) return null;
  return (
    <span className="table-under">
      {pairs.map(({ column, value }) => (
        <span key={column.id}>
          {!column.bare && <span className="text-soft">{column.header} </span>}
          {value}
        </span>
      ))}
    </span>
  );
}

/** Is the window as narrow as a phone's? For what is drawn to a width. */
export function useIsPhone(): boolean {
  return useMatches(NARROW.phone);
}

function useMatches(query: string): boolean {
  return useSyncExternalStore(
    (onChange) => {
      const list = listOf(query);
      list?.addEventListener('change', onChange);
      return () => list?.removeEventListener('change', onChange);
    },
    () => listOf(query)?.matches ?? false,
  );
}

/** null where there is no window to measure. */
function listOf(query: string): MediaQueryList | null {
  return typeof window.matchMedia === 'function' ? window.matchMedia(query) : null;
}
