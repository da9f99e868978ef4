import type { z } from 'zod';
import type { Contract } from '#shared/contract.ts';
import { type Database, rawHandle } from '../platform/database.ts';
import { type Context, Ready } from '../platform/http.ts';
import { ProblemError } from '../platform/problems.ts';
import { type Books, openBooks } from './books.ts';
import { refreshOverhead, refreshRollup } from './rollup.ts';
import { leaveTrail } from './trail.ts';

/** What a write did: to whom, what it was and what it became (for the trail), and what the caller is told. */
export interface Change<T> {
  readonly id: string | null;
  readonly before: unknown;
  readonly after: unknown;
  readonly reply: T;
  /** The version of what was written, for its ETag. */
  readonly version?: number;
}

export interface WriteName {
  /** In words, for the trail: "add entry". */
  readonly action: string;
  /** A noun: "entry". */
  readonly subject: string;
  readonly status?: number;
}

export interface Commission extends WriteName {
  readonly shopId: string;
  readonly userId: string | null;
  readonly requestId: string;
  readonly once: { readonly key: string; readonly fingerprint: string } | null;
  /** Turns the reply into the JSON that is sent, and kept for a repeat. */
  readonly toJson: (reply: unknown) => string;
}

/**
 * The one way into the books. One transaction holds the change, the sums it makes stale, the raised version of
 * the books, the record in the trail and the answer kept for a repeat with the same key: all of it or nothing.
 */
export function commit<T>(
  database: Database,
  commission: Commission,
  change: (books: Books) => Promise<Change<T>>,
): Promise<Ready> {
  const { shopId, userId, once, requestId, action, subject } = commission;
  return database.lock(() =>
    database.writer.transaction(async (trx) => {
      const earlier = once && userId ? await findReply(trx, shopId, userId, once) : null;
      if (earlier) return earlier;
      const books = openBooks(trx, shopId, userId);
      const done = await change(books);
      const raw = await rawHandle(trx);
      if (books.touched.rebuildIds.length > 0) refreshRollup(raw, shopId, books.touched.rebuildIds);
      if (books.touched.isOverhead) refreshOverhead(raw, shopId);
      await trx('shops').where({ id: shopId }).increment('books_version', 1);
      const { id: subjectId, before, after } = done;
      await leaveTrail(trx, { shopId, actorId: userId, requestId, action, subject, subjectId, before, after });
      const ready = new Ready(commission.status ?? 200, commission.toJson(done.reply), done.version ?? null);
      if (once && userId) {
        await trx('idempotency_keys').insert({
          shop_id: shopId,
          user_id: userId,
          ...once,
          status: ready.status,
          version: ready.version,
          body: ready.json,
          created_at: new Date().toISOString(),
        });
      }
      return ready;
    }),
  );
}

type Handle = Parameters<typeof leaveTrail>[0];

async function findReply(
  trx: Handle,
  shopId: string,
  userId: string,
  once: { key: string; fingerprint: string },
): Promise<Ready | null> {
  const kept = await trx('idempotency_keys')
    .where({ shop_id: shopId, user_id: userId, key: once.key })
    .first<{ fingerprint: string; status: number; body: string; version: number | null } | undefined>();
  if (!kept) return null;
  if (kept.fingerprint !== once.fingerprint) {
    throw new ProblemError(422, { detail: 'This Idempotency-Key was used for something else.' });
  }
  return new Ready(kept.status, kept.body, kept.version);
}

/** A request's write: `commit` with who asks, from where, and a reply checked by the request's contract. */
export function write<C extends Contract>(
  ctx: Context<C>,
  name: WriteName,
  change: (books: Books) => Promise<Change<z.input<C['response']>>>,
): Promise<Ready> {
  const { shopId, userId } = ctx.actor;
  return commit(
    ctx.services.database,
    {
      ...name,
      status: name.status ?? (ctx.contract.once ? 201 : 200),
      shopId,
      userId,
      requestId: String(ctx.req.id),
      once: ctx.once,
      toJson: (reply) => JSON.stringify(ctx.contract.response.parse(reply)),
    },
    change,
  );
}
