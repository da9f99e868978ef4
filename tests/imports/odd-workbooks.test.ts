import { describe, expect, it } from 'vitest';
import { openFile } from '../../server/features/imports/sheets/open-file.ts';
import type { Sheet } from '../../server/features/imports/sheets/sheet.ts';
import { bytesOf } from '../../server/features/imports/text/bytes.ts';
import { type ZipStyle, zipOf } from './workbooks.ts';

const MAIN = 'http://schemas.openxmlformats.org/spreadsheetml/2006/main';
const RELATIONS = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships';
const BOOK = `<workbook xmlns="${MAIN}" xmlns:r="${RELATIONS}"><sheets><sheet name="A" sheetId="1" r:id="rId1"/></sheets></workbook>`;
const rels = (...entries: string[]) =>
  `<Relationships>${entries.map((one) => `<Relationship ${one}/>`).join('')}</Relationships>`;
const SHEET_RELS = rels(`Id="rId1" Type="${RELATIONS}/worksheet" Target="worksheets/sheet1.xml"`);
const rows = (inner: string, before = '') =>
  `<worksheet xmlns="${MAIN}">${before}<sheetData>${inner}</sheetData></worksheet>`;
const TWO = rows(
  '<row r="1"><c r="A1" t="inlineStr"><is><t>Car</t></is></c></row><row r="2"><c r="A2"><v>7</v></c></row>',
);

function sheetsOf(parts: Readonly<Record<string, string | Buffer>>, style: ZipStyle = {}): readonly Sheet[] {
  const usual = { 'xl/workbook.xml': BOOK, 'xl/_rels/workbook.xml.rels': SHEET_RELS };
  return openFile(bytesOf(zipOf({ ...usual, ...parts }, style))).sheets;
}
function rowsOf(sheet: Sheet | undefined): string[][] {
  const found: string[][] = [];
  sheet?.forEachRow((cells) => found.push(cells));
  return found;
}
const firstSheet = (xml: string | Buffer, parts: Readonly<Record<string, string>> = {}) =>
  sheetsOf({ 'xl/worksheets/sheet1.xml': xml, ...parts })[0] as Sheet;

describe('archives that hold a workbook', () => {
  it.each<[string, ZipStyle]>([
    ['packed', {}],
    ['stored as they are', { isStored: true }],
    ['written as a stream, sizes after each part', { isStreamed: true }],
    ['with sizes in 64 bits', { isWide: true }],
  ])('%s', (_, style) => {
    expect(rowsOf(sheetsOf({ 'xl/worksheets/sheet1.xml': TWO }, style)[0])).toEqual([['Car'], ['7']]);
  });

  it('with folders parted the other way, absolute places, and a workbook of another name', () => {
    const sheets = sheetsOf({
      'xl\\worksheets\\first.xml': TWO,
      'xl/_rels/workbook.xml.rels': rels(`Id="rId1" Type="${RELATIONS}/worksheet" Target="/xl/worksheets/first.xml"`),
    });
    expect(rowsOf(sheets[0])).toEqual([['Car'], ['7']]);
    const parts = {
      '[Content_Types].xml': '<Types/>',
      '_rels/.rels': rels(`Id="r" Type="${RELATIONS}/officeDocument" Target="/xl/workbook2.xml"`),
      'xl/workbook2.xml': BOOK,
      'xl/_rels/workbook2.xml.rels': SHEET_RELS,
      'xl/worksheets/sheet1.xml': TWO,
    };
    expect(rowsOf(openFile(bytesOf(zipOf(parts))).sheets[0])).toEqual([['Car'], ['7']]);
  });

  it('with a target that climbs out of it: nothing there is read', () => {
    const climbing = rels(`Id="rId1" Type="${RELATIONS}/worksheet" Target="../../../../etc/passwd"`);
    expect(sheetsOf({ 'xl/_rels/workbook.xml.rels': climbing, 'xl/worksheets/sheet1.xml': TWO })).toEqual([]);
  });
});

