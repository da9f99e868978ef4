import type { Knex } from 'knex';
import { sha256 } from '../platform/ids.ts';

export interface TrailRecord {
  readonly shopId: string;
  readonly actorId: string | null;
  readonly requestId: string;
  /** What was done, in words: "void entry". */
  readonly action: string;
  readonly subject: string;
  readonly subjectId: string | null;
  readonly before: unknown;
  readonly after: unknown;
}

/**
 * Adds to the append-only trail. Each record carries the hash of the one before it in its shop, so that a
 * record that was changed or taken out later shows.
 */
export async function leaveTrail(trx: Knex, record: TrailRecord): Promise<void> {
  const last = await trx('trail')
    .where({ shop_id: record.shopId })
    .orderBy('number', 'desc')
    .first<{ hash: string } | undefined>('hash');
  await trx('trail').insert(chained(record, last?.hash ?? '', new Date().toISOString()));
}

/** The row of a record that follows the one with hash `previous`. */
export function chained(record: TrailRecord, previous: string, happenedAt: string) {
  const row = {
    shop_id: record.shopId,
    happened_at: happenedAt,
    actor_id: record.actorId,
    request_id: record.requestId,
    action: record.action,
    subject: record.subject,
    subject_id: record.subjectId,
    before: record.before == null ? null : JSON.stringify(record.before),
    after: record.after == null ? null : JSON.stringify(record.after),
    previous_hash: previous,
  };
  return { ...row, hash: sha256(JSON.stringify(row)) };
}
