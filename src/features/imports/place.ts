import type { Reading } from '#shared/contracts/import-reading.ts';

/** Names the sheet of a workbook; null in a file that has but one. */
export function sheetName(reading: Reading, sheet: number): string | null {
  if (reading.sheets.length < 2) return null;
  return reading.sheets.find(({ number }) => number === sheet)?.name ?? null;
}

/** Where a row stands: `12`, or `Parts, 12` in a workbook. */
export function rowPlace(reading: Reading, at: { readonly sheet: number; readonly row: number }): string {
  const name = sheetName(reading, at.sheet);
  return name === null ? String(at.row) : `${name}, ${at.row}`;
}

/** The heading of a column, or its number where it has none. */
export function columnName(reading: Reading, at: { readonly sheet: number; readonly col: number }): string {
  const found = reading.columns.find(({ sheet, col }) => sheet === at.sheet && col === at.col);
  return found?.heading || `Column ${at.col}`;
}