describe('how the XML of a sheet may be written', () => {
  const prefixed = TWO.replaceAll(/<(\/?)(\w)/g, '<$1x:$2').replace('xmlns=', 'xmlns:x=');
  it.each([
    ['with a prefix before every name', prefixed],
    ['in the strict family', TWO.replace(MAIN, 'http://purl.oclc.org/ooxml/spreadsheetml/main')],
    ['after a byte order mark', `\uFEFF<?xml version="1.0" encoding="UTF-8"?>\r\n${TWO}`],
    ['in UTF-16', Buffer.from(`\uFEFF${TWO}`, 'utf16le')],
    [
      'in single quotes, with blanks inside the tags',
      TWO.replaceAll('"', "'")
        .replaceAll(/<(\w+) r=/g, '<$1\n  r = ')
        .replaceAll('</c>', '</c >'),
    ],
    ['without places', TWO.replaceAll(/ r="\w+"/g, '')],
    ['with comments, instructions and CDATA', TWO.replace('Car', '<!-- > <c> --><![CDATA[C]]>ar<?x y?>')],
    ['with characters by number', TWO.replace('Car', '&#67;a&#x72;')],
  ])('%s', (_, xml) => {
    expect(rowsOf(firstSheet(xml))).toEqual([['Car'], ['7']]);
  });

  it.each([
    ['an entity of its own', '<t>&lol;</t>'],
    ['half a character', '<t>&#xD800;</t>'],
    ['a control character', '<t>\u001f</t>'],
    ['a bare ampersand', '<t>a & b</t>'],
    ['an attribute without quotes', '<t a=b/>'],
    ['a tag that never ends', '<t'],
    ['elements closed out of order', '<t><u></t></u>'],
  ])('%s is refused', (_, inner) => {
    expect(() => rowsOf(firstSheet(rows(inner)))).toThrow(/cut off or damaged/);
  });

  it('letters that are no UTF-8 are refused, not replaced', () => {
    expect(() => firstSheet(Buffer.from(TWO.replace('Car', 'T\xfcr'), 'latin1'))).toThrow(/cut off or damaged/);
  });

  it('a megabyte of it in pieces gives the same rows', () => {
    const many = Array.from(
      { length: 9000 },
      (_, i) => `<row><c t="inlineStr"><is><t>Türe &amp; ${i} 漆</t></is></c><c><v>${i}</v></c></row>`,
    );
    const read = rowsOf(firstSheet(rows(many.join('\n'))));
    expect(read).toHaveLength(9000);
    expect(read.every(([text, value], i) => text === `Türe & ${i} 漆` && value === String(i))).toBe(true);
  });
});

