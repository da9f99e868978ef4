import path from 'node:path';
import type { Sheet } from './sheet.ts';
import { sheetKeeper } from './sheet.ts';
import { decimalsOf, type NumberKind, numberKind } from './number-formats.ts';
import { readXml } from './xml.ts';
import { readSheetRows } from './xlsx-rows.ts';
import { damaged, type Zip } from './zip.ts';

/** What the cells of one style hold. */
export interface CellStyle {
  readonly kind: NumberKind;
  readonly decimals: number | null;
}

interface SheetEntry {
  readonly name: string;
  readonly part: string;
  readonly isHidden: boolean;
}

const BOOK = 'xl/workbook.xml';

/** Reads every sheet of an .xlsx workbook: stored values only; no formula, link or macro is ever run. */
export function readXlsx(zip: Zip): Sheet[] {
  const { entries, is1904 } = sheetEntries(zip);
  const shared = sharedTexts(zip);
  const styles = cellStyles(zip);
  const keep = sheetKeeper();
  return entries.flatMap(({ name, part, isHidden }, place): Sheet[] => {
    const { add, sheet } = keep(place + 1, name, isHidden);
    return readSheetRows(zip, part, { shared, styles, is1904 }, add) ? [sheet] : [];
  });
}

function sheetEntries(zip: Zip): { entries: SheetEntry[]; is1904: boolean } {
  const targets = new Map<string, string>();
  readXml(zip, 'xl/_rels/workbook.xml.rels', {
    open(name, attributes) {
      // A link out of the workbook is never followed.
      if (name === 'Relationship' && attributes.get('TargetMode') !== 'External')
        targets.set(attributes.get('Id') ?? '', placeOf(attributes.get('Target') ?? ''));
    },
  });
  const entries: SheetEntry[] = [];
  let is1904 = false;
  const isBook = readXml(zip, BOOK, {
    open(name, attributes) {
      if (name === 'workbookPr') is1904 = /^(?:1|true)$/.test(attributes.get('date1904') ?? '');
      if (name !== 'sheet') return;
      const part = targets.get(attributes.get('r:id') ?? '') ?? `xl/worksheets/sheet${entries.length + 1}.xml`;
      entries.push({
        name: attributes.get('name') ?? '',
        part,
        isHidden: /hidden/i.test(attributes.get('state') ?? ''),
      });
    },
  });
  if (!isBook) throw damaged();
  return { entries, is1904 };
}

const placeOf = (target: string) => (target.startsWith('/') ? target.slice(1) : path.posix.normalize(`xl/${target}`));

/** The texts that cells refer to by number. Readings beside foreign letters are left out. */
function sharedTexts(zip: Zip): string[] {
  const texts: string[] = [];
  let text = '';
  let isText = false;
  let isBeside = false;
  readXml(zip, 'xl/sharedStrings.xml', {
    open(name) {
      if (name === 'si') text = '';
      isText = name === 't' && !isBeside;
      if (name === 'rPh') isBeside = true;
    },
    close(name) {
      if (name === 'si') texts.push(text);
      if (name === 'rPh') isBeside = false;
      isText = false;
    },
    text(piece) {
      if (isText) text += piece;
    },
  });
  return texts;
}

function cellStyles(zip: Zip): CellStyle[] {
  const styles: CellStyle[] = [];
  const codes = new Map<number, string>();
  let isCells = false;
  readXml(zip, 'xl/styles.xml', {
    open(name, attributes) {
      if (name === 'numFmt') codes.set(Number(attributes.get('numFmtId')), attributes.get('formatCode') ?? '');
      if (name === 'cellXfs') isCells = true;
      if (name !== 'xf' || !isCells) return;
      const id = Number(attributes.get('numFmtId') ?? 0);
      styles.push({ kind: numberKind(id, codes.get(id)), decimals: decimalsOf(codes.get(id), id) });
    },
    close(name) {
      if (name === 'cellXfs') isCells = false;
    },
  });
  return styles;
}
