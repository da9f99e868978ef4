import type { Worker } from '#shared/contracts/shop.ts';
import type { Books } from '../../books/books.ts';
import type { Actor } from '../../platform/http.ts';
import { fromRow } from '../../platform/rows.ts';

/**
 * The worker that stands for a member: the one linked to them, else the one of that name whom nobody is linked to,
 * else a new one. An owner's hours are unpaid to begin with, everyone else's are paid; the Shop page can change it.
 */
export async function ownWorker({ scope, lists }: Books, actor: Actor): Promise<Worker> {
  const linked: object | undefined = await scope.table('workers').where({ user_id: actor.userId }).first();
  if (linked) return fromRow<Worker>(linked);
  const { name } = await scope.db('users').where({ id: actor.userId }).first<{ name: string }>('name');
  const namesake: object | undefined = await scope.table('workers').whereRaw('name = ? COLLATE NOCASE', [name]).first();
  if (!namesake) return lists.addWorker({ name, isPaid: actor.role !== 'owner', userId: actor.userId });
  const worker = fromRow<Worker>(namesake);
  if (!worker.userId) return lists.changeWorker(worker.id, worker.version, { userId: actor.userId });
  return lists.addWorker({
    name: `${name} (${actor.userId.slice(0, 4)})`,
    isPaid: worker.isPaid,
    userId: actor.userId,
  });
}