describe('what cells hold', () => {
  const styles = (...codes: string[]) => ({
    'xl/styles.xml': `<styleSheet><numFmts>${codes.map((code, i) => `<numFmt numFmtId="${200 + i}" formatCode="${code}"/>`).join('')}</numFmts><cellXfs>${codes.map((_, i) => `<xf numFmtId="${200 + i}"/>`).join('')}</cellXfs></styleSheet>`,
  });
  it('a number reads as its format means it', () => {
    const codes = [
      'General',
      'dd\\.mm\\.yyyy',
      '[h]:mm',
      '0.0%',
      '#,##0.00 [$€-407]',
      '&quot;$&quot;#,##0.00',
      '0.00 &quot;days&quot;',
      'Standard',
    ];
    const cells = codes.map((_, i) => `<c s="${i}"><v>44260.5</v></c>`).join('');
    expect(rowsOf(firstSheet(rows(`<row>${cells}</row>`), styles(...codes)))).toEqual([
      ['44260.5', '2021-03-05', '1062252:00', '4426050%', '€44260.5', '44260.5', '44260.5', '44260.5'],
    ]);
  });

  it('shared and rich texts, readings beside letters, escaped characters, booleans, errors, text made by a formula', () => {
    const shared = {
      'xl/sharedStrings.xml':
        '<sst><si><r><t>left </t></r><r><t>door</t></r><rPh><t>no</t></rPh></si><si><t>a_x000D_\nb_x005F_c</t></si></sst>',
    };
    const cells =
      '<c t="s"><v>0</v></c><c t="s"><v>1</v></c><c t="b"><v>1</v></c><c t="e"><v>#N/A</v></c><c t="str"><f>A1&amp;"x"</f><v>x</v></c><c t="str"><f>""</f><v></v></c><c t="d"><v>2021-03-05T00:00:00</v></c><c t="s"><v>99</v></c>';
    expect(rowsOf(firstSheet(rows(`<row>${cells}</row>`), shared))).toEqual([
      ['left door', 'a\nb_c', 'TRUE', '#N/A', 'x', '', '2021-03-05'],
    ]);
  });

  it('a formula without a stored value stays a formula, is never worked out, and is hinted at', () => {
    const sheet = firstSheet(
      rows(
        '<row r="3"><c r="B3"><f>SUM(B1:B2)</f></c><c r="C3"><f>1+1</f><v/></c><c r="D3"><f>1+1</f><v>2</v></c></row>',
      ),
    );
    expect(rowsOf(sheet).at(-1)).toEqual(['', '=SUM(B1:B2)', '=1+1', '2']);
    expect(sheet.hints).toMatchObject([
      { row: 3, col: 2, kind: 'formula without a value', text: expect.stringContaining('“=SUM(B1:B2)”') },
      { row: 3, col: 3, kind: 'formula without a value' },
    ]);
  });

  it('a figure from another file is taken as stored; the file is named and not opened', () => {
    const sheet = firstSheet(rows('<row><c r="A1"><f>[1]Costs!$B$4</f><v>12.5</v></c></row>'), {
      'xl/workbook.xml': BOOK.replace(
        '</workbook>',
        '<externalReferences><externalReference r:id="rId9"/></externalReferences></workbook>',
      ),
      'xl/_rels/workbook.xml.rels': rels(
        `Id="rId1" Type="${RELATIONS}/worksheet" Target="worksheets/sheet1.xml"`,
        `Id="rId9" Type="${RELATIONS}/externalLink" Target="externalLinks/externalLink1.xml"`,
      ),
      'xl/externalLinks/_rels/externalLink1.xml.rels': rels(
        `Id="rId1" Type="${RELATIONS}/externalLinkPath" Target="file:///C:/books/old%20costs.xlsx" TargetMode="External"`,
      ),
    });
    expect(rowsOf(sheet)).toEqual([['12.5']]);
    expect(sheet.hints).toMatchObject([
      { row: 1, col: 1, kind: 'link', text: expect.stringContaining('old costs.xlsx') },
    ]);
  });

  it('a talk on a cell is told once, not again by its stand-in', () => {
    const sheet = firstSheet(TWO, {
      'xl/worksheets/_rels/sheet1.xml.rels': rels(
        `Id="a" Type="${RELATIONS}/comments" Target="../comments1.xml"`,
        `Id="b" Type="http://schemas.microsoft.com/office/2017/10/relationships/threadedComment" Target="../threadedComments/t1.xml"`,
      ),
      'xl/comments1.xml':
        '<comments><commentList><comment ref="A2"><text><t>[Talk] open it elsewhere</t></text></comment><comment ref="A1"><text><r><t>old </t></r><r><t>note</t></r></text></comment></commentList></comments>',
      'xl/threadedComments/t1.xml':
        '<ThreadedComments><threadedComment ref="A2" id="1"><text>which lamp?</text></threadedComment><threadedComment ref="A2" id="2" parentId="1"><text>the left</text></threadedComment></ThreadedComments>',
    });
    expect(sheet.hints).toEqual([
      { row: 1, col: 1, kind: 'comment', text: 'old note' },
      { row: 2, col: 1, kind: 'comment', text: 'which lamp?\nthe left' },
    ]);
  });

  it('hidden rows side by side are one hint, hidden columns without cells none, and many alike are counted', () => {
    const hidden = rows(
      '<row r="1"><c><v>1</v></c></row><row r="2" hidden="1"><c><v>2</v></c></row><row r="3" hidden="true"><c><v>3</v></c></row>',
      '<cols><col min="2" max="16384" hidden="1"/></cols>',
    );
    expect(firstSheet(hidden).hints.map(({ text }) => text)).toEqual([expect.stringContaining('Rows 2 to 3')]);
    const many = Array.from({ length: 350 }, () => '<row><c><f>1</f></c></row>').join('');
    expect(firstSheet(rows(many)).hints).toHaveLength(101);
    expect(firstSheet(rows(many)).hints[0]).toMatchObject({ row: 0, col: 1, text: '250 more like these, not listed.' });
  });
});

describe('.ods cells', () => {
  const ods = (cells: string) => {
    const xml = `<office:document-content xmlns:office="o" xmlns:table="t" xmlns:text="x"><table:table table:name="A"><table:table-row>${cells}</table:table-row></table:table></office:document-content>`;
    return openFile(bytesOf(zipOf({ mimetype: 'x', 'content.xml': xml }))).sheets[0] as Sheet;
  };
  it('an error stored as 0, another currency, a formula without a value, a link, words drawn over the cell', () => {
    const sheet = ods(
      '<table:table-cell table:formula="of:=1/0" office:value-type="float" office:value="0"><text:p>Err:502</text:p></table:table-cell>' +
        '<table:table-cell office:value-type="currency" office:currency="EUR" office:value="12.5"><text:p>12,50 €</text:p></table:table-cell>' +
        '<table:table-cell table:formula="of:=SUM([.A1:.B1])"/>' +
        `<table:table-cell table:formula="of:='file:///home/a/costs.ods'#$Sheet1.A1" office:value-type="float" office:value="3"/>` +
        '<table:table-cell office:value-type="string"><draw:frame><text:p>over</text:p></draw:frame><text:p>a<text:s text:c="2"/>b<text:line-break/>c</text:p></table:table-cell>',
    );
    expect(rowsOf(sheet)).toEqual([['Err:502', 'EUR 12.5', '=SUM([.A1:.B1])', '3', 'a  b\nc']]);
    expect(sheet.hints.map(({ col, kind }) => [col, kind])).toEqual([
      [3, 'formula without a value'],
      [4, 'link'],
    ]);
  });
});
