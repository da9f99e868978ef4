import { numberReader, unescapedText } from './cell-text.ts';
import { type CellStyle, PLAIN_STYLE } from './number-formats.ts';
import type { KeptSheet } from './sheet.ts';
import { isYes, readXml } from './xml.ts';
import type { Attributes } from './xml-scanner.ts';
import type { Zip } from './zip.ts';

interface Known {
  readonly shared: readonly string[];
  readonly styles: readonly CellStyle[];
  readonly is1904: boolean;
  /** Names of the other files that formulas call `[1]`, `[2]` … */
  readonly links: readonly string[];
}

const MOST_COLUMNS = 16_384;

/**
 * Reads the rows of one sheet of an .xlsx workbook, each cell as text: days as 2021-03-05, times as 3:30; a formula
 * without a value as the formula. false = there is no such part.
 */
export function readSheetRows(zip: Zip, part: string, known: Known, sheet: KeptSheet): boolean {
  return readXml(zip, part, new RowHearer(known, sheet));
}

class RowHearer {
  private readonly known: Known;
  private readonly sheet: KeptSheet;
  private readonly numberText: ReturnType<typeof numberReader>;
  private line = 0;
  private isHidden = false;
  private cells: (string | undefined)[] = [];
  private col = 0;
  private type = 'n';
  private style = PLAIN_STYLE;
  private value: string | null = null;
  private formula: string | null = null;
  private hears: 'value' | 'formula' | null = null;
  private isBeside = false;

  constructor(known: Known, sheet: KeptSheet) {
    this.known = known;
    this.sheet = sheet;
    this.numberText = numberReader(known.is1904);
  }

  open(name: string, attributes: Attributes): void {
    if (name === 'c') this.openCell(attributes);
    else if (name === 'v' || (name === 't' && this.type === 'inlineStr' && !this.isBeside)) {
      this.value ??= '';
      this.hears = 'value';
    } else if (name === 'row') this.openRow(attributes);
    else if (name === 'f') {
      this.formula = '';
      this.hears = 'formula';
    } else if (name === 'rPh') this.isBeside = true;
    else if (name === 'col' && isYes(attributes.get('hidden'))) this.hideColumns(attributes);
  }

  text(piece: string): void {
    if (this.hears === 'value') this.value += piece;
    else if (this.hears === 'formula') this.formula += piece;
  }

  close(name: string): void {
    this.hears = null;
    if (name === 'c') this.closeCell();
    else if (name === 'row') this.sheet.add(this.line, this.cells, this.isHidden);
    else if (name === 'rPh') this.isBeside = false;
  }

  private openRow(attributes: Attributes): void {
    // Rows are numbered, or follow each other; a number that leads back is none.
    this.line = Math.max(Number(attributes.get('r')) || 0, this.line + 1);
    this.isHidden = isYes(attributes.get('hidden'));
    this.col = 0;
    this.cells = [];
  }

  private openCell(attributes: Attributes): void {
    const col = columnOf(attributes.get('r'));
    this.col = col > 0 ? col : this.col + 1;
    this.type = attributes.get('t') ?? 'n';
    const style = attributes.get('s');
    this.style = (style === undefined ? undefined : this.known.styles[Number(style)]) ?? PLAIN_STYLE;
    this.value = null;
    this.formula = null;
  }

  private closeCell(): void {
    const { value, formula, col } = this;
    if (col > MOST_COLUMNS) return;
    if (value !== null && value !== '') this.cells[col - 1] = this.cellText(value);
    if (formula !== null) this.heedFormula(formula);
    this.formula = null;
  }

  private heedFormula(formula: string): void {
    const { line, col } = this;
    const link = this.known.links[Number(/\[(\d+)\]/.exec(formula)?.[1]) - 1];
    if (link !== undefined) this.sheet.beside.link(line, col, link);
    const isStored = this.value !== null && (this.value !== '' || this.type === 'str');
    if (isStored) return;
    this.cells[col - 1] = `=${formula.slice(0, 200)}`;
    this.sheet.beside.formula(line, col, formula);
  }

  private cellText(value: string): string {
    switch (this.type) {
      case 'n':
        return this.numberText(value, this.style);
      case 's':
        return this.known.shared[Number(value)] ?? '';
      case 'b':
        return value === '1' ? 'TRUE' : 'FALSE';
      case 'd':
        return value.slice(0, 10);
      default:
        return unescapedText(value);
    }
  }

  private hideColumns(attributes: Attributes): void {
    const last = Math.min(Number(attributes.get('max')), MOST_COLUMNS);
    for (let col = Number(attributes.get('min')); col <= last; col++) this.sheet.beside.hiddenColumn(col);
  }
}

/** `AB12` → column 28, row 12; 0 = no such place. */
export function placeOf(place: string): { row: number; col: number } {
  return { col: columnOf(place), row: Number(/\d+$/.exec(place)?.[0] ?? 0) };
}

function columnOf(place: string | undefined): number {
  let column = 0;
  for (let at = 0; place !== undefined && at < place.length; at++) {
    const letter = place.charCodeAt(at) - 64;
    if (letter < 1 || letter > 26) break;
    column = column * 26 + letter;
  }
  return column;
}
