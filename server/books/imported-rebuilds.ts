import type { RawDatabase } from '../platform/database.ts';
import { newId } from '../platform/ids.ts';
import type { Importing, Source } from './imported.ts';

export interface ImportedBaseline {
  readonly rebuildId: string;
  readonly madeOn: string | null;
  readonly plannedSeconds: number | null;
  readonly expectedSaleCents: number | null;
  /** Category id → cents. */
  readonly lines: ReadonlyMap<string, number>;
}

/** Writes the rebuilds that an import brings or fills, and their locked plans, in the caller's transaction. */
export function importedRebuilds(raw: RawDatabase, { shopId, importId, at }: Importing) {
  const estimate = raw.prepare(
    `INSERT INTO estimates (id, shop_id, rebuild_id, revision, is_baseline, made_on, planned_seconds, expected_sale_cents, locked_at, import_id, created_at)
     VALUES (?, ?, ?, 0, 1, ?, ?, ?, ?, ?, ?)`,
  );
  const estimateLine = raw.prepare(
    'INSERT INTO estimate_lines (shop_id, estimate_id, category_id, cents) VALUES (?, ?, ?, ?)',
  );

  return {
    /** The plan that came with a rebuild, locked at once: its work was begun long ago. */
    baseline(b: ImportedBaseline): void {
      const id = newId();
      estimate.run(id, shopId, b.rebuildId, b.madeOn, b.plannedSeconds, b.expectedSaleCents, at, importId, at);
      for (const [categoryId, cents] of b.lines) estimateLine.run(shopId, id, categoryId, cents);
    },
    /** A rebuild that the file brings: columns of its table → values. */
    rebuild(id: string, source: Omit<Source, 'col'>, columns: ReadonlyMap<string, string | number>): void {
      const known = [...columns];
      const names = [
        'id',
        'shop_id',
        'import_id',
        'import_sheet',
        'import_row',
        'created_at',
        ...known.map(([name]) => name),
      ];
      raw
        .prepare(`INSERT INTO rebuilds (${names.join(', ')}) VALUES (${names.map(() => '?').join(', ')})`)
        .run(id, shopId, importId, source.sheet, source.row, at, ...known.map(([, value]) => value));
    },
    /** Fills what the books did not know of a rebuild. Gives the columns filled, with their values. */
    fill(id: string, columns: ReadonlyMap<string, string | number>): Record<string, string | number> {
      const before = raw.prepare('SELECT * FROM rebuilds WHERE shop_id = ? AND id = ?').get(shopId, id) as Record<
        string,
        unknown
      >;
      const filled = Object.fromEntries([...columns].filter(([name]) => before[name] === null));
      const names = Object.keys(filled);
      if (names.length === 0) return {};
      raw
        .prepare(
          `UPDATE rebuilds SET ${names.map((name) => `${name} = ?`).join(', ')}, version = version + 1 WHERE shop_id = ? AND id = ?`,
        )
        .run(...Object.values(filled), shopId, id);
      return filled;
    },
  };
}

export type ImportedRebuilds = ReturnType<typeof importedRebuilds>;
