import { OdsCell, timesOf } from './ods-cell.ts';
import { type KeptSheet, type Sheet, sheetKeeper } from './sheet.ts';
import { readXml } from './xml.ts';
import type { Attributes } from './xml-scanner.ts';
import { damaged, locked } from './faulty.ts';
import type { Zip } from './zip.ts';

const MOST_COLUMNS = 1_000;
// A sheet is filled to its end with one empty row, repeated; only rows that hold something count.
const MOST_REPEATED = 10_000;
const LINK = /'file:[^']*?([^'/]+)'#/;

/** Reads every sheet of an .ods workbook: stored values only; no formula, link or macro is ever run. */
export function readOds(zip: Zip): Sheet[] {
  readXml(zip, 'META-INF/manifest.xml', {
    open(name) {
      if (name === 'encryption-data') throw locked();
    },
  });
  const hearer = new OdsHearer();
  if (!readXml(zip, 'content.xml', hearer)) throw damaged();
  return hearer.sheets;
}

class OdsHearer {
  readonly sheets: Sheet[] = [];
  private readonly keep = sheetKeeper();
  // Styles stand before the sheets that they hide.
  private readonly hiding = new Set<string>();
  private style = '';
  private sheet: KeptSheet | null = null;
  private column = 0;
  private line = 0;
  private rowTimes = 1;
  private isHiddenRow = false;
  private cells: (string | undefined)[] = [];
  private cell: OdsCell | null = null;

  open(name: string, attributes: Attributes): void {
    if (name === 'table-cell' || name === 'covered-table-cell') this.cell = new OdsCell(attributes);
    else if (this.cell) this.cell.open(name, attributes);
    else if (name === 'table-row') {
      this.rowTimes = timesOf(attributes.get('table:number-rows-repeated'));
      this.isHiddenRow = isHidden(attributes);
      this.cells = [];
    } else if (name === 'table-column') this.openColumns(attributes);
    else if (name === 'table') this.openSheet(attributes);
    else if (name === 'style') this.style = attributes.get('style:name') ?? '';
    else if (name === 'table-properties' && attributes.get('table:display') === 'false') this.hiding.add(this.style);
  }

  text(piece: string): void {
    this.cell?.hear(piece);
  }

  close(name: string): void {
    if (this.cell && (name === 'table-cell' || name === 'covered-table-cell')) this.closeCell(this.cell);
    else if (this.cell) this.cell.close(name);
    else if (name === 'table-row') this.closeRow();
    else if (name === 'table') this.sheet?.finish();
  }

  private openSheet(attributes: Attributes): void {
    const isHiddenSheet = this.hiding.has(attributes.get('table:style-name') ?? '');
    this.sheet = this.keep(this.sheets.length + 1, attributes.get('table:name') ?? '', isHiddenSheet);
    this.sheets.push(this.sheet.sheet);
    this.line = 0;
    this.column = 0;
  }

  private openColumns(attributes: Attributes): void {
    const times = timesOf(attributes.get('table:number-columns-repeated'));
    const last = Math.min(this.column + times, MOST_COLUMNS);
    if (isHidden(attributes)) for (let col = this.column; col < last; col++) this.sheet?.beside.hiddenColumn(col + 1);
    this.column += times;
  }

  private closeCell(cell: OdsCell): void {
    const col = this.cells.length + 1;
    const line = this.line + 1;
    const text = cell.content;
    const times = Math.min(cell.times, MOST_COLUMNS + 1);
    if (text === '') this.cells.length += times;
    else for (let i = 0; i < times; i++) this.cells.push(text);
    if (this.cells.length > 2 * MOST_COLUMNS) this.cells.length = lastFilled(this.cells);
    this.cell = null;
    if (cell.comment !== '') this.sheet?.beside.comment(line, col, cell.comment);
    if (cell.formula === undefined) return;
    if (cell.isWithoutValue) this.sheet?.beside.formula(line, col, text.slice(1));
    const linked = LINK.exec(cell.formula)?.[1];
    if (linked !== undefined) this.sheet?.beside.link(line, col, linked);
  }

  private closeRow(): void {
    const times = lastFilled(this.cells) > 0 ? Math.min(this.rowTimes, MOST_REPEATED) : 0;
    for (let i = 0; i < times; i++) this.sheet?.add(this.line + 1 + i, this.cells, this.isHiddenRow);
    this.line += this.rowTimes;
  }
}

// `collapse` is hidden by hand, `filter` by a filter.
const isHidden = (attributes: Attributes) => /collapse|filter/.test(attributes.get('table:visibility') ?? '');

function lastFilled(cells: readonly (string | undefined)[]): number {
  let end = cells.length;
  while (end > 0 && !cells[end - 1]) end--;
  return end;
}
