import { rebuildRollup } from '../../server/books/rollup.ts';
import { type Database, rawHandle } from '../../server/platform/database.ts';
import { newId, newIds } from '../../server/platform/ids.ts';
import type { InventedLine, InventedRebuild } from './invent.ts';

const STAMP = '2026-06-15T12:00:00.000Z';

/** Puts invented books into a new shop, straight into the tables, and sums them. */
export async function fillShop(
  database: Database,
  shopId: string,
  rebuilds: readonly InventedRebuild[],
  lines: readonly InventedLine[],
): Promise<void> {
  const raw = await rawHandle(database.writer);
  const idsOf = (table: string) =>
    raw.prepare(`SELECT id FROM ${table} WHERE shop_id = ? ORDER BY position`).pluck().all(shopId) as string[];
  const [classes, damages, categories] = [idsOf('vehicle_classes'), idsOf('damage_types'), idsOf('categories')];
  const insert = (table: string, columns: string) =>
    raw.prepare(
      `INSERT INTO ${table} (${columns}) VALUES (${columns
        .split(',')
        .map(() => '?')
        .join(',')})`,
    );
  const addRebuild = insert(
    'rebuilds',
    'id,shop_id,tag,class_id,damage_id,is_seen,purchase_cents,sale_cents,bought_on,started_on,roadworthy_on,listed_on,sold_on,created_at',
  );
  const addEstimate = insert(
    'estimates',
    'id,shop_id,rebuild_id,revision,is_baseline,planned_seconds,locked_at,created_at',
  );
  const addPlan = insert('estimate_lines', 'shop_id,estimate_id,category_id,cents');
  const addHours = insert('hours', 'id,shop_id,rebuild_id,seconds,is_paid,created_at');
  const addEntry = insert('entries', 'id,shop_id,rebuild_id,category_id,dated_on,cents,foreseen,created_at');
  const rebuildIds = newIds(rebuilds.length);
  const entryIds = newIds(lines.length);
  raw.transaction(() => {
    for (const [i, one] of rebuilds.entries()) {
      const [id, estimateId] = [rebuildIds[i] ?? '', newId()];
      const words = [one.tag, classes[one.class], damages[one.damage], Number(one.isSeen)];
      const days = [one.boughtOn, one.startedOn, one.readyOn, one.listedOn, one.soldOn];
      addRebuild.run(id, shopId, ...words, one.purchaseCents, one.saleCents, ...days, STAMP);
      addEstimate.run(estimateId, shopId, id, 0, 1, one.plannedSeconds, STAMP, STAMP);
      for (const [c, cents] of one.plan.entries()) if (cents > 0) addPlan.run(shopId, estimateId, categories[c], cents);
      addHours.run(newId(), shopId, id, one.ownSeconds, 0, STAMP);
      addHours.run(newId(), shopId, id, one.paidSeconds, 1, STAMP);
    }
    for (const [i, line] of lines.entries()) {
      const rebuildId = line.rebuild === null ? null : rebuildIds[line.rebuild];
      const foreseen = line.isSurprise ? 'surprise' : 'foreseen';
      addEntry.run(entryIds[i], shopId, rebuildId, categories[line.category], line.on, line.cents, foreseen, STAMP);
    }
    rebuildRollup(raw, shopId);
    raw.prepare('UPDATE shops SET books_version = books_version + 1 WHERE id = ?').run(shopId);
  })();
}
