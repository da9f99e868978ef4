import { bulkInsert } from '../platform/bulk-insert.ts';
import type { RawDatabase } from '../platform/database.ts';
import { newIds } from '../platform/ids.ts';

/** Where a row of a file stands. Text files have one sheet, 1. */
export interface Source {
  readonly sheet: number;
  readonly row: number;
  readonly col: number;
}

export interface ImportedEntry extends Source {
  readonly rebuildId: string | null;
  readonly categoryId: string;
  readonly datedOn: string | null;
  readonly cents: number;
  readonly vendor: string | null;
  readonly what: string | null;
  readonly foreseen: string | null;
  readonly isExtra: boolean;
  readonly isGuess: boolean;
}

export interface ImportedHours extends Source {
  readonly rebuildId: string;
  readonly workerId: string | null;
  readonly isPaid: boolean;
  readonly workedOn: string | null;
  readonly seconds: number;
  readonly task: string | null;
  readonly isGuess: boolean;
}

/** A figure of a rebuild that stands in no entry: its purchase, its sale, a line of its plan. */
export interface ImportedFact extends Source {
  readonly kind: string;
  readonly rebuildId: string;
  readonly categoryId: string | null;
  readonly on: string | null;
  readonly cents: number;
  readonly seconds: number;
}

export interface ImportedSheet {
  readonly sheet: number;
  readonly name: string | null;
  readonly shape: string;
  readonly headings: readonly string[] | null;
  readonly headingPrint: string | null;
  readonly prints: Buffer;
}

export interface Importing {
  readonly shopId: string;
  readonly importId: string;
  readonly userId: string;
  readonly at: string;
}

const DRAWN = 2000;
const ENTRY =
  'id shop_id rebuild_id category_id dated_on cents vendor what foreseen is_extra is_guess import_id import_sheet import_row import_col created_at created_by'.split(
    ' ',
  );
const HOURS =
  'id shop_id rebuild_id worker_id worked_on seconds is_paid task is_guess import_id import_sheet import_row import_col created_at created_by'.split(
    ' ',
  );
const FACT = 'shop_id import_id sheet row col kind rebuild_id category_id dated_on cents seconds'.split(' ');
const SHEET = 'shop_id import_id sheet name shape headings heading_print prints'.split(' ');
const RAW_ROW = ['shop_id', 'import_id', 'sheet', 'row', 'cells', 'outcome', 'reason'];

/**
 * The bulk writer of the books: what an import brings, in the caller's transaction, on the raw handle. Entries may
 * be written before their rebuilds when foreign keys are deferred.
 */
export function importedBooks(raw: RawDatabase, { shopId, importId, userId, at }: Importing) {
  const entries = bulkInsert(raw, 'entries', ENTRY);
  const hours = bulkInsert(raw, 'hours', HOURS);
  const rows = bulkInsert(raw, 'import_rows', RAW_ROW);
  const facts = bulkInsert(raw, 'import_facts', FACT);
  const sheets = bulkInsert(raw, 'import_sheets', SHEET);
  const nextId = idSupply();
  const worker = raw.prepare('INSERT INTO workers (id, shop_id, name, is_paid) VALUES (?, ?, ?, 0)');

  return {
    entry(e: ImportedEntry): void {
      entries.add(
        nextId(),
        shopId,
        e.rebuildId,
        e.categoryId,
        e.datedOn,
        e.cents,
        e.vendor,
        e.what,
        e.foreseen,
        e.isExtra ? 1 : 0,
        e.isGuess ? 1 : 0,
        importId,
        e.sheet,
        e.row,
        e.col,
        at,
        userId,
      );
    },
    hours(h: ImportedHours): void {
      hours.add(
        nextId(),
        shopId,
        h.rebuildId,
        h.workerId,
        h.workedOn,
        h.seconds,
        h.isPaid ? 1 : 0,
        h.task,
        h.isGuess ? 1 : 0,
        importId,
        h.sheet,
        h.row,
        h.col,
        at,
        userId,
      );
    },
    /** A row of the file as it stood, and how it ended. */
    row(at: Omit<Source, 'col'>, cells: readonly string[], outcome: string, reason: string | null): void {
      rows.add(shopId, importId, at.sheet, at.row, JSON.stringify(cells), outcome, reason);
    },
    fact(f: ImportedFact): void {
      const { sheet, row, col, kind, rebuildId, categoryId, on, cents, seconds } = f;
      facts.add(shopId, importId, sheet, row, col, kind, rebuildId, categoryId, on, cents, seconds);
    },
    /** What a later, longer file is held against. */
    sheet({ sheet, name, shape, headings, headingPrint, prints }: ImportedSheet): void {
      sheets.add(shopId, importId, sheet, name, shape, headings && JSON.stringify(headings), headingPrint, prints);
    },
    /** A person named in a log of hours; unpaid until someone says otherwise. Gives the id. */
    worker(name: string): string {
      const id = nextId();
      worker.run(id, shopId, name);
      return id;
    },
    nextId,
    flush(): void {
      entries.flush();
      hours.flush();
      rows.flush();
      facts.flush();
      sheets.flush();
    },
  };
}

export type ImportedBooks = ReturnType<typeof importedBooks>;

/** New ids, drawn many at a time and given out in falling order: the index over them grows in one sweep per draw. */
function idSupply(): () => string {
  let ids: string[] = [];
  return () => {
    if (ids.length === 0) ids = newIds(DRAWN).sort();
    return ids.pop() as string;
  };
}
