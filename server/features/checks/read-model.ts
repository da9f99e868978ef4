import { type ChecksAnswer, checksAnswerSchema, checksApi } from '#shared/contracts/checks.ts';
import type { Day } from '#shared/day.ts';
import { asOf } from '../../books/facts-as-of.ts';
import { type KeptReply, keptReply } from '../../books/kept-replies.ts';
import type { ShopFacts } from '../../books/shop-facts.ts';
import type { Database, RawDatabase } from '../../platform/database.ts';
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

/** What is missing or odd in a shop's books, as text kept like the answers until the books change. */
export function keptChecks(database: Database, shopId: string, today: Day): Promise<KeptReply> {
  const question = `${today} ${checksApi.show.path}`;
  return keptReply(database, { shopId, question }, (raw, facts) =>
    JSON.stringify(checksAnswerSchema.parse(checksOf(raw, facts, today))),
  );
}

/** The same, to go on with. */
export async function readChecks(database: Database, shopId: string, today: Day): Promise<ChecksAnswer> {
  return checksAnswerSchema.parse(JSON.parse((await keptChecks(database, shopId, today)).text));
}

function checksOf(raw: RawDatabase, facts: ShopFacts, today: Day): ChecksAnswer {
  const { shopId } = facts;
  const asked = { shopId, today };
  const { rebuilds } = asOf(facts, today);
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
