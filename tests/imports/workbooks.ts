import { deflateRawSync } from 'node:zlib';

/** How an archive is written; left out = packed, its sizes before each part. */
export interface ZipStyle {
  /** Parts as they are, not packed. */
  readonly isStored?: boolean;
  /** Sizes after each part, as programs write that do not know them before. */
  readonly isStreamed?: boolean;
  /** Sizes and places in 64 bits. */
  readonly isWide?: boolean;
}

/** A zip archive of these parts, written by hand so that tests can make what no spreadsheet program would. */
export function zipOf(parts: Readonly<Record<string, string | Buffer>>, style: ZipStyle = {}): Buffer {
  const { isStored = false, isStreamed = false, isWide = false } = style;
  const bodies: Buffer[] = [];
  const entries: Buffer[] = [];
  let at = 0;
  for (const [name, content] of Object.entries(parts)) {
    const raw = Buffer.from(content);
    const packed = isStored ? raw : deflateRawSync(raw);
    const sizes = [packed.length, raw.length] as const;
    const local = Buffer.alloc(30);
    local.writeUInt32LE(0x04034b50, 0);
    local.writeUInt16LE(isStreamed ? 8 : 0, 6);
    local.writeUInt16LE(isStored ? 0 : 8, 8);
    if (!isStreamed) sizes.forEach((size, i) => local.writeUInt32LE(size, 18 + 4 * i));
    local.writeUInt16LE(Buffer.byteLength(name), 26);
    const after = Buffer.alloc(isStreamed ? 16 : 0);
    if (isStreamed) [0x08074b50, 0, ...sizes].forEach((value, i) => after.writeUInt32LE(value, 4 * i));
    const extra = isWide ? wideField(raw.length, packed.length, at) : Buffer.alloc(0);
    const entry = Buffer.alloc(46);
    entry.writeUInt32LE(0x02014b50, 0);
    entry.writeUInt16LE(isStored ? 0 : 8, 10);
    [...sizes].forEach((size, i) => entry.writeUInt32LE(isWide ? TOO_WIDE : size, 20 + 4 * i));
    entry.writeUInt16LE(Buffer.byteLength(name), 28);
    entry.writeUInt16LE(extra.length, 30);
    entry.writeUInt32LE(isWide ? TOO_WIDE : at, 42);
    bodies.push(local, Buffer.from(name), packed, after);
    entries.push(entry, Buffer.from(name), extra);
    at += local.length + Buffer.byteLength(name) + packed.length + after.length;
  }
  const directory = Buffer.concat(entries);
  const count = Object.keys(parts).length;
  return Buffer.concat([
    ...bodies,
    directory,
    ...(isWide ? wideEnd(count, at, directory.length) : []),
    endOf(count, at, directory.length, isWide),
  ]);
}

const TOO_WIDE = 0xffffffff;

function wideField(...values: number[]): Buffer {
  const field = Buffer.alloc(4 + 8 * values.length);
  field.writeUInt16LE(1, 0);
  field.writeUInt16LE(8 * values.length, 2);
  values.forEach((value, i) => field.writeBigUInt64LE(BigInt(value), 4 + 8 * i));
  return field;
}

function wideEnd(count: number, at: number, length: number): Buffer[] {
  const record = Buffer.alloc(56);
  record.writeUInt32LE(0x06064b50, 0);
  record.writeBigUInt64LE(44n, 4);
  [count, count, length, at].forEach((value, i) => record.writeBigUInt64LE(BigInt(value), 24 + 8 * i));
  const pointer = Buffer.alloc(20);
  pointer.writeUInt32LE(0x07064b50, 0);
  pointer.writeBigUInt64LE(BigInt(at + length), 8);
  return [record, pointer];
}

function endOf(count: number, at: number, length: number, isWide: boolean): Buffer {
  const end = Buffer.alloc(22);
  end.writeUInt32LE(0x06054b50, 0);
  end.writeUInt16LE(isWide ? 0xffff : count, 8);
  end.writeUInt16LE(isWide ? 0xffff : count, 10);
  end.writeUInt32LE(length, 12);
  end.writeUInt32LE(isWide ? TOO_WIDE : at, 16);
  return end;
}

/** A cell: text, a number, or a number under a format, such as a day (`{ serial: 44205, format: 14 }`). */
export type TestCell = string | number | null | { readonly serial: number; readonly format: number };
export type TestSheets = Readonly<Record<string, readonly (readonly TestCell[])[]>>;

const escaped = (text: string) => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('"', '&quot;');

/** An .xlsx workbook with these sheets. `is1904`: days counted as old Macs did. */
export function xlsxOf(sheets: TestSheets, is1904 = false): Buffer {
  const names = Object.keys(sheets);
  const formats = [0, ...new Set(Object.values(sheets).flat(2).flatMap(formatOf))];
  const parts: Record<string, string> = {
    'xl/workbook.xml': `<workbook xmlns:r="r"><workbookPr date1904="${is1904 ? 1 : 0}"/><sheets>${names
      .map((name, i) => `<sheet name="${escaped(name)}" sheetId="${i + 1}" r:id="r${i + 1}"/>`)
      .join('')}</sheets></workbook>`,
    'xl/_rels/workbook.xml.rels': `<Relationships>${names
      .map((_, i) => `<Relationship Id="r${i + 1}" Target="worksheets/sheet${i + 1}.xml"/>`)
      .join('')}</Relationships>`,
    'xl/styles.xml': `<styleSheet><cellXfs>${formats.map((id) => `<xf numFmtId="${id}"/>`).join('')}</cellXfs></styleSheet>`,
  };
  Object.values(sheets).forEach((rows, i) => {
    const xml = rows.map((row, r) => `<row r="${r + 1}">${row.map((cell) => cellXml(cell, formats)).join('')}</row>`);
    parts[`xl/worksheets/sheet${i + 1}.xml`] = `<worksheet><sheetData>${xml.join('')}</sheetData></worksheet>`;
  });
  return zipOf(parts);
}

const formatOf = (cell: TestCell) => (cell !== null && typeof cell === 'object' ? [cell.format] : []);

function cellXml(cell: TestCell, formats: readonly number[]): string {
  if (cell === null) return '<c/>';
  if (typeof cell === 'number') return `<c><v>${cell}</v></c>`;
  if (typeof cell === 'string') return `<c t="inlineStr"><is><t>${escaped(cell)}</t></is></c>`;
  return `<c s="${formats.indexOf(cell.format)}"><v>${cell.serial}</v></c>`;
}

/** An .ods workbook with these sheets. */
export function odsOf(sheets: Readonly<Record<string, readonly (readonly (string | number | null)[])[]>>): Buffer {
  const cell = (value: string | number | null) =>
    value === null
      ? '<table:table-cell/>'
      : typeof value === 'number'
        ? `<table:table-cell office:value-type="float" office:value="${value}"><text:p>shown</text:p></table:table-cell>`
        : `<table:table-cell office:value-type="string"><text:p>${escaped(value)}</text:p></table:table-cell>`;
  const tables = Object.entries(sheets).map(
    ([name, rows]) =>
      `<table:table table:name="${escaped(name)}">${rows
        .map(
          (row) =>
            `<table:table-row>${row.map(cell).join('')}<table:table-cell table:number-columns-repeated="16000"/></table:table-row>`,
        )
        .join(
          '',
        )}<table:table-row table:number-rows-repeated="1048000"><table:table-cell/></table:table-row></table:table>`,
  );
  return zipOf({
    mimetype: 'x',
    'content.xml': `<office:document xmlns:office="o" xmlns:table="t" xmlns:text="x">${tables.join('')}</office:document>`,
  });
}
