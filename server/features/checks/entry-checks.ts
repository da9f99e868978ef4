import type { CheckItem } from '#shared/contracts/checks.ts';
import type { Day } from '#shared/day.ts';
import type { RawDatabase } from '../../platform/database.ts';

/** A fault among the rows of the books, before its rebuild is named. */
export type RowFault = Pick<CheckItem, 'key' | 'entryIds' | 'importId' | 'on' | 'cents' | 'text'> & {
  readonly rebuildId: string | null;
};

/** More than this by one person on one day is an open clock, not work: seconds. */
const LONG_DAY = 12 * 3600;

interface Asked {
  readonly shopId: string;
  readonly today: Day;
}
type Row = Omit<RowFault, 'entryIds' | 'key'> & { readonly ids: string };

/** Rows of a query that names its columns as a fault's fields; `ids` are joined by commas. The first id is the key. */
function faults(raw: RawDatabase, sql: string, asked: Asked): RowFault[] {
  const rows = raw.prepare(sql).all({ shop: asked.shopId, today: asked.today, long: LONG_DAY }) as Row[];
  return rows.map(({ ids, ...row }) => {
    const entryIds = ids === '' ? [] : ids.split(',');
    return { ...row, entryIds, key: entryIds.join('.').slice(0, 200) };
  });
}

const LIVE = 'shop_id = @shop AND voided_at IS NULL';
const WORDS = `nullif(trim(coalesce(vendor, '') || ' ' || coalesce(what, '')), '')`;

/** Same rebuild, category, day, amount, vendor and words: one bill booked twice, or two honest equal ones. */
export const receiptsTwice = (raw: RawDatabase, asked: Asked) =>
  faults(
    raw,
    `SELECT group_concat(id) AS ids, rebuild_id AS rebuildId, NULL AS importId, dated_on AS "on",
       cents * (count(*) - 1) AS cents, min(${WORDS}) AS text
     FROM entries WHERE ${LIVE} AND cents <> 0 AND dated_on IS NOT NULL AND split_id IS NULL
     GROUP BY rebuild_id, dated_on, cents, category_id, coalesce(vendor, ''), coalesce(what, '') HAVING count(*) > 1
     ORDER BY dated_on DESC`,
    asked,
  );

const ONE = `id AS ids, rebuild_id AS rebuildId, NULL AS importId, dated_on AS "on"`;

/** Words of a refund on an amount that was paid: counted twice over, since it should have been taken off. */
export const refundsAsCost = (raw: RawDatabase, asked: Asked) =>
  faults(
    raw,
    `SELECT ${ONE}, cents * 2 AS cents, ${WORDS} AS text FROM entries
     WHERE ${LIVE} AND cents > 0 AND (what LIKE '%refund%' OR what LIKE '%returned%' OR what LIKE '%core return%'
       OR what LIKE '%credit note%' OR what LIKE '%money back%')
     ORDER BY dated_on DESC`,
    asked,
  );

/** Bought before it was bought: a slip in a day, or a trip before the purchase. */
export const beforePurchase = (raw: RawDatabase, asked: Asked) =>
  faults(
    raw,
    `SELECT e.id AS ids, e.rebuild_id AS rebuildId, NULL AS importId, e.dated_on AS "on", e.cents,
       nullif(trim(coalesce(e.vendor, '') || ' ' || coalesce(e.what, '')), '') AS text
     FROM entries e JOIN rebuilds r ON r.shop_id = e.shop_id AND r.id = e.rebuild_id
     WHERE e.shop_id = @shop AND e.voided_at IS NULL AND e.dated_on < r.bought_on ORDER BY e.dated_on DESC`,
    asked,
  );

/** Dated after today. */
export const toCome = (raw: RawDatabase, asked: Asked) =>
  faults(
    raw,
    `SELECT ${ONE}, cents, ${WORDS} AS text FROM entries WHERE ${LIVE} AND dated_on > @today ORDER BY dated_on`,
    asked,
  );

/** Amounts that a file said only roughly. */
export const guesses = (raw: RawDatabase, asked: Asked) =>
  faults(
    raw,
    `SELECT ${ONE}, cents, ${WORDS} AS text FROM entries WHERE ${LIVE} AND is_guess = 1 ORDER BY abs(cents) DESC`,
    asked,
  );

/** One line of hours longer than a working day can be. Lines without a day are totals and may be longer. */
export function longDays(raw: RawDatabase, asked: Asked): RowFault[] {
  const rows = faults(
    raw,
    `SELECT h.id AS ids, h.rebuild_id AS rebuildId, NULL AS importId, h.worked_on AS "on", NULL AS cents,
       printf('%g hours', round(h.seconds / 3600.0, 2)) || coalesce(', ' || w.name, '') AS text
     FROM hours h LEFT JOIN workers w ON w.shop_id = h.shop_id AND w.id = h.worker_id
     WHERE h.shop_id = @shop AND h.voided_at IS NULL AND h.worked_on IS NOT NULL AND h.seconds > @long
     ORDER BY h.worked_on DESC`,
    asked,
  );
  return rows.map((row) => ({ ...row, entryIds: [] }));
}

/** Files in the books of which rows were put aside: money that stands in no figure. */
export function putAsideRows(raw: RawDatabase, { shopId }: Asked): RowFault[] {
  const rows = raw
    .prepare(
      `SELECT id AS importId, file_name AS name, json_extract(reading, '$.control.putAside') AS rows,
         json_extract(reading, '$.control.putAsideCents') AS cents
       FROM imports WHERE shop_id = ? AND state = 'committed' AND json_extract(reading, '$.control.putAside') > 0
       ORDER BY committed_at DESC`,
    )
    .all(shopId) as { importId: string; name: string; rows: number; cents: number }[];
  return rows.map(({ importId, name, rows: count, cents }) => ({
    key: importId,
    rebuildId: null,
    entryIds: [],
    importId,
    on: null,
    cents,
    text: `${name}: ${count} ${count === 1 ? 'row' : 'rows'}`,
  }));
}
