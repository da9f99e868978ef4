import { describe, expect, it } from 'vitest';
import { zipOf } from '../imports/workbooks.ts';
import { type Member, testApi } from '../support/api.ts';
import { booked, expenseList, uploaded } from './imports-support.ts';

const BOOK = '<workbook><sheets><sheet name="A"/></sheets></workbook>';
const LAUGHS = `<!DOCTYPE a [<!ENTITY a "lol">${'bcdefghij'.replace(/./g, (name) => `<!ENTITY ${name} "${`&${String.fromCharCode(name.charCodeAt(0) - 1)};`.repeat(10)}">`)}]><worksheet><t>&j;</t></worksheet>`;
const MEGABYTE = 1024 * 1024;
const blanks = (megabytes: number) => Buffer.alloc(megabytes * MEGABYTE, 32);
const xlsx = (sheet: string | Buffer, parts: Readonly<Record<string, string | Buffer>> = {}) =>
  zipOf({ 'xl/workbook.xml': BOOK, 'xl/worksheets/sheet1.xml': sheet, ...parts });
const sheetOf = (inner: string) => `<worksheet><sheetData>${inner}</sheetData></worksheet>`;

/** An archive whose parts all lie on the same bytes: each is small, together they unpack without end. */
function overlapping(): Buffer {
  const names = Array.from({ length: 50 }, (_, i) => `xl/worksheets/sheet${i + 1}.xml`);
  const one = zipOf({ a: blanks(4) });
  const entryAt = one.readUInt32LE(one.length - 6);
  const entries = names.map((name) => {
    const entry = Buffer.from(one.subarray(entryAt, entryAt + 46));
    entry.writeUInt16LE(name.length, 28);
    return Buffer.concat([entry, Buffer.from(name)]);
  });
  const directory = Buffer.concat(entries);
  const end = Buffer.from(one.subarray(one.length - 22));
  end.writeUInt16LE(names.length, 8);
  end.writeUInt16LE(names.length, 10);
  end.writeUInt32LE(directory.length, 12);
  return Buffer.concat([one.subarray(0, entryAt), directory, end]);
}

/** A sheet that says it takes a hundred bytes, and takes eighty megabytes. */
function lying(): Buffer {
  const bytes = xlsx(Buffer.concat([Buffer.from('<worksheet>'), blanks(80)]));
  for (let at = bytes.indexOf('PK\x01\x02'); at >= 0; at = bytes.indexOf('PK\x01\x02', at + 4))
    bytes.writeUInt32LE(100, at + 24);
  return bytes;
}

async function nothingSaved(member: Member) {
  for (const url of ['/api/rebuilds', '/api/entries']) expect((await member.get(url)).body.rows).toEqual([]);
}

