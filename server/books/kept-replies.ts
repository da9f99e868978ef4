import { gzipSync } from 'node:zlib';
import { type Database, type RawDatabase, rawHandle } from '../platform/database.ts';
import { type Context, Ready } from '../platform/http.ts';
import { readShopFacts, type ShopFacts } from './shop-facts.ts';

/** Shops whose facts stay in memory, and replies kept for each. */
const SHOPS_KEPT = 2;
const REPLIES_KEPT = 24;

/** A reply as text and, once it was asked for again, compressed: doing that anew each time costs more than the rest. */
export interface KeptReply {
  readonly text: string;
  gzip: Buffer | null;
}

interface KeptShop {
  readonly facts: ShopFacts;
  /** By question. */
  readonly replies: Map<string, KeptReply>;
}
type KeptShops = Map<string, KeptShop>;

// One memory per warehouse: tests run several in one process.
const memory = new WeakMap<Database, KeptShops>();

/**
 * Answers a question about a shop. Facts and replies are kept until the books' version changes; everything is
 * read at one moment, on a reading connection that waits for no writer. `question` names all that the reply goes by, the
 * day included.
 */
export async function keptReply(
  database: Database,
  { shopId, question }: { readonly shopId: string; readonly question: string },
  workOut: (raw: RawDatabase, facts: ShopFacts) => string,
): Promise<KeptReply> {
  const raw = await rawHandle(database.reader);
  return raw.transaction(() => {
    const kept = keptShop(raw, shopsOf(database), shopId);
    const known = kept.replies.get(question);
    if (known !== undefined) {
      known.gzip ??= gzipSync(known.text);
      return known;
    }
    const reply = { text: workOut(raw, kept.facts), gzip: null };
    keep(kept.replies, question, reply, REPLIES_KEPT);
    return reply;
  })();
}

/** Sends a kept reply, compressed if it is and the caller can read that. */
export function sendKept({ req, res }: Pick<Context, 'req' | 'res'>, { text, gzip }: KeptReply): Ready {
  res.vary('Accept-Encoding');
  if (gzip !== null && req.acceptsEncodings('gzip')) {
    res.set('Content-Encoding', 'gzip').type('application/json').send(gzip);
  }
  return new Ready(200, text);
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

/** Puts a value last in line; the one that was used longest ago makes room. */
function keep<T>(map: Map<string, T>, key: string, value: T, most: number): void {
  map.delete(key);
  map.set(key, value);
  const oldest = map.keys().next().value;
  if (map.size > most && oldest !== undefined) map.delete(oldest);
}
