import type { Hint } from '#shared/contracts/import-beside.ts';
import { FileRefusal } from '../refusal.ts';
import type { OnRow } from '../text/rows.ts';
import { hintKeeper } from './hints.ts';

/** One sheet of a file; a text file has one. Its rows can be gone through as often as needed. */
export interface Sheet {
  /** 1 = the first sheet of the file. */
  readonly number: number;
  /** Which of the files of an import it stands in; left out = the first. */
  readonly file?: number;
  /** null = a text file: its sheet has no name. */
  readonly name: string | null;
  readonly isHidden: boolean;
  /** A row that a person put right, as it stood in the file; undefined = nobody touched it. */
  rawRow?(line: number): readonly string[] | undefined;
  /** A row without what was put into it from the rows above; left out = nothing was. */
  asGiven?(line: number, cells: readonly string[]): readonly string[];
  /** Rows that a person left out: they are given as blank. */
  readonly leftOut?: ReadonlySet<number>;
  /** What stands beside its cells: comments, hidden rows and columns, formulas without a value. */
  readonly hints: readonly SheetHint[];
  /** Gives every row in order; `onPart` hears the share gone through, 0–1. */
  forEachRow(onRow: OnRow, onPart?: (share: number) => void): void;
}

export type SheetHint = Omit<Hint, 'sheet'>;

/** The hints of all sheets, as a reading tells them. */
export const hintsOf = (sheets: readonly Sheet[]): Hint[] =>
  sheets.flatMap(({ number, hints }) => hints.map((hint) => ({ sheet: number, ...hint })));

// A character that no cell can hold: XML forbids it.
const BETWEEN = '\u001f';
const MOST_CELLS = 1000;
const MOST_ROWS = 1_048_576;
const LONGEST_CELL = 1024 * 1024;
// What all cells together may hold: workbooks are kept in memory while they are read.
const MOST_TEXT = 96 * 1024 * 1024;
const LONGEST_GAP = 50;

/** Keeps the rows of a workbook's sheets: each as one text, which is a fifth of what arrays of cells would take. */
export function sheetKeeper() {
  let size = 0;
  return (number: number, name: string, isHidden: boolean) => {
    const lines: number[] = [];
    const texts: string[] = [];
    const beside = hintKeeper();
    let widest = 0;
    /** Adds a row; rows come in order. `cells` may have holes. */
    function add(line: number, cells: readonly (string | undefined)[], isHiddenRow = false): void {
      let end = cells.length;
      while (end > 0 && !cells[end - 1]) end--;
      if (end === 0) return;
      if (end > MOST_CELLS)
        throw new FileRefusal(
          'too-wide',
          `Row ${line} of “${name}” has ${end} cells; ${MOST_CELLS} is the most.`,
          line,
        );
      if (line > MOST_ROWS) throw new FileRefusal('too-large', `“${name}” has more rows than a sheet can hold.`);
      let length = end;
      for (let at = 0; at < end; at++) length += cells[at]?.length ?? 0;
      size += length;
      if (length > LONGEST_CELL && cells.some((cell) => (cell?.length ?? 0) > LONGEST_CELL))
        throw new FileRefusal(
          'cell-too-long',
          `A cell of row ${line} of “${name}” holds more than a million characters.`,
          line,
        );
      if (size > MOST_TEXT)
        throw new FileRefusal('too-large', 'This workbook holds more text than can be read at once.');
      beside.row(line, isHiddenRow);
      if (end > widest) widest = end;
      lines.push(line);
      texts.push((end < cells.length ? cells.slice(0, end) : cells).join(BETWEEN));
    }
    const sheet: Sheet = {
      number,
      name,
      isHidden,
      hints: beside.hints,
      forEachRow(onRow, onPart) {
        let before = 0;
        for (let i = 0; i < lines.length; i++) {
          const line = lines[i] as number;
          if (line - before <= LONGEST_GAP) for (let gap = before + 1; gap < line; gap++) onRow([], gap, false);
          onRow((texts[i] as string).split(BETWEEN), line, false);
          if (i % 1000 === 0) onPart?.(i / lines.length);
          before = line;
        }
      },
    };
    return { add, beside, sheet, finish: () => beside.finish(widest) };
  };
}
export type SheetKeeper = ReturnType<typeof sheetKeeper>;
/** One sheet while it is read. */
export type KeptSheet = ReturnType<SheetKeeper>;
