import type { Choice, Reading } from '#shared/contracts/import-reading.ts';
import type { Import } from '#shared/contracts/imports.ts';

/** A row of the file, or one of its cells; `row` 0 stands for a whole column. */
export interface Place {
  readonly sheet: number;
  readonly row: number;
  readonly col: number | null;
}

export const rowKey = ({ sheet, row }: Pick<Place, 'sheet' | 'row'>) => `${sheet}-${row}`;
export const cellKey = ({ sheet, row, col }: { sheet: number; row: number; col: number }) => `${sheet}-${row}-${col}`;

/** Names the sheet of a workbook; null in a file that has but one. */
export function sheetName(reading: Reading, sheet: number): string | null {
  if (reading.sheets.length < 2) return null;
  return reading.sheets.find(({ number }) => number === sheet)?.name ?? null;
}

/** The sheets to leaf through, each with its name and, where there are several files, its file's. */
export function sheetsOf(file: Import, reading: Reading): { value: string; label: string }[] {
  const nameOf = (number: number) => file.files.find((one) => one.number === number)?.name;
  const found = reading.sheets.map(({ number, name, file: of }) => {
    const from = file.files.length > 1 ? nameOf(of) : undefined;
    return { value: String(number), label: from?.startsWith(name) ? from : from ? `${from}: ${name}` : name };
  });
  return found.length > 1 ? found : [];
}

/** Where a row stands: `12`, or `Parts, 12` in a workbook. */
export function rowPlace(reading: Reading, at: Pick<Place, 'sheet' | 'row'>): string {
  const name = sheetName(reading, at.sheet);
  return name === null ? String(at.row) : `${name}, ${at.row}`;
}

/** The heading of a column, or its number where it has none. */
export function columnName(reading: Reading, at: { readonly sheet: number; readonly col: number }): string {
  const found = reading.columns.find(({ sheet, col }) => sheet === at.sheet && col === at.col);
  return found?.heading || `Column ${at.col}`;
}

/** The first place that a question is about: its column, or the cell that it quotes; null = none of the first rows. */
export function placeOf(reading: Reading, choice: Choice): Place | null {
  const column = reading.columns.find(({ heading }) => choice.column !== null && heading === choice.column);
  if (column) {
    const row = reading.firstRows.find(({ sheet, outcome }) => sheet === column.sheet && outcome !== 'not data');
    return { sheet: column.sheet, row: row?.row ?? reading.format.headingRow ?? 1, col: column.col };
  }
  const quoted = /“(.+?)”/.exec(choice.question)?.[1]?.trim();
  if (!quoted) return null;
  const sheet = reading.sheets.find(({ name }) => name === quoted);
  if (sheet) return { sheet: sheet.number, row: 1, col: null };
  for (const row of reading.firstRows) {
    const at = row.cells.findIndex((cell) => cell.trim() === quoted);
    if (at >= 0) return { sheet: row.sheet, row: row.row, col: at + 1 };
  }
  return null;
}
