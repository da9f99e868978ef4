import type { FirstRow } from '#shared/contracts/import-reading.ts';
import type { Outcome } from '#shared/contracts/import-words.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import type { ShopBooks } from '../books.ts';
import { FileRefusal } from '../refusal.ts';
import { editedSheets } from '../sheets/edited-sheet.ts';
import { type GivenFile, openFiles } from '../sheets/open-files.ts';
import { understand } from '../understand/understand.ts';
import { lineOf } from './plan.ts';
import { readRows } from './read-rows.ts';

/** Which rows of a file are wanted: from a row of a sheet on, with one outcome or any, at most so many. */
export interface RowsWanted {
  readonly sheet: number;
  readonly row: number;
  readonly outcome: Outcome | null;
  readonly most: number;
}

class Enough extends Error {}

/**
 * Some rows of files that are not booked, read as all of them would be. Files whose columns nobody could tell give their
 * rows put aside, so that a person can look at them and say; those that are no table give none.
 */
export function rowWindow(
  files: readonly GivenFile[],
  books: ShopBooks,
  settings: ImportSettings,
  wanted: RowsWanted,
): FirstRow[] {
  const rows: FirstRow[] = [];
  const add = (row: FirstRow) => {
    const isBefore = row.sheet < wanted.sheet || (row.sheet === wanted.sheet && row.row < wanted.row);
    if (isBefore || (wanted.outcome !== null && row.outcome !== wanted.outcome)) return;
    rows.push(row);
    if (rows.length === wanted.most) throw new Enough();
  };
  try {
    const { plan } = understand(files, books, settings);
    if (plan === null) addUnread(files, settings, add);
    else
      readRows(plan, {
        row(cells, row, { outcome, reason, lines }, sheet) {
          add({ sheet, row, cells: [...cells], outcome, reason, lines: lines.map((line) => lineOf(line, sheet)) });
        },
      });
  } catch (error) {
    if (!(error instanceof Enough) && !(error instanceof FileRefusal)) throw error;
  }
  return rows;
}

function addUnread(files: readonly GivenFile[], settings: ImportSettings, add: (row: FirstRow) => void): void {
  for (const sheet of editedSheets(openFiles(files).sheets, settings)) {
    sheet.forEachRow((cells, row) => {
      if (cells.every((cell) => cell.trim() === '')) return;
      add({ sheet: sheet.number, row, cells, outcome: 'put aside', reason: 'not-a-data-row', lines: [] });
    });
  }
}
