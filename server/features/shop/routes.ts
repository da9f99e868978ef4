import type { Shop } from '#shared/contracts/shop.ts';
import { shopApi } from '#shared/contracts/shop.ts';
import { listStore } from '../../books/lists.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { ProblemError } from '../../platform/problems.ts';
import { fromRow, toRow } from '../../platform/rows.ts';

export const shopRoutes: Route[] = [
  route(shopApi.get, async (ctx) => {
    const shop = await findShop(ctx.services.database.reader, ctx.actor.shopId);
    return { version: shop.version, versioned: shop };
  }),

  route(shopApi.update, (ctx) =>
    write(ctx, { action: 'change shop', subject: 'shop' }, async ({ scope }) => {
      const before = await findShop(scope.db, scope.shopId);
      const changed = await scope
        .db('shops')
        .where({ id: scope.shopId, version: ctx.ifMatch })
        .update({ ...toRow(ctx.body), version: before.version + 1 });
      if (changed !== 1)
        throw new ProblemError(412, { name: 'changed-meanwhile', detail: 'Someone changed the shop meanwhile.' });
      const after = await findShop(scope.db, scope.shopId);
      return { id: after.id, before, after, reply: after, version: after.version };
    }),
  ),

  route(shopApi.lists, (ctx) => listsOf(ctx).all()),

  route(shopApi.addItem, (ctx) =>
    write(ctx, { action: `add to ${ctx.params.kind}`, subject: ctx.params.kind }, async ({ lists }) => {
      const item = await lists.addItem(ctx.params.kind, ctx.body.name);
      return { id: item.id, before: null, after: item, reply: item, version: item.version };
    }),
  ),

  route(shopApi.changeItem, (ctx) =>
    write(ctx, { action: `change in ${ctx.params.kind}`, subject: ctx.params.kind }, async ({ lists }) => {
      const { kind, itemId } = ctx.params;
      const before = await lists.getItem(kind, itemId);
      const after = await lists.changeItem(kind, itemId, ctx.ifMatch ?? 0, ctx.body);
      return { id: itemId, before, after, reply: after, version: after.version };
    }),
  ),

  route(shopApi.addWorker, (ctx) =>
    write(ctx, { action: 'add worker', subject: 'worker' }, async ({ lists }) => {
      const worker = await lists.addWorker(ctx.body);
      return { id: worker.id, before: null, after: worker, reply: worker, version: worker.version };
    }),
  ),

  route(shopApi.changeWorker, (ctx) =>
    write(ctx, { action: 'change worker', subject: 'worker' }, async ({ lists }) => {
      const before = await lists.getWorker(ctx.params.workerId);
      const after = await lists.changeWorker(before.id, ctx.ifMatch ?? 0, ctx.body);
      return { id: after.id, before, after, reply: after, version: after.version };
    }),
  ),
];

function listsOf(ctx: Pick<Context, 'services' | 'actor'>) {
  return listStore(shopScope(ctx.services.database.reader, ctx.actor.shopId));
}

type Handle = ReturnType<typeof shopScope>['db'];

async function findShop(db: Handle, shopId: string): Promise<Shop> {
  return fromRow<Shop>(await db('shops').where({ id: shopId }).first<object>());
}
