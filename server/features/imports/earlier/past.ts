import type { Shape } from '#shared/contracts/import-words.ts';
import type { ImportSettings } from '#shared/contracts/imports.ts';

/** A row of an earlier import. */
export interface PastRow {
  readonly importId: string;
  readonly sheet: number;
  readonly row: number;
}

/** A cell of such a row; null = all of the row. */
export interface PastCell extends PastRow {
  readonly col: number | null;
}

/** A sheet whose rows stand in the books. What is long is read only when it is asked for. */
export interface PastSheet {
  readonly importId: string;
  readonly fileName: string;
  readonly committedAt: string;
  readonly sheet: number;
  readonly shape: Shape;
  readonly headings: readonly string[] | null;
  readonly headingPrint: string | null;
  /** What people said of its file. */
  settings(): ImportSettings;
  /** Of each row that came in, in order: its row and the hash of its cells. */
  prints(): readonly (readonly [row: number, hash: number])[];
  /** The cells of these rows, as they were in the file. */
  cellsOf(rows: readonly number[]): ReadonlyMap<number, readonly string[]>;
  /** Row → the rebuild that it was booked to. */
  rebuilds(): ReadonlyMap<number, string>;
  /** How its file spelled vehicles → the rebuilds that they were. */
  vehicles(): ReadonlyMap<string, string>;
}

/** Pairs of row and hash as bytes: little-endian doubles. */
export function printsToBytes(prints: readonly (readonly [row: number, hash: number])[]): Buffer {
  const bytes = Buffer.alloc(prints.length * 16);
  prints.forEach(([row, hash], i) => {
    bytes.writeDoubleLE(row, i * 16);
    bytes.writeDoubleLE(hash, i * 16 + 8);
  });
  return bytes;
}

export function printsFromBytes(bytes: Buffer): [row: number, hash: number][] {
  return Array.from({ length: bytes.length / 16 }, (_, i) => [
    bytes.readDoubleLE(i * 16),
    bytes.readDoubleLE(i * 16 + 8),
  ]);
}
