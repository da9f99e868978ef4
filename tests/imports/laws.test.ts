import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { linesOf, read, sampleBytes } from './support.ts';

const CARS = ['13 F-150', '2013 F-150 red', '11 Miata', 'Altima 05', '12 Caravan'];
const WORDS = ['Parts', 'Towing', 'Paint/body', 'Purchase', 'Sale', 'Widgets'];

const expense = fc.record({
  day: fc.integer({ min: 0, max: 2000 }),
  car: fc.constantFrom(...CARS, ''),
  word: fc.constantFrom(...WORDS),
  what: fc.constantFrom('door shell, left', 'hood "used"', 'clips; 2 bags', 'two\nlines', 'Tür'),
  amount: fc.oneof(fc.integer({ min: 1, max: 500_000 }), fc.constantFrom('see receipt', '~200', '')),
});
type Expense = typeof expense extends fc.Arbitrary<infer T> ? T : never;

const isoOf = (day: number) => new Date(Date.UTC(2018, 0, 13) + day * 86_400_000).toISOString().slice(0, 10);
const money = (amount: Expense['amount']) => (typeof amount === 'number' ? (amount / 100).toFixed(2) : amount);
const centsOf = (amount: Expense['amount']) => (typeof amount === 'number' ? amount : amount === '~200' ? 20_000 : 0);
const HEADINGS = ['Date', 'Car', 'What for', 'Details', 'Paid'];
const cellsOf = (row: Expense, dateOf = isoOf) => [dateOf(row.day), row.car, row.word, row.what, money(row.amount)];

function written(rows: readonly (readonly string[])[], delimiter = ','): string {
  const quoted = (cell: string) =>
    /["\n]/.test(cell) || cell.includes(delimiter) ? `"${cell.replaceAll('"', '""')}"` : cell;
  return rows.map((row) => row.map(quoted).join(delimiter)).join('\n');
}

/** What came in, whatever the columns' places. */
const meaning = (text: string | Buffer) => {
  const reading = read(text);
  return {
    lines: linesOf(reading).map(({ col: _, ...line }) => line),
    rebuilds: reading.rebuilds,
    control: reading.control,
    asides: reading.asides.map(({ row, reason, cents }) => ({ row, reason, cents })),
  };
};

// A list in which most amounts can be read; one without any is no list of costs and is refused.
const sound: Expense = { day: 0, car: '12 Caravan', word: 'Parts', what: 'Tür', amount: 100 };
const books = fc
  .array(expense, { minLength: 1, maxLength: 20 })
  .map((rows) => rows.flatMap((row, i) => [{ ...sound, day: i }, row]));

describe('laws of any list', () => {
  it('every row ends as exactly one of taken, put aside, not data; cents in = taken + put aside', () => {
    fc.assert(
      fc.property(books, (rows) => {
        const { control, firstRows, notData } = read(written([HEADINGS, ...rows.map((row) => cellsOf(row))]));
        expect(control.taken + control.putAside + control.notData).toBe(rows.length + 1);
        expect(control.rowsRead + (notData.blank ?? 0)).toBe(rows.length + 1);
        expect(new Set(firstRows.map((row) => row.row)).size).toBe(rows.length + 1);
        const inFile = rows.reduce((sum, row) => sum + centsOf(row.amount), 0);
        expect(control.costCents + control.saleCents + control.putAsideCents).toBe(inFile);
      }),
      { numRuns: 150 },
    );
  });

  it('the order of the columns does not matter', () => {
    fc.assert(
      fc.property(books, fc.shuffledSubarray([0, 1, 2, 3, 4], { minLength: 5 }), (rows, order) => {
        const all = [HEADINGS, ...rows.map((row) => cellsOf(row))];
        const moved = all.map((row) => order.map((at) => row[at] ?? ''));
        expect(meaning(written(moved))).toEqual(meaning(written(all)));
      }),
      { numRuns: 100 },
    );
  });

  it('nor does the delimiter, nor how letters are stored', () => {
    fc.assert(
      fc.property(
        books,
        fc.constantFrom(',', ';', '\t', '|'),
        fc.constantFrom('utf8', 'utf16le', 'latin1'),
        (rows, delimiter, encoding) => {
          const all = [HEADINGS, ...rows.map((row) => cellsOf(row))];
          const mark = encoding === 'latin1' ? '' : '\uFEFF';
          expect(meaning(Buffer.from(mark + written(all, delimiter), encoding as BufferEncoding))).toEqual(
            meaning(written(all)),
          );
        },
      ),
      { numRuns: 100 },
    );
  });

  it('nor how days are written, once one of them settles the order', () => {
    const parts = (day: number) => isoOf(day).split('-').map(Number) as [number, number, number];
    const styles = [
      (day: number) => `${parts(day)[1]}/${parts(day)[2]}/${parts(day)[0]}`,
      (day: number) => `${parts(day)[2]}.${parts(day)[1]}.${parts(day)[0]}`,
      (day: number) => `${parts(day)[2]}/${parts(day)[1]}/${parts(day)[0]}`,
    ];
    fc.assert(
      fc.property(books, fc.constantFrom(...styles), (rows, style) => {
        const iso = written([HEADINGS, ...rows.map((row) => cellsOf(row))]);
        expect(meaning(written([HEADINGS, ...rows.map((row) => cellsOf(row, style))]))).toEqual(meaning(iso));
      }),
      { numRuns: 100 },
    );
  });
});

it('no mutation of a sample makes it crash: each is read, or refused in words', () => {
  const names = [
    'p01_rebuild_summary_us.csv',
    'p02_expense_ledger_us.csv',
    'p03_single_car_sheet.csv',
    'p06_ausgaben_werkstatt.csv',
    'p04_workbook_2021.xlsx',
    'p05_hours_log.tsv',
    'p07_receipts_messy.csv',
    'p08_notes_and_junk.csv',
  ];
  fc.assert(
    fc.property(
      fc.constantFrom(...names),
      fc.array(fc.tuple(fc.nat(), fc.nat(255)), { maxLength: 30 }),
      fc.nat(),
      (name, changes, cut) => {
        const bytes = Buffer.from(sampleBytes(name));
        for (const [at, value] of changes) bytes[at % bytes.length] = value;
        const { refusal, control } = read(bytes.subarray(0, cut % 3 === 0 ? cut % bytes.length : bytes.length));
        expect(refusal === null || refusal.message.length > 10).toBe(true);
        expect(control.taken + control.putAside + control.notData).toBe(control.rowsRead);
      },
    ),
    { numRuns: 300 },
  );
});
