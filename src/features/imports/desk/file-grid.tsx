import { useVirtualizer } from '@tanstack/react-virtual';
import { type KeyboardEvent, type Ref, useEffect, useId, useImperativeHandle, useMemo, useRef } from 'react';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { ImportRow } from '#shared/contracts/imports.ts';
import { type Place, rowKey } from '../place.ts';
import type { Settings } from '../use-settings.ts';
import { GridHead } from './grid-head.tsx';
import { GridRow } from './grid-row.tsx';
import { type Facts, widthsOf } from './row-facts.ts';

const ROW_HEIGHT = 32;
/** The head stands over the rows; `.file-grid-head` is as high. */
const HEAD_HEIGHT = 52;

export interface GridHandle {
  /** Puts the focus on the grid. */
  readonly focus: () => void;
}

type Props = {
  ref: Ref<GridHandle>;
  label: string;
  reading: Reading;
  rows: readonly ImportRow[];
  /** All rows of the sheet are here. */
  isWhole: boolean;
  facts: Facts;
  settings: Settings;
  place: Place;
  onPlace: (place: Place) => void;
  /** Enter on the row in focus. */
  onEnter: () => void;
  /** The last rows came near. */
  onNearEnd: () => void;
};

/** A sheet as it stands, only what is in view drawn. One stop for the Tab key; arrows move by row and by cell. */
export function FileGrid(props: Props) {
  const { rows, reading, place, facts, settings, onPlace, onNearEnd } = props;
  const id = useId();
  const frame = useRef<HTMLDivElement>(null);
  useImperativeHandle(props.ref, () => ({ focus: () => frame.current?.focus({ preventScroll: true }) }), []);
  const columns = useMemo(
    () => reading.columns.filter(({ sheet }) => sheet === place.sheet),
    [reading.columns, place.sheet],
  );
  const widths = useMemo(() => {
    const headings = columns.reduce<string[]>((all, { col, heading }) => {
      all[col - 1] = heading;
      return all;
    }, []);
    return widthsOf(
      rows,
      Array.from(headings, (heading) => heading ?? ''),
    );
  }, [columns, rows]);
  const virtual = useVirtualizer({
    count: rows.length,
    getScrollElement: () => frame.current,
    estimateSize: () => ROW_HEIGHT,
    scrollMargin: HEAD_HEIGHT,
    scrollPaddingStart: HEAD_HEIGHT,
    overscan: 12,
    useFlushSync: false,
  });
  const at = rows.findIndex((row) => row.sheet === place.sheet && row.row === place.row);
  useEffect(() => {
    if (at >= 0) virtual.scrollToIndex(at);
    // Only where the place changes: rows that come in later must not pull the view back.
  }, [virtual, at, place.row, place.sheet]);
  useEffect(() => bringIntoView(frame.current, place.col), [place.row, place.col]);
  const items = virtual.getVirtualItems();
  const last = items.at(-1)?.index ?? -1;
  useEffect(() => {
    if (last >= rows.length - 20) onNearEnd();
  }, [last, rows.length, onNearEnd]);

  const isDrawn = at >= 0 && items.some(({ index }) => index === at);
  const activeId = place.row === 0 ? `${id}-head-${place.col}` : isDrawn ? `${id}-${at}` : undefined;
  const template = `4.75rem ${widths.map((width) => `calc(${width}ch + 1.25rem)`).join(' ')}`;
  const onKeyDown = (event: KeyboardEvent) => {
    const to = placeAfter(event.key, { rows, place, at, width: widths.length });
    if (event.key === 'Enter' && event.target === event.currentTarget) props.onEnter();
    else if (to && event.target === event.currentTarget) onPlace(to);
    else return;
    event.preventDefault();
  };
  return (
    <div
      ref={frame}
      role="grid"
      tabIndex={0}
      aria-label={props.label}
      aria-rowcount={props.isWhole ? rows.length + 1 : -1}
      aria-colcount={widths.length + 1}
      aria-activedescendant={activeId}
      className="file-grid"
      onKeyDown={onKeyDown}
    >
      <GridHead {...{ id, columns, template, count: widths.length, settings, place, onPlace }} />
      <div role="rowgroup" className="file-grid-body" style={{ height: virtual.getTotalSize() }}>
        {items.map(({ index, start }) => {
          const row = rows[index];
          if (!row) return null;
          const isHere = index === at;
          return (
            <GridRow
              key={rowKey(row)}
              id={`${id}-${index}`}
              index={index}
              row={row}
              asides={facts.asides.get(rowKey(row)) ?? NONE}
              hints={facts.hints.get(rowKey(row)) ?? NONE}
              settings={settings}
              isHere={isHere}
              hotCol={isHere || place.row === 0 ? place.col : null}
              count={widths.length}
              style={{ transform: `translateY(${start - HEAD_HEIGHT}px)`, gridTemplateColumns: template }}
              onPlace={onPlace}
            />
          );
        })}
      </div>
    </div>
  );
}

/** Scrolls sideways, and only there, until the marked cell stands beside the row's number. */
function bringIntoView(frame: HTMLElement | null, col: number | null): void {
  const cell = frame?.querySelector<HTMLElement>(`[role="columnheader"]:nth-child(${(col ?? 0) + 1})`);
  const corner = frame?.querySelector<HTMLElement>('.file-grid-corner');
  if (!frame || !cell || !corner || col === null) return;
  const left = cell.offsetLeft - corner.offsetWidth;
  const right = cell.offsetLeft + cell.offsetWidth - frame.clientWidth;
  if (frame.scrollLeft > left) frame.scrollLeft = left;
  else if (frame.scrollLeft < right) frame.scrollLeft = right;
}

const NONE: readonly never[] = [];
const PAGE = 12;

/** Where a key leads; null = the key is none of the grid's. */
function placeAfter(
  key: string,
  now: { rows: readonly ImportRow[]; place: Place; at: number; width: number },
): Place | null {
  const { rows, place, at, width } = now;
  if (key === 'ArrowUp' && at === 0) return { ...place, row: 0, col: place.col ?? 1 };
  const steps: Record<string, number> = {
    ArrowDown: 1,
    ArrowUp: -1,
    PageDown: PAGE,
    PageUp: -PAGE,
    Home: -rows.length,
    End: rows.length,
  };
  const step = steps[key];
  if (step !== undefined) {
    const row = rows[Math.min(rows.length - 1, Math.max(0, at + step))];
    return row ? { sheet: row.sheet, row: row.row, col: place.col } : null;
  }
  if (key === 'ArrowRight') return { ...place, col: Math.min(width, (place.col ?? 0) + 1) };
  if (key !== 'ArrowLeft') return null;
  return { ...place, col: place.col === null || place.col <= 1 ? null : place.col - 1 };
}
