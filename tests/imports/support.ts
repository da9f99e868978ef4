import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';
import { DEFAULT_CATEGORIES, DEFAULT_CLASSES, DEFAULT_DAMAGES } from '#shared/vocabulary.ts';
import type { ShopBooks } from '../../server/features/imports/books.ts';
import { readFile } from '../../server/features/imports/read/read-file.ts';
import { bytesOf } from '../../server/features/imports/text/bytes.ts';

const SAMPLES = path.resolve(import.meta.dirname, '../fixtures/spreadsheets');

/** A new shop's books: the usual lists, no rebuild yet. */
export function emptyBooks(changes: Partial<ShopBooks> = {}): ShopBooks {
  return {
    currency: 'USD',
    locale: 'en-US',
    today: '2026-12-01',
    categories: DEFAULT_CATEGORIES.map(({ name }) => name),
    retiredCategories: [],
    classes: [...DEFAULT_CLASSES],
    damages: [...DEFAULT_DAMAGES],
    rebuilds: [],
    past: [],
    ...changes,
  };
}

export const sampleBytes = (name: string): Buffer => readFileSync(path.join(SAMPLES, name));

/** Reads text (or bytes) as a file for an empty shop. */
export function read(file: string | Buffer, settings: ImportSettings = {}, books: Partial<ShopBooks> = {}): Reading {
  return readFiles([['old.csv', file]], settings, books);
}

/** Reads several files as one import. */
export function readFiles(
  files: readonly (readonly [name: string, content: string | Buffer])[],
  settings: ImportSettings = {},
  books: Partial<ShopBooks> = {},
): Reading {
  const given = files.map(([name, content]) => ({
    name,
    source: bytesOf(Buffer.isBuffer(content) ? content : Buffer.from(content)),
  }));
  return readFile(given, emptyBooks(books), settings);
}

/** All lines that a file of at most 200 rows came to. */
export const linesOf = (reading: Reading) => reading.firstRows.flatMap((row) => row.lines);
