import type { ReactNode, Ref } from 'react';
import { Panel } from '../../ui/panel.tsx';

type Props<T> = {
  title: string;
  subtitle: string;
  items: readonly (T & { id: string; isRetired: boolean })[];
  row: (item: T, at: number) => ReactNode;
  retiredRow: (item: T) => ReactNode;
  /** What an empty list means and what to do. */
  empty: string;
  /** Takes the focus when a row goes. */
  listRef: Ref<HTMLUListElement>;
  children?: ReactNode;
};

/** A list of the shop: those in use, then the field that adds (children), then the retired ones folded away. */
export function WordsFrame<T>({ title, subtitle, items, row, retiredRow, empty, listRef, children }: Props<T>) {
  const inUse = items.filter((item) => !item.isRetired);
  const retired = items.filter((item) => item.isRetired);
  return (
    <Panel title={title} subtitle={subtitle}>
      {inUse.length === 0 && <p className="text-soft">{empty}</p>}
      <ul ref={listRef} tabIndex={-1} aria-label={`${title} in use`} className="border-t border-ink">
        {inUse.map(row)}
      </ul>
      {children}
      {retired.length > 0 && (
        <details className="mt-4">
          <summary className="inline-block min-h-6 text-steel underline underline-offset-3">
            Retired ({retired.length})
          </summary>
          <p className="mt-1 text-label text-soft">Kept on what has them, no longer offered.</p>
          <ul aria-label={`${title} retired`}>{retired.map(retiredRow)}</ul>
        </details>
      )}
    </Panel>
  );
}
