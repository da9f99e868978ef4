import { FileRefusal } from '../refusal.ts';
import { unescapedText } from './cell-text.ts';
import { type CellStyle, cellStyle } from './number-formats.ts';
import { type Sheet, sheetKeeper } from './sheet.ts';
import { readComments } from './xlsx-comments.ts';
import { type Relation, relationsOf } from './xlsx-relations.ts';
import { readSheetRows } from './xlsx-rows.ts';
import { isYes, readXml } from './xml.ts';
import { damaged } from './faulty.ts';
import type { Zip } from './zip.ts';

interface Book {
  readonly sheets: readonly SheetEntry[];
  readonly is1904: boolean;
  /** Relations to the other files that formulas name by number, in that order. */
  readonly links: readonly string[];
}

interface SheetEntry {
  readonly name: string;
  readonly relation: string;
  readonly isHidden: boolean;
}

const MOST_SHARED = 64 * 1024 * 1024;

/** Reads every sheet of an .xlsx workbook: stored values only; no formula, link or macro is ever run. */
export function readXlsx(zip: Zip, part: string): Sheet[] {
  const relations = relationsOf(zip, part);
  const book = readBook(zip, part);
  const partOf = (kind: string, usual: string) => relations.find((one) => one.kind === kind)?.target ?? usual;
  const known = {
    shared: sharedTexts(zip, partOf('sharedStrings', 'xl/sharedStrings.xml')),
    styles: cellStyles(zip, partOf('styles', 'xl/styles.xml')),
    is1904: book.is1904,
    links: book.links.map((id) => linkedFile(zip, relations, id)),
  };
  const keep = sheetKeeper();
  return book.sheets.flatMap(({ name, relation, isHidden }, place): Sheet[] => {
    const found = relations.find(({ id, isOutside }) => id === relation && !isOutside);
    const own = found?.target ?? `xl/worksheets/sheet${place + 1}.xml`;
    const kept = keep(place + 1, name, isHidden);
    if (!readSheetRows(zip, own, known, kept)) return [];
    readComments(zip, relationsOf(zip, own), kept.beside);
    kept.finish();
    return [kept.sheet];
  });
}

function readBook(zip: Zip, part: string): Book {
  const sheets: SheetEntry[] = [];
  const links: string[] = [];
  let is1904 = false;
  const isThere = readXml(zip, part, {
    open(name, attributes) {
      if (name === 'workbookPr') is1904 = isYes(attributes.get('date1904'));
      else if (name === 'externalReference') links.push(attributes.get('id') ?? '');
      else if (name === 'sheet') {
        sheets.push({
          name: attributes.get('name') ?? '',
          relation: attributes.get('id') ?? '',
          isHidden: /hidden/i.test(attributes.get('state') ?? ''),
        });
      }
    },
  });
  if (!isThere) throw damaged();
  return { sheets, is1904, links };
}

/** The name of another file that formulas point to. It is never opened. */
function linkedFile(zip: Zip, relations: readonly Relation[], id: string): string {
  const part = relations.find((one) => one.id === id)?.target ?? '';
  const outside = relationsOf(zip, part).find(({ isOutside }) => isOutside)?.target ?? '';
  return outside.replaceAll('%20', ' ').split(/[/\\]/).at(-1) || 'unknown';
}

/** The texts that cells refer to by number. Readings beside foreign letters are left out. */
function sharedTexts(zip: Zip, part: string): string[] {
  const texts: string[] = [];
  let text = '';
  let size = 0;
  let isText = false;
  let isBeside = false;
  readXml(zip, part, {
    open(name) {
      if (name === 'si') text = '';
      isText = name === 't' && !isBeside;
      if (name === 'rPh') isBeside = true;
    },
    close(name) {
      if (name === 'si') {
        size += text.length;
        if (size > MOST_SHARED)
          throw new FileRefusal('too-large', 'This workbook holds more text than can be read at once.');
        texts.push(unescapedText(text));
      }
      if (name === 'rPh') isBeside = false;
      isText = false;
    },
    text(piece) {
      if (isText) text += piece;
    },
  });
  return texts;
}

function cellStyles(zip: Zip, part: string): CellStyle[] {
  const styles: CellStyle[] = [];
  const codes = new Map<number, string>();
  let isCells = false;
  readXml(zip, part, {
    open(name, attributes) {
      if (name === 'numFmt') codes.set(Number(attributes.get('numFmtId')), attributes.get('formatCode') ?? '');
      if (name === 'cellXfs') isCells = true;
      if (name !== 'xf' || !isCells) return;
      const id = Number(attributes.get('numFmtId') ?? 0);
      styles.push(cellStyle(id, codes.get(id)));
    },
    close(name) {
      if (name === 'cellXfs') isCells = false;
    },
  });
  return styles;
}
