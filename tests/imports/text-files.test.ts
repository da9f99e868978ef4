import { describe, expect, it } from 'vitest';
import { openFile } from '../../server/features/imports/sheets/open-file.ts';
import { bytesOf } from '../../server/features/imports/text/bytes.ts';

function opened(file: string | Buffer) {
  const { encoding, delimiter, sheets } = openFile(bytesOf(Buffer.from(file)));
  const rows: string[][] = [];
  const lines: number[] = [];
  sheets[0]?.forEachRow((cells, line) => {
    rows.push(cells);
    lines.push(line);
  });
  return { encoding, delimiter, rows, lines };
}

describe('the character between the cells', () => {
  it.each<[string, string, string]>([
    ['commas', 'Date,Car,Paid\n2020-01-02,Golf,10.00\n2020-01-03,Golf,12.50', ','],
    ['tabs', 'Date\tCar\tPaid\n1/2/20\tGolf, blue\t$1,200\n1/3/20\tGolf, red\t$1,300', '\t'],
    ['bars', 'Date|Car|Paid\n1/2/20|Golf, blue|12\n1/3/20|Golf; red|13', '|'],
    [
      'semicolons beside decimal commas in every cell',
      'Auto;Mo;Di;Mi\n1,5;2,0;0,5;1,0\n2,5;3,0;1,5;1,0\n1,5;1,0;0,5;4,0',
      ';',
    ],
    ['semicolons beside thousands', 'Bid;Sold\n1,234;5,600\n2,345;6,700\n900;1,100', ';'],
    ['semicolons, two columns, no heading', '2020-01-02;12,50\n2020-01-03;13,50\n2020-01-04;14,50', ';'],
    ['commas around quoted decimal commas', 'Datum,Betrag\n2020-01-02,"12,50"\n2020-01-03,"1.313,50"', ','],
    ['commas between numbers only', '2012,1500,200\n2013,1600,300\n2014,1700,400', ','],
    [
      'semicolons below prose',
      'Notes, such as they are, on cars\nDov, Ada, and me\n\nDate;Car;Paid\n1/2/20;Golf;1\n1/3/20;Polo;2\n1/4/20;Golf, red;3',
      ';',
    ],
    [
      'commas with semicolons in the details',
      'Date,Car,Details\n1/2/20,Golf,door; hood\n1/3/20,Golf,lamp\n1/4/20,Golf,a; b',
      ',',
    ],
    ['a line that names it', 'sep=^\nDate^Car\n1/2/20^Golf', '^'],
    ['a line that names it, quoted, filled up', '"sep=|",,\r\nDate|Car\r\n1/2/20|Golf', '|'],
    ['one column', 'Golf\nPolo', ','],
  ])('%s', (_, text, delimiter) => {
    const widths = opened(text).rows.map((cells) => cells.length);
    expect(opened(text).delimiter).toBe(delimiter);
    expect(Math.max(...widths)).toBe(widths.at(-1));
  });
});

