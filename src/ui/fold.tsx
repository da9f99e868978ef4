import { isValidElement, type ReactNode, useMemo, useSyncExternalStore } from 'react';
import { Nothing } from './figures.tsx';
import type { Column, RowProps } from './table.tsx';

/** Below these widths the columns that say so move beneath their row. */
const NARROW = { phone: '(width < 40rem)', tablet: '(width < 80rem)' } as const;
export type Narrow = keyof typeof NARROW;

/** Columns that stay, and those whose cells stand on a line of their own beneath each row. */
type Folded<Row> = { columns: readonly Column<Row>[]; moved: readonly Column<Row>[] };

/** Columns as this window has room for them. */
export function useFolded<Row>(columns: readonly Column<Row>[]): Folded<Row> {
  const isPhone = useMatches(NARROW.phone);
  const isTablet = useMatches(NARROW.tablet);
  return useMemo(() => {
    const isUnder = ({ under }: Column<Row>) => (under === 'phone' && isPhone) || (under === 'tablet' && isTablet);
    return { columns: columns.filter((column) => !isUnder(column)), moved: columns.filter(isUnder) };
  }, [columns, isPhone, isTablet]);
}

type UnderProps<Row> = Folded<Row> & { valueOf: (column: Column<Row>) => ReactNode; rowProps?: RowProps | undefined };

/** The line beneath a row: each value with its column's name before it, where it does not speak for itself. */
export function UnderRow<Row>({ columns, moved, valueOf, rowProps }: UnderProps<Row>) {
  const pairs = moved
    .map((column) => ({ column, value: valueOf(column) }))
    .filter(({ value }) => value !== null && value !== undefined && value !== '' && value !== false)
    .filter(({ value }) => !(isValidElement(value) && value.type === Nothing));
  if (pairs.length === 0) return null;
  return (
    <tr {...rowProps} className="table-under">
      <td colSpan={columns.length}>
        <span>
          {pairs.map(({ column, value }) => (
            <span key={column.id}>
              {!column.bare && <span className="text-soft">{column.header} </span>}
              {value}
            </span>
          ))}
        </span>
      </td>
    </tr>
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
