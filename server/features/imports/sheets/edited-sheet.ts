import type { CellEdit, ImportSettings } from '#shared/contracts/imports.ts';
import type { Sheet } from './sheet.ts';

/**
 * Sheets as a person put them right: corrected cells in place of the raw ones, rows left out as if they were blank. The
 * raw rows stay at hand in `rawRow`, once they were gone through.
 */
export function editedSheets(sheets: readonly Sheet[], { cells = [], leftOut = [] }: ImportSettings): Sheet[] {
  return sheets.map((sheet) => {
    const edits = new Map<number, CellEdit[]>();
    for (const edit of cells)
      if (edit.sheet === sheet.number) edits.set(edit.row, [...(edits.get(edit.row) ?? []), edit]);
    const out = new Set(leftOut.filter((one) => one.sheet === sheet.number).map(({ row }) => row));
    return edits.size + out.size === 0 ? sheet : edited(sheet, edits, out);
  });
}

function edited(sheet: Sheet, edits: ReadonlyMap<number, readonly CellEdit[]>, leftOut: ReadonlySet<number>): Sheet {
  const raw = new Map<number, readonly string[]>();
  return {
    ...sheet,
    leftOut,
    rawRow: (line) => raw.get(line),
    forEachRow(onRow, onPart) {
      sheet.forEachRow((cells, line, isMalformed) => {
        const own = edits.get(line);
        if (!own && !leftOut.has(line)) return onRow(cells, line, isMalformed);
        raw.set(line, cells);
        // Whoever corrects a broken row has seen how it came apart.
        onRow(leftOut.has(line) ? [] : withEdits(cells, own ?? []), line, false);
      }, onPart);
    },
  };
}

function withEdits(cells: readonly string[], edits: readonly CellEdit[]): string[] {
  const corrected = [...cells];
  for (const { col, text } of edits) {
    while (corrected.length < col) corrected.push('');
    corrected[col - 1] = text;
  }
  return corrected;
}
