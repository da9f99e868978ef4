import type { RawDatabase } from '../platform/database.ts';
import { newId } from '../platform/ids.ts';
import type { Importing, Source } from './imported.ts';
import type { Replaced } from './replaced.ts';

export interface ImportedBaseline {
  readonly rebuildId: string;
  readonly madeOn: string | null;
  readonly plannedSeconds: number | null;
  readonly expectedSaleCents: number | null;
  /** Category id → cents. */
  readonly lines: ReadonlyMap<string, number>;
}

type Columns = ReadonlyMap<string, string | number>;

export interface FilledRebuild {
  readonly filled: Readonly<Record<string, string | number>>;
  /** Column → what it held before, and what it holds now. */
  readonly replaced: Replaced['facts'][string];
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
    /** Fills what the books did not know of a rebuild, and writes over what it shall. Gives the columns by both. */
    fill(id: string, columns: Columns, over: ReadonlySet<string>): FilledRebuild {
      const before = raw.prepare('SELECT * FROM rebuilds WHERE shop_id = ? AND id = ?').get(shopId, id) as Record<
        string,
        string | number | null
      >;
      const filled = Object.fromEntries([...columns].filter(([name]) => before[name] === null));
      const replaced = Object.fromEntries(
        [...columns]
          .filter(([name, value]) => over.has(name) && before[name] !== null && before[name] !== value)
          .map(([name, value]) => [name, [before[name] ?? null, value] as const]),
      );
      const written = new Map(
        [...columns].filter(([name]) => Object.hasOwn(filled, name) || Object.hasOwn(replaced, name)),
      );
      if (written.size === 0) return { filled, replaced };
      raw
        .prepare(
          `UPDATE rebuilds SET ${[...written.keys()].map((name) => `${name} = ?`).join(', ')}, version = version + 1 WHERE shop_id = ? AND id = ?`,
        )
        .run(...written.values(), shopId, id);
      return { filled, replaced };
    },
  };
}

export type ImportedRebuilds = ReturnType<typeof importedRebuilds>;
