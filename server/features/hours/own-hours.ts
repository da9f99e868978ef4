import type { z } from 'zod';
import type { HoursEntry, newOwnHoursSchema, OwnHours } from '#shared/contracts/hours.ts';
import type { Rebuild } from '#shared/contracts/rebuilds.ts';
import { type Day, dayInZone } from '#shared/day.ts';
import type { Books } from '../../books/books.ts';
import { refuseStrangers } from '../../books/references.ts';
import type { ShopScope } from '../../books/scope.ts';
import type { Actor } from '../../platform/http.ts';
import { impossible, ProblemError } from '../../platform/problems.ts';
import { type FoundHours, hoursRow, namedHours, readHours } from './list.ts';
import { ownWorker } from './own-worker.ts';

type NewOwnHours = z.output<typeof newOwnHoursSchema>;

const LATEST = 50;

/** A person's latest hours: those of their worker. */
export async function listOwnHours(scope: ShopScope, userId: string): Promise<OwnHours[]> {
  const rows = namedHours(scope).where('w.user_id', userId).whereNull('hours.voided_at').limit(LATEST);
  const zone = await zoneOf(scope);
  return (await readHours(rows)).map((row) => asOwn(row, userId, zone));
}

export async function logOwnHours(books: Books, actor: Actor, body: NewOwnHours, today: Day): Promise<HoursEntry> {
  await refuseClosed(books, body.rebuildId);
  refuseAhead(body.workedOn, today);
  const worker = await ownWorker(books, actor);
  return books.hours.create({ ...body, workerId: worker.id, isPaid: worker.isPaid });
}

/** The row as the trail keeps it, if it is this person's and was logged today; else a clear refusal. */
export async function ownHoursOfToday(scope: ShopScope, userId: string, id: string): Promise<FoundHours> {
  const row = await hoursRow(scope, id);
  const worker = row.workerId ? await scope.find<{ userId: string | null }>('workers', row.workerId) : null;
  if (worker?.userId !== userId) throw new ProblemError(404, { detail: 'There is no such thing in this shop.' });
  if (!isOwnOfToday(row, userId, await zoneOf(scope))) {
    throw new ProblemError(403, { detail: 'These were not logged by you today. Ask whoever keeps the books.' });
  }
  return row;
}

export async function ownRow(scope: ShopScope, userId: string, id: string): Promise<OwnHours> {
  return asOwn(await hoursRow(scope, id), userId, await zoneOf(scope));
}

/** Own hours go on a rebuild that is still in the shop. */
export async function refuseClosed({ scope, rebuilds }: Books, rebuildId: string | undefined): Promise<void> {
  if (!rebuildId) return;
  await refuseStrangers(scope, [{ pointer: '/rebuildId', table: 'rebuilds', id: rebuildId }]);
  const rebuild: Rebuild = await rebuilds.get(rebuildId);
  if (rebuild.soldOn || rebuild.exitKind) {
    throw impossible('/rebuildId', 'This one has left the shop. Tell whoever keeps the books.');
  }
}

export function refuseAhead(workedOn: Day | undefined, today: Day): void {
  if (workedOn && workedOn > today) throw impossible('/workedOn', 'That day is still to come.');
}

function asOwn(row: FoundHours, userId: string, zone: string): OwnHours {
  const { id, rebuildId, rebuildTag, rebuildName, workedOn, seconds, task, version } = row;
  const canChange = !row.voidedAt && isOwnOfToday(row, userId, zone);
  return { id, rebuildId, rebuildTag, rebuildName, workedOn, seconds, task, version, canChange };
}

// Both by the machine's clock, which stamps what is written; the demo shop's own day stands still.
const isOwnOfToday = (row: FoundHours, userId: string, zone: string) =>
  row.createdBy === userId && dayInZone(new Date(row.createdAt), zone) === dayInZone(new Date(), zone);

async function zoneOf({ db, shopId }: ShopScope): Promise<string> {
  const shop = await db('shops').where({ id: shopId }).first<{ time_zone: string }>('time_zone');
  return shop.time_zone;
}
