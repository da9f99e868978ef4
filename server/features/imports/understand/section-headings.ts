import type { Column, ColumnChoice, Meaning } from '#shared/contracts/import-reading.ts';
import { sectionColumns } from '../read/section-columns.ts';
import type { Head, HeadRow } from './head.ts';

/** Why a column of a sheet about one vehicle is taken so, once a person said it. */
export const YOU_SAID = 'You said so.';

/**
 * The columns of a sheet about one vehicle, from the headings of its sections in its first rows. They hold for all its
 * sections that have a heading there; `said` goes before what the headings say.
 */
export function sectionHeadings(head: Head, sheet: number, said: readonly ColumnChoice[]): Column[] {
  const columns = new Map<number, Column>();
  const rows: readonly HeadRow[] = [...head.above, ...(head.heading ? [head.heading] : []), ...head.below];
  for (const { cells } of rows) {
    const found = sectionColumns(cells, false);
    if (!found) continue;
    const meanings = new Map([...found].map(([meaning, at]): [number, Meaning] => [at, meaning]));
    cells.forEach((cell, at) => {
      const before = columns.get(at + 1);
      if (cell.trim() === '' || (before && before.meaning !== 'ignore')) return;
      columns.set(at + 1, columnOf(sheet, at + 1, cell.trim(), meanings.get(at)));
    });
  }
  for (const { col, meaning, category } of said) {
    const column = columns.get(col);
    if (column && column.meaning !== meaning) columns.set(col, { ...column, meaning, category, why: YOU_SAID });
  }
  return [...columns.values()].sort((a, b) => a.col - b.col);
}

function columnOf(sheet: number, col: number, heading: string, meaning: Meaning | undefined): Column {
  const why = meaning ? 'The heading of a section says so.' : 'No heading of a section says what it is.';
  return { sheet, col, heading, meaning: meaning ?? 'ignore', category: null, samples: [], why };
}
