import { gzipSync } from 'node:zlib';
import type { Day } from '#shared/day.ts';
import { pooledFlows } from '../../books/flows.ts';
import { readRules } from '../../books/rules.ts';
import { readShopFacts, type ShopFacts } from '../../books/shop-facts.ts';
import { spentBy, tiedUpOn } from '../../books/spent-by.ts';
import { type Database, type RawDatabase, rawHandle } from '../../platform/database.ts';
import { type AnswerInput, asOf } from './input.ts';

/** Shops whose facts stay in memory, and answers kept for each. */
const SHOPS_KEPT = 2;
const ANSWERS_KEPT = 24;

/** A reply as text and, once it was asked for again, compressed: doing that anew each time costs more than the rest. */
export interface KeptReply {
  readonly text: string;
  gzip: Buffer | null;
}

interface KeptShop {
  readonly facts: ShopFacts;
  /** By day and question. */
  readonly replies: Map<string, KeptReply>;
}
type KeptShops = Map<string, KeptShop>;

// One memory per warehouse: tests run several in one process.
const memory = new WeakMap<Database, KeptShops>();

/**
 * Answers a question about a shop. Facts and replies are kept until the books' version changes; everything is
 * read at one moment, on a reading connection that waits for no writer.
 */
export async function keptAnswer(
  database: Database,
  asked: { readonly shopId: string; readonly today: Day; readonly question: string },
  workOut: (input: AnswerInput) => string,
): Promise<KeptReply> {
  const raw = await rawHandle(database.reader);
  return raw.transaction(() => {
    const kept = keptShop(raw, shopsOf(database), asked.shopId);
    const key = `${asked.today} ${asked.question}`;
    const known = kept.replies.get(key);
    if (known !== undefined) {
      known.gzip ??= gzipSync(known.text);
      return known;
    }
    const reply = { text: workOut(inputOf(raw, kept.facts, asked.today)), gzip: null };
    keep(kept.replies, key, reply, ANSWERS_KEPT);
    return reply;
  })();
}

function shopsOf(database: Database): KeptShops {
  const shops = memory.get(database) ?? new Map<string, KeptShop>();
  memory.set(database, shops);
  return shops;
}

function keptShop(raw: RawDatabase, shops: KeptShops, shopId: string): KeptShop {
  const version = raw.prepare('SELECT books_version FROM shops WHERE id = ?').pluck().get(shopId) as number;
  const kept = shops.get(shopId);
  const current =
    kept?.facts.booksVersion === version
      ? kept
      : { facts: readShopFacts(raw, shopId, kept?.facts), replies: new Map() };
  keep(shops, shopId, current, SHOPS_KEPT);
  return current;
}

/** What the answers are worked out from, on this connection. Only valid inside its transaction. */
export function inputOf(raw: RawDatabase, facts: ShopFacts, today: Day): AnswerInput {
  const shop = asOf(facts, today);
  let byId: AnswerInput['byId'] | undefined;
  return {
    shop,
    today,
    get byId() {
      byId ??= new Map(shop.rebuilds.map((rebuild) => [rebuild.id, rebuild]));
      return byId;
    },
    tiedUpOn: (on) => tiedUpOn(raw, shop.shopId, shop.rebuilds, on),
    spentBy: (ids, on) => spentBy(raw, shop.shopId, ids, on),
    flowsOf: (ids) => pooledFlows(raw, shop.shopId, ids),
    rules: () => readRules(raw, shop.shopId),
  };
}

/** Puts a value last in line; the one that was used longest ago makes room. */
function keep<T>(map: Map<string, T>, key: string, value: T, most: number): void {
  map.delete(key);
  map.set(key, value);
  const oldest = map.keys().next().value;
  if (map.size > most && oldest !== undefined) map.delete(oldest);
}
