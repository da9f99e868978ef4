import { describe, expect, it } from 'vitest';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import { linesOf, read, sampleBytes } from './support.ts';
import {
  readFacts,
  readHoursLines,
  readLines,
  sheetOf,
  trueFacts,
  trueHours,
  trueLines,
  type Truth,
  truthOf,
} from './truth.ts';

// Checked against the truth beside each sample, under the rules of the samples' README.

const byYear = (a: { year: number | null; model: string | null }, b: typeof a) =>
  `${a.year} ${a.model}`.localeCompare(`${b.year} ${b.model}`);

function expectAgreement(reading: Reading, truth: Truth): void {
  const lenient = truth.canonical.lines.find((line) => line.lenient)?.lenient ?? [];
  const ordered = <T extends { sheet: string | null; row: number; col?: number | undefined }>(lines: T[]) =>
    lines.sort((a, b) => (a.sheet ?? '').localeCompare(b.sheet ?? '') || a.row - b.row || (a.col ?? 0) - (b.col ?? 0));
  const guesses = expectUndecided(reading, truth);
  const sure = readLines(reading, lenient).filter(({ row }) => !guesses.has(row));
  expect(ordered(sure)).toEqual(ordered(trueLines(truth, lenient)));
  expect(readFacts(reading).sort(byYear)).toEqual(trueFacts(truth, reading).sort(byYear));
  expect(reading.control).toMatchObject({
    rowsRead: truth.control.rowsRead,
    costCents: truth.control.totalCents + [...guesses.values()].reduce((sum, line) => sum + line.cents, 0),
    saleCents: truth.control.totalSaleCents,
    estimateCents: truth.control.estimateCents,
    centsByCategory: withGuesses(truth.control.totalCentsByCategory, guesses),
  });
  const aside = reading.asides.map(({ row, col, reason }) => ({ row, col, reason }));
  for (const reject of truth.rejects)
    expect(aside).toContainEqual({ row: reject.row, col: reject.col, reason: reject.reason });
  expect(aside).toHaveLength(truth.rejects.length + truth.undecidable.length - guesses.size);
  const notData = reading.firstRows
    .filter((row) => row.outcome === 'not data')
    .map((row) => ({ sheet: sheetOf(reading, row), row: row.row }));
  expect(notData).toEqual(truth.nonData.map(({ sheet, row }) => ({ sheet, row })));
  expect(reading.notData.blank ?? 0).toBe(
    truth.blankRows.flatMap(({ rows }) => rows).reduce((sum, [from, to]) => sum + to - from + 1, 0),
  );
  const stated = reading.statedTotals.map(({ row, stated: statedCents, imported }) => ({ row, statedCents, imported }));
  for (const total of truth.statedTotals) {
    expect(stated).toContainEqual({
      row: total.source.row,
      statedCents: total.statedCents,
      imported: total.importedCents,
    });
  }
}

type Guess = { readonly cents: number; readonly category: string };

/** Rows of which more than one reading is right: each is put aside for a right reason, or comes in marked as a guess. */
function expectUndecided(reading: Reading, truth: Truth): Map<number, Guess> {
  const guesses = new Map<number, Guess>();
  for (const { source, acceptable } of truth.undecidable) {
    const [line] = linesOf(reading).filter(({ row }) => row === source.row);
    const way = acceptable.find(({ outcome }) => outcome === (line ? 'import' : 'reject'));
    if (!line) {
      expect(way?.reason).toContain(reading.asides.find((one) => one.row === source.row)?.reason);
      continue;
    }
    expect([line]).toMatchObject([{ isGuess: true, cents: way?.lines?.[0]?.amountCents, on: way?.lines?.[0]?.date }]);
    guesses.set(source.row, { cents: line.cents, category: line.category ?? '' });
  }
  return guesses;
}

function withGuesses(sums: Record<string, number>, guesses: ReadonlyMap<number, Guess>): Record<string, number> {
  const all = { ...sums };
  for (const { cents, category } of guesses.values()) all[category] = (all[category] ?? 0) + cents;
  return all;
}

describe('samples with known truth', () => {
  it.each([
    ['p01_rebuild_summary_us.csv', {}],
    ['p02_expense_ledger_us.csv', {}],
    ['p06_ausgaben_werkstatt.csv', { currency: 'EUR', locale: 'de-DE' }],
    ['p07_receipts_messy.csv', {}],
    ['p08_notes_and_junk.csv', {}],
  ])('%s comes in exactly as its truth says', (name, books) => {
    const reading = read(sampleBytes(name), {}, books);
    expect(reading.refusal).toBeNull();
    expectAgreement(reading, truthOf(name));
  });

  it('an hours log comes in once its order of day and month is settled, and not before', () => {
    const name = 'p05_hours_log.tsv';
    const truth = truthOf(name);
    const asked = read(sampleBytes(name)).choices;
    expect(asked).toEqual([
      expect.objectContaining({ kind: 'date-order', column: 'Date', mustAsk: true, answer: null }),
    ]);
    const settings: ImportSettings = { answers: { [asked[0]?.id ?? '']: 'MDY' } };
    const reading = read(sampleBytes(name), settings);
    expect(readHoursLines(reading)).toEqual(trueHours(truth));
    expect(reading.control.rowsRead).toBe(truth.control.rowsRead);
    expect(reading.asides.map(({ row, col, reason }) => ({ row, col, reason }))).toEqual([
      { row: 19, col: 2, reason: 'missing-vehicle' },
    ]);
    expect(reading.statedTotals.every((total) => total.stated === total.imported)).toBe(true);
  });

  it('euros do not come into a shop that counts in dollars', () => {
    expect(read(sampleBytes('p06_ausgaben_werkstatt.csv')).refusal).toMatchObject({ kind: 'currency' });
  });

  it('a sheet about one vehicle in sections comes in whole, its hours too', () => {
    const name = 'p03_single_car_sheet.csv';
    const reading = read(sampleBytes(name));
    expectAgreement(reading, truthOf(name));
    expect(readHoursLines(reading)).toEqual(trueHours(truthOf(name)));
    expect(reading.choices).toEqual([]);
  });

  it('a workbook of an overview, parts and labor comes in with the money counted once', () => {
    const name = 'p04_workbook_2021.xlsx';
    const reading = read(sampleBytes(name));
    const truth = truthOf(name);
    expectAgreement(reading, truth);
    expect(readHoursLines(reading)).toEqual(trueHours(truth));
    expect(reading.choices.filter(({ mustAsk }) => mustAsk)).toEqual([]);
  });
});
