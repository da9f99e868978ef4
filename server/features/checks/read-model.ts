import type { ChecksAnswer } from '#shared/contracts/checks.ts';
import type { Day } from '#shared/day.ts';
import { readShopFacts } from '../../books/shop-facts.ts';
import { type Database, type RawDatabase, rawHandle } from '../../platform/database.ts';
import {
  beforePurchase,
  guesses,
  longDays,
  putAsideRows,
  receiptsTwice,
  refundsAsCost,
  toCome,
} from './entry-checks.ts';
import { findFaults, type RowFinding } from './find-faults.ts';
import type { NumberedVehicle } from './vehicle-numbers.ts';

interface Kept {
  readonly key: string;
  readonly answer: ChecksAnswer;
}
// The last answer of each warehouse: looking for doubled receipts goes through every entry of the shop.
const memory = new WeakMap<Database, Kept>();

/** What is missing or odd in a shop's books, all read at one moment; kept until the books change. */
export async function readChecks(database: Database, shopId: string, today: Day): Promise<ChecksAnswer> {
  const raw = await rawHandle(database.reader);
  return raw.transaction(() => {
    const version = raw.prepare('SELECT books_version FROM shops WHERE id = ?').pluck().get(shopId);
    const key = `${shopId} ${version} ${today}`;
    const kept = memory.get(database);
    if (kept?.key === key) return kept.answer;
    const answer = checksOf(raw, shopId, today);
    memory.set(database, { key, answer });
    return answer;
  })();
}

function checksOf(raw: RawDatabase, shopId: string, today: Day): ChecksAnswer {
  const asked = { shopId, today };
  const { rebuilds } = readShopFacts(raw, shopId);
  const rows: RowFinding[] = [
    {
      kind: 'receipt twice',
      grade: 'wrong',
      answers: ['year', 'what-pays', 'overruns', 'contingency'],
      faults: receiptsTwice(raw, asked),
    },
    {
      kind: 'refund as cost',
      grade: 'wrong',
      answers: ['year', 'what-pays', 'overruns', 'contingency'],
      faults: refundsAsCost(raw, asked),
    },
    {
      kind: 'rows put aside',
      grade: 'wrong',
      answers: ['year', 'what-pays', 'overruns', 'contingency'],
      faults: putAsideRows(raw, asked),
    },
    { kind: 'long day', grade: 'wrong', answers: ['what-pays', 'year'], faults: longDays(raw, asked) },
    { kind: 'entry before purchase', grade: 'unsure', answers: ['year'], faults: beforePurchase(raw, asked) },
    { kind: 'day to come', grade: 'unsure', answers: ['year'], faults: toCome(raw, asked) },
    {
      kind: 'guessed figure',
      grade: 'unsure',
      answers: ['year', 'what-pays', 'overruns', 'contingency'],
      faults: guesses(raw, asked),
    },
  ];
  const vehicles = raw
    .prepare(`SELECT id, vin FROM rebuilds WHERE shop_id = ? AND vin <> '' ORDER BY created_at, id`)
    .all(shopId) as NumberedVehicle[];
  const settled = raw
    .prepare(`SELECT kind || ' ' || item_key FROM settled_checks WHERE shop_id = ?`)
    .pluck()
    .all(shopId) as string[];
  return findFaults({ today, rebuilds, vehicles, rows, settled: new Set(settled) });
}
