import { readFileSync } from 'node:fs';
import BetterSqlite3 from 'better-sqlite3';
import createKnex from 'knex';
import papaparse from 'papaparse';
import { openShop } from '../../server/books/new-shop.ts';
import { migrate, preparePragmas } from '../../server/platform/database.ts';
import { newId } from '../../server/platform/ids.ts';
import { isDay } from '#shared/day.ts';
import { parseCents } from '#shared/money.ts';

const STAMP = '2026-06-15T12:00:00.000Z';

/** An empty warehouse with one shop in it, to copy from. */
export async function plainWarehouse(file: string): Promise<void> {
  await migrate(file);
  const db = createKnex({ client: 'better-sqlite3', connection: { filename: file }, useNullAsDefault: true });
  const ownerId = newId();
  await db('users').insert({ id: ownerId, email: 'a@shop.example', name: 'A', password_hash: '-', created_at: STAMP });
  await openShop(db, { name: 'Plain', ownerId, timeZone: 'UTC' }, 'bench');
  await db.destroy();
}

/**
 * What somebody would write in an afternoon: the whole file through papaparse, every field checked, one transaction of
 * prepared inserts. Keeps no sums.
 */
export function plainImport(databaseFile: string, csv: string): void {
  const raw = new BetterSqlite3(databaseFile);
  preparePragmas(raw);
  const [shopId, userId] = raw.prepare('SELECT shop_id, user_id FROM memberships').raw().get() as [string, string];
  const lists = raw.prepare('SELECT name, id FROM categories WHERE shop_id = ?').raw().all(shopId) as [
    string,
    string,
  ][];
  const categories = new Map(lists);
  const rebuilds = new Map<string, string>();
  const importId = newId();
  const insert = (table: string, columns: string) =>
    raw.prepare(
      `INSERT INTO ${table} (${columns}) VALUES (${columns
        .split(',')
        .map(() => '?')
        .join(',')})`,
    );
  raw
    .transaction(() => {
      insert('imports', 'id,shop_id,file_name,file_sha256,byte_size,state,created_by,created_at').run(
        importId,
        shopId,
        'ledger.csv',
        'x',
        1,
        'committed',
        userId,
        STAMP,
      );
      const addRow = insert('import_rows', 'shop_id,import_id,sheet,row,cells,outcome,reason');
      const addRebuild = insert('rebuilds', 'id,shop_id,tag,import_id,import_sheet,import_row,created_at');
      const addEntry = insert(
        'entries',
        'id,shop_id,rebuild_id,category_id,dated_on,cents,vendor,what,foreseen,is_extra,is_guess,import_id,import_sheet,import_row,import_col,created_at,created_by',
      );
      const { data } = papaparse.parse<string[]>(readFileSync(csv, 'utf8'), { skipEmptyLines: true });
      data.forEach((cells, index) => {
        const [day = '', tag = '', kind = '', what = '', planned = '', amount = ''] = cells.map((cell) => cell.trim());
        const row = index + 1;
        const cents = parseCents(amount);
        const category = categories.get(kind);
        const isData = isDay(day) && cents !== null && category !== undefined && tag !== '' && what.length <= 500;
        addRow.run(shopId, importId, 1, row, JSON.stringify(cells), isData ? 'taken' : 'not data', null);
        if (!isData) return;
        let rebuildId = rebuilds.get(tag);
        if (rebuildId === undefined) {
          rebuildId = newId();
          rebuilds.set(tag, rebuildId);
          addRebuild.run(rebuildId, shopId, tag, importId, 1, row, STAMP);
        }
        const foreseen = planned === 'no' ? 'surprise' : 'foreseen';
        const place = [newId(), shopId, rebuildId, category, day, cents, null, what, foreseen, 0, 0];
        addEntry.run(...place, importId, 1, row, 5, STAMP, userId);
      });
    })
    .immediate();
  raw.close();
}
