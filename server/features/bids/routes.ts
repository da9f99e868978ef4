import { bidsApi } from '#shared/contracts/bids.ts';
import { feeTableStore } from '../../books/bid-fees.ts';
import { bidStore } from '../../books/bid-sheets.ts';
import { sendKept } from '../../books/kept-replies.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { buyBid } from './buy-bid.ts';
import { listBids } from './list.ts';
import { type BasisAsked, basisNow, keptBasis } from './read-model.ts';
import { changeBid, createBid, setOutcome } from './save-bid.ts';

export const bidsRoutes: Route[] = [
  route(bidsApi.basis, async (ctx) => sendKept(ctx, await keptBasis(ctx.services.database, await asking(ctx)))),

  route(bidsApi.feeTable, async (ctx) => {
    const table = await feeTableStore(reading(ctx)).get();
    return { version: table.version, versioned: table };
  }),

  route(bidsApi.changeFeeTable, (ctx) =>
    write(ctx, { action: 'change fee table', subject: 'fee table' }, async ({ scope }) => {
      const store = feeTableStore(scope);
      const before = await store.get();
      const after = await store.replace(ctx.ifMatch ?? 0, ctx.body);
      return { id: scope.shopId, before, after, reply: after, version: after.version };
    }),
  ),

  route(bidsApi.list, (ctx) => listBids(reading(ctx), ctx.query)),

  route(bidsApi.get, async (ctx) => {
    const bid = await bidStore(reading(ctx)).get(ctx.params.bidId);
    return { version: bid.version, versioned: bid };
  }),

  route(bidsApi.create, async (ctx) => {
    const { shown, ...fields } = ctx.body;
    const basis = await basisNow(ctx.services.database, await asking(ctx));
    return write(ctx, { action: 'keep sheet', subject: 'bid' }, async (books) => {
      const kept = await createBid(books, fields, { basis, shown, userId: ctx.actor.userId });
      return { id: kept.bid.id, before: null, after: kept.bid, reply: kept, version: kept.bid.version };
    });
  }),

  route(bidsApi.change, async (ctx) => {
    const { shown, ...change } = ctx.body;
    const basis = await basisNow(ctx.services.database, await asking(ctx));
    return write(ctx, { action: 'change sheet', subject: 'bid' }, async (books) => {
      const before = await bidStore(books.scope).get(ctx.params.bidId);
      const kept = await changeBid(books, before, change, { basis, shown, version: ctx.ifMatch ?? 0 });
      return { id: before.id, before, after: kept.bid, reply: kept, version: kept.bid.version };
    });
  }),

  route(bidsApi.setOutcome, (ctx) =>
    write(ctx, { action: 'close or open sheet', subject: 'bid' }, async ({ scope }) => {
      const bids = bidStore(scope);
      const before = await bids.get(ctx.params.bidId);
      const after = await setOutcome(bids, before, ctx.ifMatch ?? 0, ctx.body);
      return { id: after.id, before, after, reply: after, version: after.version };
    }),
  ),

  route(bidsApi.buy, async (ctx) => {
    const found = await bidStore(reading(ctx)).get(ctx.params.bidId);
    // A second press: it is bought already, and nothing new is made.
    if (found.rebuildId) return { version: found.version, versioned: { bid: found, rebuildId: found.rebuildId } };
    const { categories, asOf: today } = await basisNow(ctx.services.database, await asking(ctx));
    return write(ctx, { action: 'buy from sheet', subject: 'bid' }, async (books) => {
      const before = await bidStore(books.scope).get(ctx.params.bidId);
      const bid = await buyBid(books, before, ctx.body, { version: ctx.ifMatch ?? 0, categories, today });
      return { id: bid.id, before, after: bid, reply: { bid, rebuildId: bid.rebuildId ?? '' }, version: bid.version };
    });
  }),
];

const reading = (ctx: Pick<Context, 'services' | 'actor'>) => shopScope(ctx.services.database.reader, ctx.actor.shopId);

async function asking(ctx: Pick<Context, 'services' | 'actor' | 'today'>): Promise<BasisAsked> {
  const feeTable = await feeTableStore(reading(ctx)).get();
  return { shopId: ctx.actor.shopId, today: await ctx.today(), feeTable };
}
