import type { Knex } from 'knex';
import { newId } from '../platform/ids.ts';
import { DEFAULT_LISTS, listStore, type StartingLists } from './lists.ts';
import { shopScope } from './scope.ts';
import { leaveTrail } from './trail.ts';

export interface NewShop {
  readonly name: string;
  readonly ownerId: string;
  readonly timeZone: string;
  readonly currency?: string;
  readonly locale?: string;
  readonly yearStartMonth?: number;
  readonly wantedCentsPerHour?: number | null;
  /** The demo shop's calendar stands still on this day. */
  readonly fixedToday?: string | null;
  readonly lists?: StartingLists;
}

/** Opens a shop with its owner and the lists it starts out with. Gives the shop's id. */
export async function openShop(trx: Knex, shop: NewShop, requestId: string): Promise<string> {
  const id = newId();
  const createdAt = new Date().toISOString();
  await trx('shops').insert({
    id,
    name: shop.name,
    currency: shop.currency ?? 'USD',
    locale: shop.locale ?? 'en-US',
    time_zone: shop.timeZone,
    year_start_month: shop.yearStartMonth ?? 1,
    wanted_cents_per_hour: shop.wantedCentsPerHour ?? null,
    is_demo: shop.fixedToday ? 1 : 0,
    fixed_today: shop.fixedToday ?? null,
    created_at: createdAt,
  });
  await trx('memberships').insert({ shop_id: id, user_id: shop.ownerId, role: 'owner', joined_at: createdAt });
  await listStore(shopScope(trx, id)).start(shop.lists ?? DEFAULT_LISTS);
  await leaveTrail(trx, {
    shopId: id,
    actorId: shop.ownerId,
    requestId,
    action: 'open shop',
    subject: 'shop',
    subjectId: id,
    before: null,
    after: { name: shop.name },
  });
  return id;
}
