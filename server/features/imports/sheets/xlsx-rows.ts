import { clockText, dayOfSerial, numberText } from './number-formats.ts';
import { readXml } from './xml.ts';
import type { CellStyle } from './xlsx.ts';
import type { Zip } from './zip.ts';

interface Known {
  readonly shared: readonly string[];
  readonly styles: readonly CellStyle[];
  readonly is1904: boolean;
}

const PLAIN: CellStyle = { kind: 'number', decimals: null };
const MOST_COLUMNS = 16_384;

/**
 * Reads the rows of one sheet of an .xlsx workbook, each cell as text: days as 2021-03-05, times as 3:30. false = there
 * is no such part.
 */
export function readSheetRows(
  zip: Zip,
  part: string,
  known: Known,
  add: (line: number, cells: readonly (string | undefined)[]) => void,
): boolean {
  let line = 0;
  let col = 0;
  let cells: (string | undefined)[] = [];
  let type = '';
  let style = PLAIN;
  let text = '';
  let isValue = false;
  return readXml(zip, part, {
    open(name, attributes) {
      if (name === 'c') {
        const place = columnOf(attributes.get('r'));
        col = place > 0 ? place : col + 1;
        type = attributes.get('t') ?? 'n';
        style = known.styles[Number(attributes.get('s') ?? 0)] ?? PLAIN;
        text = '';
      } else if (name === 'row') {
        line = Number(attributes.get('r') ?? line + 1);
        col = 0;
        cells = [];
      } else isValue = name === 'v' || (name === 't' && type === 'inlineStr');
    },
    close(name) {
      if (name === 'c') {
        if (text !== '' && col <= MOST_COLUMNS) cells[col - 1] = cellText(text, type, style, known);
      } else if (name === 'row') add(line, cells);
      else isValue = false;
    },
    text(piece) {
      if (isValue) text += piece;
    },
  });
}

/** `AB12` → 28; 0 = no such place. */
function columnOf(place: string | undefined): number {
  let column = 0;
  for (let at = 0; place !== undefined && at < place.length; at++) {
    const letter = place.charCodeAt(at) - 64;
    if (letter < 1 || letter > 26) break;
    column = column * 26 + letter;
  }
  return column;
}

function cellText(value: string, type: string, { kind, decimals }: CellStyle, known: Known): string {
  if (type === 's') return known.shared[Number(value)] ?? '';
  if (type === 'b') return value === '1' ? 'TRUE' : 'FALSE';
  if (type === 'd') return value.slice(0, 10);
  if (type !== 'n') return value;
  const number = Number(value);
  if (!Number.isFinite(number)) return value;
  if (kind === 'time' && number >= 0) return clockText(number);
  return (kind === 'day' ? dayOfSerial(number, known.is1904) : null) ?? numberText(number, decimals);
}