describe('files made to harm', () => {
  it.each<[string, Buffer | string, RegExp]>([
    [
      'blanks that unpack to 80 MB',
      xlsx(Buffer.concat([Buffer.from('<worksheet>'), blanks(80)])),
      /larger than anything/,
    ],
    ['a size that lies', lying(), /larger than anything/],
    ['parts that share their bytes', overlapping(), /damaged/],
    ['an archive in an archive', zipOf({ 'a.zip': zipOf({ 'b.zip': zipOf({ c: blanks(4) }) }) }), /archive/],
    ['entities in entities', xlsx(LAUGHS), /document type/],
    [
      'an entity that names a file',
      xlsx('<!DOCTYPE a [<!ENTITY b SYSTEM "file:///etc/passwd">]><worksheet><t>&b;</t></worksheet>'),
      /document type/,
    ],
    ['elements without end inside each other', xlsx('<a>'.repeat(100_000)), /damaged/],
    ['a tag of three megabytes', xlsx(`<worksheet a="${'x'.repeat(3 * MEGABYTE)}"/>`), /holds anything/],
    [
      'a shared text that every cell repeats',
      xlsx(sheetOf(`<row>${'<c t="s"><v>0</v></c>'.repeat(900)}</row>`), {
        'xl/sharedStrings.xml': `<sst><si><t>${'x'.repeat(900_000)}</t></si></sst>`,
      }),
      /more text than/,
    ],
    [
      'a cell of a million and a half letters',
      xlsx(sheetOf(`<row><c t="str"><v>${'x'.repeat(1.5 * MEGABYTE)}</v></c></row>`)),
      /million/,
    ],
    ['a row of two thousand cells', xlsx(sheetOf(`<row>${'<c><v>1</v></c>'.repeat(2000)}</row>`)), /2000 cells/],
    ['a row beyond the last', xlsx(sheetOf('<row r="99999999"><c><v>1</v></c></row>')), /more rows than/],
    ['a text of two thousand columns', `${'a,'.repeat(2000)}\n${'1,'.repeat(2000)}`, /cells; 1000/],
    ['a line of two megabytes', `a;b\n${'x'.repeat(2 * MEGABYTE)}`, /million/],
    ['a quotation mark that swallows the file', `a,b\n"${'x,1\n'.repeat(400_000)}`, /quotation mark/],
  ])('%s: refused with the reason, and nothing is saved', async (_, bytes, reason) => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await uploaded(ada, bytes);
    expect(read.state).toBe('refused');
    expect(read.refusal).toMatch(reason);
    expect((await ada.post(`/api/imports/${read.id}/commit`)).status).toBe(409);
    await nothingSaved(ada);
  });

  it('names that climb out of their folder are only text', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const file = expenseList('2020-01-22,13 F-150,Parts,door,10.00');
    const read = await uploaded(ada, file, '../../../etc/cron.d/x.csv');
    expect(read).toMatchObject({ state: 'ready', fileName: expect.not.stringContaining('/') });
    const climbing = zipOf({
      '../../../tmp/evil.xml': 'x',
      'xl/workbook.xml': BOOK,
      'xl/worksheets/sheet1.xml': sheetOf('<row><c><v>1</v></c></row>'),
    });
    expect((await uploaded(ada, climbing)).state).toBe('refused');
  });

  it('a million empty rows and a hidden tail of columns cost nothing, and the data before them comes in', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const cell = (text: string) => `<c t="str"><v>${text}</v></c>`;
    const row = (...cells: string[]) => `<row>${cells.map(cell).join('')}</row>`;
    const empty = Array.from({ length: 1_000_000 }, (_, i) => `<row r="${i + 3}"/>`).join('');
    const read = await uploaded(
      ada,
      xlsx(sheetOf(row('Date', 'Car', 'What for', 'Paid') + row('2020-01-02', '13 F-150', 'Parts', '10.00') + empty)),
    );
    expect(read.reading?.control).toMatchObject({ rowsRead: 2, costCents: 1000 });
  }, 30_000);

  it('formulas that would run in a spreadsheet are text here, and leave as text', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const done = await booked(
      ada,
      await uploaded(
        ada,
        expenseList(
          `2020-01-22,13 F-150,Parts,"=HYPERLINK(""http://x.example"";""y"")",10.00`,
          `2020-01-22,13 F-150,Parts,'=1+1,12.00`,
        ),
      ),
    );
    expect(done.state).toBe('committed');
    const { rows } = (await ada.get('/api/entries')).body;
    expect(rows.map(({ what }: { what: string }) => what).toSorted()).toEqual([
      '=1+1',
      '=HYPERLINK("http://x.example";"y")',
    ]);
  });

  it('ragged rows keep what stands beyond the headings, and say so', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await uploaded(
      ada,
      expenseList(
        '2020-01-22,13 F-150,Parts,door,10.00,7,8,9',
        '2020-01-23,13 F-150',
        '2020-01-24,13 F-150,Parts,hood,12.00',
      ),
    );
    expect(read.reading?.control).toMatchObject({ rowsRead: 4, costCents: 2200 });
    expect(read.reading?.remarks.join()).toContain('more cells than there are headings');
  });
});
