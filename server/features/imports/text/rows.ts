import Papa from 'papaparse';
import { FileRefusal } from '../refusal.ts';
import type { ByteSource } from './bytes.ts';
import { findDelimiter } from './delimiter.ts';
import { decode, type Encoding, findEncoding } from './encoding.ts';

/** What the rows of a text file are made of. */
export interface TextFormat {
  readonly encoding: Encoding;
  readonly delimiter: string;
  readonly hasNamedDelimiter: boolean;
}

/** One record: its cells, the physical line that it starts on (1 = the first), and whether its quotes are broken. */
export type OnRow = (cells: string[], line: number, isMalformed: boolean) => void;

const LONGEST_CELL = 1024 * 1024;
const MOST_CELLS = 1000;
// A broken quotation mark may take a line break in with it; more, and it has swallowed other rows.
const LONGEST_MALFORMED = 2;
// A text cell that would run as a formula is written with an apostrophe before it; that is not part of the text.
const GUARDED = /^'[=+\-@\t\r]/;

interface Parsed {
  readonly data: string[][];
  readonly errors: readonly { readonly row: number; readonly code: string }[];
  readonly meta: { readonly cursor: number };
}

/** Finds out how a file is written; throws a FileRefusal for what is no text. */
export function findFormat(source: ByteSource): TextFormat {
  const encoding = findEncoding(source);
  const [start = ''] = decode(source, encoding);
  const { delimiter, isNamed } = findDelimiter(start);
  return { encoding, delimiter, hasNamedDelimiter: isNamed };
}

/** Gives every record of the file in order. `onPart` hears the share of the file gone through, 0–1. */
export function forEachRow(
  source: ByteSource,
  format: TextFormat,
  onRow: OnRow,
  onPart?: (share: number) => void,
): void {
  const parser = new Papa.Parser({ delimiter: format.delimiter, newline: '\n', quoteChar: '"' });
  let rest = '';
  let line = 1;
  let done = 0;
  const take = (text: string, isLast: boolean) => {
    const { data, errors, meta } = parser.parse(text, 0, !isLast) as Parsed;
    refuseBroken(errors, data, line);
    const isPlain = !text.includes('"');
    const malformed = errors.length > 0 ? new Set(errors.map((error) => error.row)) : null;
    for (let i = 0; i < data.length; i++) {
      const cells = data[i] as string[];
      const start = line;
      line += isPlain ? 1 : 1 + lineBreaks(cells);
      if (cells.length > MOST_CELLS)
        throw new FileRefusal('too-wide', `Line ${start} has ${cells.length} cells; ${MOST_CELLS} is the most.`, start);
      if (isLast && i === data.length - 1 && cells.length === 1 && cells[0] === '') continue;
      if (malformed?.has(i) && line - start > LONGEST_MALFORMED) refuseOpen(start);
      unguard(cells);
      onRow(cells, start, malformed?.has(i) ?? false);
    }
    rest = isLast ? '' : text.slice(meta.cursor);
    if (rest.length > LONGEST_CELL) refuseLong(rest, line);
  };
  for (const piece of decode(source, format.encoding)) {
    // The line that only names the delimiter is none of the table.
    const isNaming = done === 0 && format.hasNamedDelimiter;
    if (isNaming) line = 2;
    take(rest + (isNaming ? piece.slice(piece.indexOf('\n') + 1) : piece), false);
    done += 65_536;
    onPart?.(Math.min(1, done / source.size));
  }
  take(rest, true);
}

function lineBreaks(cells: readonly string[]): number {
  let count = 0;
  for (const cell of cells) for (let at = cell.indexOf('\n'); at >= 0; at = cell.indexOf('\n', at + 1)) count++;
  return count;
}

function unguard(cells: string[]): void {
  for (let i = 0; i < cells.length; i++) {
    const cell = cells[i] as string;
    if (cell.charCodeAt(0) === 39 && GUARDED.test(cell)) cells[i] = cell.slice(1);
  }
}

function refuseBroken(errors: Parsed['errors'], data: string[][], line: number): void {
  const open = errors.find((error) => error.code === 'MissingQuotes');
  if (!open) return;
  const row = line + data.slice(0, open.row).reduce((sum, cells) => sum + 1 + lineBreaks(cells), 0);
  refuseOpen(row);
}

function refuseOpen(row: number): never {
  throw new FileRefusal(
    'unclosed-quote',
    `A quotation mark opened on line ${row} is never closed. Close it and bring the file in again.`,
    row,
  );
}

function refuseLong(rest: string, line: number): never {
  if (rest.includes('"')) {
    throw new FileRefusal(
      'unclosed-quote',
      `A quotation mark opened on line ${line} is not closed within a million characters.`,
      line,
    );
  }
  throw new FileRefusal('cell-too-long', `Line ${line} is longer than a million characters.`, line);
}
