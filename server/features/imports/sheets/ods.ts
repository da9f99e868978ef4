import { type Sheet, type SheetKeeper, sheetKeeper } from './sheet.ts';
import { clockText } from './number-formats.ts';
import { readXml } from './xml.ts';
import type { Attributes } from './xml-scanner.ts';
import { damaged, locked, type Zip } from './zip.ts';

const MOST_COLUMNS = 1_000;
// A sheet is filled to its end with one empty row, repeated; only rows that hold something count.
const MOST_REPEATED = 10_000;

/** Reads every sheet of an .ods workbook: stored values only; no formula, link or macro is ever run. */
export function readOds(zip: Zip): Sheet[] {
  readXml(zip, 'META-INF/manifest.xml', {
    open(name) {
      if (name === 'encryption-data') throw locked();
    },
  });
  const sheets: Sheet[] = [];
  if (!readXml(zip, 'content.xml', sheetReader(sheetKeeper(), sheets))) throw damaged();
  return sheets;
}

function sheetReader(keep: SheetKeeper, sheets: Sheet[]) {
  // Styles stand before the sheets that they hide.
  const hidden = new Set<string>();
  let style = '';
  let current: ReturnType<SheetKeeper> | null = null;
  let line = 0;
  let rowTimes = 1;
  let cells: (string | undefined)[] = [];
  let cell: { readonly value: string | null; readonly times: number; text: string; paragraphs: number } | null = null;
  let besides = 0;
  return {
    open(name: string, attributes: Attributes) {
      if (name === 'style') style = attributes.get('style:name') ?? '';
      else if (name === 'table-properties' && attributes.get('table:display') === 'false') hidden.add(style);
      else if (name === 'table') {
        const isHidden = hidden.has(attributes.get('table:style-name') ?? '');
        current = keep(sheets.length + 1, attributes.get('table:name') ?? '', isHidden);
        sheets.push(current.sheet);
        line = 0;
      } else if (name === 'table-row') {
        rowTimes = times(attributes.get('table:number-rows-repeated'));
        cells = [];
      } else if (name === 'table-cell' || name === 'covered-table-cell') {
        const repeated = times(attributes.get('table:number-columns-repeated'));
        cell = { value: storedValue(attributes), times: repeated, text: '', paragraphs: 0 };
      } else if (name === 'annotation') besides++;
      else if (name === 'p' && cell && besides === 0 && cell.paragraphs++ > 0) cell.text += '\n';
      else if (name === 's' && cell && besides === 0)
        cell.text += ' '.repeat(Math.min(100, times(attributes.get('text:c'))));
    },
    text(piece: string) {
      if (cell && besides === 0 && cell.paragraphs > 0) cell.text += piece;
    },
    close(name: string) {
      if (name === 'annotation') besides--;
      else if (cell && (name === 'table-cell' || name === 'covered-table-cell')) {
        const text = cell.value ?? cell.text;
        if (text === '') cells.length += Math.min(cell.times, MOST_COLUMNS + 1);
        else for (let i = 0; i < Math.min(cell.times, MOST_COLUMNS + 1); i++) cells.push(text);
        if (cells.length > 2 * MOST_COLUMNS) cells.length = lastFilled(cells);
        cell = null;
      } else if (name === 'table-row') {
        const isFilled = lastFilled(cells) > 0;
        for (let i = 0; isFilled && i < Math.min(rowTimes, MOST_REPEATED); i++) current?.add(line + 1 + i, cells);
        line += rowTimes;
      }
    },
  };
}

function lastFilled(cells: readonly (string | undefined)[]): number {
  let end = cells.length;
  while (end > 0 && !cells[end - 1]) end--;
  return end;
}

const times = (attribute: string | undefined) => Math.max(1, Math.min(1_048_576, Number(attribute ?? 1) || 1));

/** The value that a cell stores beside what it shows; null = it stores none, and its text is the value. */
function storedValue(attributes: Attributes): string | null {
  const type = attributes.get('office:value-type');
  if (type === 'date') return attributes.get('office:date-value')?.slice(0, 10) ?? null;
  if (type === 'boolean') return attributes.get('office:boolean-value')?.toUpperCase() ?? null;
  if (type === 'time') return timeText(attributes.get('office:time-value') ?? '');
  if (type !== 'float' && type !== 'currency') return null;
  const value = Number(attributes.get('office:value'));
  return Number.isFinite(value) ? String(Number(value.toPrecision(14))) : null;
}

/** `PT03H30M00S` → `3:30`. */
function timeText(text: string): string | null {
  const parts = /^PT(\d+)H(\d+)M(\d+)/.exec(text);
  return parts ? clockText((Number(parts[1]) * 60 + Number(parts[2])) / 1440) : null;
}
