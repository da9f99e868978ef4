import { addDays, dayNumber } from '#shared/day.ts';
import { zipOf } from '../imports/workbooks.ts';
import { randomFrom } from './invent.ts';

type Cell = string | number;
const HEADINGS = [
  'Date',
  'Vehicle',
  'Category',
  'Details',
  'Planned?',
  'Amount',
  'Vendor',
  'Invoice',
  'Qty',
  'Each',
  'Paid by',
  'Notes',
];
const KINDS = ['parts', 'paint', 'towing', 'fees', 'supplies', 'tires', 'glass'];
const FIRST_DAY = '2020-06-18';
const FIRST_1900 = dayNumber('1899-12-30');

/** A ledger of this many rows and twelve columns as every kind of file that it may come in; the day is the first cell. */
export function ledgerFiles(count: number) {
  const random = randomFrom(5);
  const rows = Array.from({ length: count }, (_, i): Cell[] => {
    const quantity = 1 + Math.floor(random() * 4);
    const each = Math.floor(random() * 40_000) / 100;
    const tag = `R-${String(1 + (i % 900)).padStart(4, '0')}`;
    return [
      addDays(FIRST_DAY, Math.floor(random() * 900)),
      tag,
      KINDS[i % KINDS.length] ?? '',
      `bill ${i}`,
      i % 9 ? 'yes' : 'no',
      Math.round(quantity * each * 100) / 100,
      `Vendor ${i % 60}`,
      `INV-${100_000 + i}`,
      quantity,
      each,
      i % 2 ? 'card' : 'cash',
      i % 5 ? '' : 'see note, box 3',
    ];
  });
  return {
    csv: [HEADINGS, ...rows].map((row) => row.map((cell) => quoted(String(cell))).join(',')).join('\n'),
    shared: sharedBook(rows),
    inline: xlsx(sheetXml(rows, (text) => `t="inlineStr"><is><t>${text}</t></is></c>`)),
    ods: odsBook(rows),
  };
}

const quoted = (text: string) => (text.includes(',') ? `"${text}"` : text);

function sharedBook(rows: readonly Cell[][]): Buffer {
  const places = new Map<string, number>();
  const sheet = sheetXml(rows, (text) => {
    const place = places.get(text) ?? places.size;
    places.set(text, place);
    return `t="s"><v>${place}</v></c>`;
  });
  const texts = [...places.keys()].map((text) => `<si><t>${text}</t></si>`);
  return xlsx(sheet, { 'xl/sharedStrings.xml': `<sst>${texts.join('')}</sst>` });
}

function sheetXml(rows: readonly Cell[][], textCell: (text: string) => string): string {
  const cellXml = (cell: Cell, place: string, col: number, isHeading: boolean) => {
    if (cell === '') return '';
    if (col === 0 && !isHeading) return `<c r="${place}" s="1"><v>${dayNumber(String(cell)) - FIRST_1900}</v></c>`;
    return typeof cell === 'number' ? `<c r="${place}" s="2"><v>${cell}</v></c>` : `<c r="${place}" ${textCell(cell)}`;
  };
  const lines = [HEADINGS, ...rows].map((row, at) => {
    const cells = row.map((cell, col) => cellXml(cell, `${String.fromCharCode(65 + col)}${at + 1}`, col, at === 0));
    return `<row r="${at + 1}" spans="1:12">${cells.join('')}</row>`;
  });
  return `<worksheet><sheetData>${lines.join('')}</sheetData></worksheet>`;
}

function xlsx(sheet: string, parts: Readonly<Record<string, string>> = {}): Buffer {
  return zipOf({
    'xl/workbook.xml': '<workbook><sheets><sheet name="Ledger"/></sheets></workbook>',
    'xl/styles.xml':
      '<styleSheet><cellXfs><xf numFmtId="0"/><xf numFmtId="14"/><xf numFmtId="4"/></cellXfs></styleSheet>',
    'xl/worksheets/sheet1.xml': sheet,
    ...parts,
  });
}

function odsBook(rows: readonly Cell[][]): Buffer {
  const cellXml = (cell: Cell, col: number, isHeading: boolean) => {
    if (cell === '') return '<table:table-cell/>';
    const kind =
      col === 0 && !isHeading
        ? `office:value-type="date" office:date-value="${cell}" calcext:value-type="date"`
        : typeof cell === 'number'
          ? `office:value-type="float" office:value="${cell}" calcext:value-type="float"`
          : 'office:value-type="string" calcext:value-type="string"';
    return `<table:table-cell table:style-name="ce1" ${kind}><text:p>${cell}</text:p></table:table-cell>`;
  };
  const lines = [HEADINGS, ...rows].map(
    (row, at) =>
      `<table:table-row table:style-name="ro1">${row.map((cell, col) => cellXml(cell, col, at === 0)).join('')}</table:table-row>`,
  );
  return zipOf({
    mimetype: 'x',
    'content.xml': `<office:document xmlns:office="o" xmlns:table="t" xmlns:text="x" xmlns:calcext="c"><table:table table:name="Ledger">${lines.join('')}</table:table></office:document>`,
  });
}
