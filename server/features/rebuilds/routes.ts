import { type RebuildName, rebuildsApi } from '#shared/contracts/rebuilds.ts';
import { NAME_SQL, OPEN_SQL } from '../../books/rebuild-words.ts';
import { type ShopScope, shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { fromRow } from '../../platform/rows.ts';
import { rebuildDetail } from './detail.ts';
import { listRebuilds } from './list.ts';
import { estimateOf, refuseUnknownLines } from './save-estimate.ts';
import { createRebuild, updateRebuild } from './save-rebuild.ts';

export const rebuildsRoutes: Route[] = [
  route(rebuildsApi.list, async (ctx) => listRebuilds(reading(ctx), ctx.query, await ctx.today())),

  route(rebuildsApi.names, (ctx) => rebuildNames(reading(ctx))),

  route(rebuildsApi.get, async (ctx) => {
    const detail = await rebuildDetail(reading(ctx), ctx.params.rebuildId, await ctx.today());
    return { version: detail.rebuild.version, versioned: detail };
  }),

  route(rebuildsApi.create, (ctx) =>
    write(ctx, { action: 'add rebuild', subject: 'rebuild' }, async (books) => {
      const rebuild = await createRebuild(books, ctx.body);
      return { id: rebuild.id, before: null, after: rebuild, reply: rebuild, version: rebuild.version };
    }),
  ),

  route(rebuildsApi.update, (ctx) =>
    write(ctx, { action: 'change rebuild', subject: 'rebuild' }, async (books) => {
      const before = await books.rebuilds.get(ctx.params.rebuildId);
      const after = await updateRebuild(books, before, ctx.ifMatch ?? 0, ctx.body);
      return { id: after.id, before, after, reply: after, version: after.version };
    }),
  ),

  route(rebuildsApi.addEstimate, async (ctx) => {
    const today = await ctx.today();
    return write(ctx, { action: 'add estimate', subject: 'estimate' }, async (books) => {
      const { id } = await books.rebuilds.get(ctx.params.rebuildId);
      await refuseUnknownLines(books, ctx.body.lines);
      const estimate = await books.estimates.create(id, ctx.body, today);
      return { id: estimate.id, before: null, after: estimate, reply: estimate, version: estimate.version };
    });
  }),

  route(rebuildsApi.changeEstimate, (ctx) =>
    write(ctx, { action: 'change estimate', subject: 'estimate' }, async (books) => {
      const before = await estimateOf(books, ctx.params.rebuildId, ctx.params.estimateId);
      await refuseUnknownLines(books, ctx.body.lines);
      const after = await books.estimates.update(before.id, ctx.ifMatch ?? 0, ctx.body);
      return { id: after.id, before, after, reply: after, version: after.version };
    }),
  ),

  route(rebuildsApi.lockEstimate, (ctx) =>
    write(ctx, { action: 'lock estimate', subject: 'estimate' }, async (books) => {
      const before = await estimateOf(books, ctx.params.rebuildId, ctx.params.estimateId);
      const after = await books.estimates.lock(before.id, ctx.ifMatch ?? 0);
      return { id: after.id, before, after, reply: after, version: after.version };
    }),
  ),
];

const reading = (ctx: Pick<Context, 'services' | 'actor'>) => shopScope(ctx.services.database.reader, ctx.actor.shopId);

async function rebuildNames({ db, shopId }: ShopScope): Promise<RebuildName[]> {
  const rows: object[] = await db.raw(
    `SELECT r.id, r.tag, ${NAME_SQL} AS name, (${OPEN_SQL}) AS is_open FROM rebuilds r
     LEFT JOIN vehicle_classes c ON c.shop_id = r.shop_id AND c.id = r.class_id
     WHERE r.shop_id = ? ORDER BY is_open DESC, r.bought_on DESC NULLS LAST, r.tag`,
    [shopId],
  );
  return rows.map((row) => fromRow<RebuildName>(row));
}