describe('how letters and lines are stored', () => {
  const rows = [
    ['Date', 'Was'],
    ['2020-01-02', 'Tür, "links"\nund Griff'],
    ['2020-01-03', 'Öl 5 €'],
  ];
  const text = (end: string) =>
    ['Date;Was', `2020-01-02;"Tür, ""links""${end}und Griff"`, '2020-01-03;Öl 5 €'].join(end);
  const latin = (value: string, euro: number) =>
    Buffer.from(value.replaceAll('€', String.fromCharCode(euro)), 'latin1');
  const swapped = (value: string) => Buffer.from(value, 'utf16le').swap16();
  it.each<[string, Buffer, string]>([
    ['UTF-8', Buffer.from(text('\n')), 'utf-8'],
    ['UTF-8 with its mark', Buffer.from(`\uFEFF${text('\r\n')}`), 'utf-8'],
    ['lone carriage returns', Buffer.from(text('\r')), 'utf-8'],
    ['mixed line ends', Buffer.from(text('\r\n').replace('\r\n', '\r')), 'utf-8'],
    ['UTF-16 with its mark', Buffer.from(`\uFEFF${text('\r\n')}`, 'utf16le'), 'utf-16le'],
    ['UTF-16 without', Buffer.from(text('\r\n'), 'utf16le'), 'utf-16le'],
    ['UTF-16, big end first', swapped(`\uFEFF${text('\n')}`), 'utf-16be'],
    ['UTF-16, big end first, no mark', swapped(text('\n')), 'utf-16be'],
    [
      'UTF-16 below a line that names the delimiter',
      Buffer.from(`\uFEFFsep=;\r\n${text('\r\n')}`, 'utf16le'),
      'utf-16le',
    ],
    ['Windows-1252', latin(text('\r\n'), 0x80), 'windows-1252'],
    ['ISO-8859-15', latin(text('\r\n'), 0xa4), 'iso-8859-15'],
  ])('%s', (_, bytes, encoding) => {
    expect(opened(bytes)).toMatchObject({ encoding, rows });
  });

  it('rows keep the line that they begin on', () => {
    expect(opened(text('\r')).lines).toEqual([1, 2, 4]);
  });

  it.each<[string, Buffer, RegExp]>([
    [
      'UTF-8 with a broken letter',
      Buffer.concat([Buffer.from('Tür;1\nÖl;2\n'), Buffer.from('a\xff;3\n', 'latin1')]),
      /line 3/,
    ],
    ['UTF-8 cut in the middle of a letter', Buffer.from('Öl;2\nÖl;3\nTür').subarray(0, -2), /line 3/],
    ['half a character in UTF-16', Buffer.from('\uFEFFa;b\n\ud800;c\n', 'utf16le'), /cannot be read/],
    [
      'UTF-16 cut in the middle of a letter',
      Buffer.from('\uFEFFa;b\nc;d\n', 'utf16le').subarray(0, -1),
      /cannot be read/,
    ],
    ['bytes that are no letters anywhere', Buffer.from('a;b\n\x81\x8d;c\n', 'latin1'), /not known/],
    ['zero bytes', Buffer.from('a;b\n1;2\0\n'), /zero bytes/],
  ])('%s is refused, never replaced in silence', (_, bytes, words) => {
    expect(() => opened(bytes)).toThrow(words);
  });

  it('letters split between two pieces of a long file stay whole', () => {
    const long = Array.from({ length: 30_000 }, (_, i) => `${i};Öl und Tür €`).join('\n');
    expect(opened(long).rows.every(([number, what], i) => number === String(i) && what === 'Öl und Tür €')).toBe(true);
    expect(opened(`sep=;\r${long.replaceAll('\n', '\r')}`).rows).toHaveLength(30_000);
  });
});

describe('files that are no spreadsheet', () => {
  it.each<[string, string | Buffer, RegExp]>([
    ['a web page named .xls', '<html><table><tr><td>1</td></tr></table></html>', /web page.*save it as \.xlsx/],
    ['a table of a web page, after a mark and a comment', '\uFEFF\n<!-- made --><TABLE border=1>', /web page/],
    ['XML of an old office program', '<?xml version="1.0"?><Workbook/>', /XML.*save it as \.xlsx/],
    ['a text document', '{\\rtf1 hello}', /text document/],
    ['a photograph of a phone', Buffer.from('\0\0\0\x18ftypheic', 'latin1'), /picture/],
    ['a PDF', '%PDF-1.7', /PDF/],
    ['a packed file', Buffer.from('1f8b0800', 'hex'), /Unpack it/],
    [
      'a workbook behind a password',
      Buffer.concat([Buffer.from('d0cf11e0a1b11ae1', 'hex'), Buffer.from('EncryptedPackage', 'utf16le')]),
      /password/,
    ],
  ])('%s is refused in words', (_, bytes, words) => {
    expect(() => opened(bytes)).toThrow(words);
  });

  it('a table that begins with a sign of less is text all the same', () => {
    expect(opened('<5 mi,Car\n1,Golf').rows).toHaveLength(2);
  });
});
