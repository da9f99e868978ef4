import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { factsOf, type ShopBook, shopBooks, tableOf, WRITINGS, type Writing } from './shop-books.ts';
import { linesOf, read } from './support.ts';
import { odsOf, xlsxOf } from './workbooks.ts';

const orders = fc.shuffledSubarray([0, 1, 2, 3, 4], { minLength: 5, maxLength: 5 });
const writings = fc.constantFrom(...WRITINGS);

// A day above the 12th in the first row, so that the order of day and month is no question.
const settled = (book: ShopBook): ShopBook => ({
  ...book,
  rows: book.rows.map((row, i) => (i === 0 ? { ...row, day: 27 } : row)),
});

function written(rows: readonly (readonly string[])[], delimiter: string): string {
  const quoted = (cell: string) =>
    cell.includes('"') || cell.includes(delimiter) ? `"${cell.replaceAll('"', '""')}"` : cell;
  return rows.map((row) => row.map(quoted).join(delimiter)).join('\n');
}

const ENCODINGS = {
  'UTF-8': (text: string) => Buffer.from(text),
  'UTF-8 with its mark': (text: string) => Buffer.from(`\uFEFF${text}`),
  'UTF-16': (text: string) => Buffer.from(`\uFEFF${text}`, 'utf16le'),
  'Windows-1252': (text: string) => Buffer.from(text, 'latin1'),
} as const;
const encodings = fc.constantFrom(...Object.values(ENCODINGS));

/** What came in of a file, as the books' own facts; nothing may have been put aside. */
function factsIn(file: Buffer, { decimal }: Writing) {
  const reading = read(file, {}, decimal === ',' ? { currency: 'EUR', locale: 'de-DE' } : {});
  expect(reading.asides).toEqual([]);
  return linesOf(reading).map(({ on, rebuild, kind, category, cents, what }) => {
    const found = reading.rebuilds[rebuild ?? -1];
    return {
      on,
      vehicle: `${found?.year} ${found?.model}`,
      category: kind === 'purchase' ? kind : category,
      cents,
      what,
    };
  });
}

describe('the books of a generated shop', () => {
  it('come in the same from any order of columns, delimiter, encoding, language and way of writing days and money', () => {
    fc.assert(
      fc.property(
        shopBooks,
        writings,
        orders,
        fc.constantFrom(',', ';', '\t', '|'),
        encodings,
        (any, writing, order, delimiter, encode) => {
          const book = settled(any);
          const file = encode(written(tableOf(book, writing, order), delimiter));
          expect(factsIn(file, writing)).toEqual(factsOf(book));
        },
      ),
      { numRuns: 200 },
    );
  });

  it('and from a workbook', () => {
    fc.assert(
      fc.property(shopBooks, writings, orders, fc.constantFrom(xlsxOf, odsOf), (any, writing, order, write) => {
        const book = settled(any);
        expect(factsIn(write({ Costs: tableOf(book, writing, order) }), writing)).toEqual(factsOf(book));
      }),
      { numRuns: 60 },
    );
  });

  it('every row ends once, and cents in are cents taken and put aside', () => {
    fc.assert(
      fc.property(shopBooks, writings, fc.nat(), (any, writing, spoilt) => {
        const book = settled(any);
        const table = tableOf(book, writing, [0, 1, 2, 3, 4]);
        const at = 1 + (spoilt % book.rows.length);
        table[at] = table[at]?.map((cell, col) => (col === 1 ? '' : cell)) ?? [];
        const { control } = read(written(table, ';'), {}, { currency: 'EUR', locale: 'de-DE' });
        expect(control.taken + control.putAside + control.notData).toBe(control.rowsRead);
        expect(control.rowsRead).toBe(table.length);
        const all = book.rows.reduce((sum, { cents }) => sum + cents, 0);
        expect(control.costCents + control.putAsideCents).toBe(all);
      }),
      { numRuns: 100 },
    );
  });
});
