import { FileRefusal } from '../refusal.ts';
import { allBytes, type ByteSource } from '../text/bytes.ts';
import { findFormat, forEachRow, type TextFormat } from '../text/rows.ts';
import { readOds } from './ods.ts';
import type { Sheet } from './sheet.ts';
import { readXlsx } from './xlsx.ts';
import { bookPart } from './xlsx-relations.ts';
import { openZip } from './zip.ts';

/** A file as sheets of rows, whatever it was written as. */
export interface OpenFile {
  /** How it is written: an encoding, or `.xlsx`, `.ods`. */
  readonly encoding: string;
  /** Between the cells of a text; '' for a workbook. */
  readonly delimiter: string;
  readonly sheets: readonly Sheet[];
}

const MOST_WORKBOOK = 50 * 1024 * 1024;

/** Opens text or a workbook, by its bytes and not by its name. Throws a FileRefusal for everything else. */
export function openFile(source: ByteSource): OpenFile {
  if (!isZip(source)) return openText(source, findFormat(source));
  if (source.size > MOST_WORKBOOK) {
    throw new FileRefusal('too-large', 'A workbook may have 50 MB at most. Save the sheet as CSV and bring that in.');
  }
  const zip = openZip(allBytes(source));
  const book = bookPart(zip);
  if (book !== null) return { encoding: '.xlsx', delimiter: '', sheets: readXlsx(zip, book) };
  if (zip.has('content.xml')) return { encoding: '.ods', delimiter: '', sheets: readOds(zip) };
  throw new FileRefusal('not-text', otherZip(zip.names));
}

function isZip(source: ByteSource): boolean {
  const [head] = source.chunks();
  return head?.toString('hex', 0, 4) === '504b0304';
}

function openText(source: ByteSource, format: TextFormat): OpenFile {
  const { encoding, delimiter } = format;
  const sheet: Sheet = {
    number: 1,
    name: null,
    isHidden: false,
    hints: [],
    forEachRow: (onRow, onPart) => forEachRow(source, format, onRow, onPart),
  };
  return { encoding, delimiter, sheets: [sheet] };
}

function otherZip(names: readonly string[]): string {
  if (names.includes('xl/workbook.bin')) {
    return 'This is a binary workbook. Save it as .xlsx or CSV in your spreadsheet program and bring that in.';
  }
  return names.some((name) => name.startsWith('word/') || name.startsWith('ppt/'))
    ? 'This is a text document or a slide show, no spreadsheet.'
    : 'This is an archive. Unpack it first, then bring in the spreadsheet inside.';
}
