import { ledgerApi } from '#shared/contracts/ledger.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { entryDetail } from './detail.ts';
import { entryRow, listEntries } from './list.ts';
import { addEntry, changeEntry, noteReceipt, splitBill } from './save-entry.ts';

export const ledgerRoutes: Route[] = [
  route(ledgerApi.list, (ctx) => listEntries(reading(ctx), ctx.query)),

  route(ledgerApi.get, async (ctx) => {
    const entry = await entryDetail(reading(ctx), ctx.params.entryId);
    return { version: entry.version, versioned: entry };
  }),

  route(ledgerApi.create, (ctx) =>
    write(ctx, { action: 'add entry', subject: 'entry' }, async (books) => {
      const entry = await addEntry(books, ctx.body);
      const reply = await entryRow(books.scope, entry.id);
      return { id: entry.id, before: null, after: entry, reply, version: entry.version };
    }),
  ),

  route(ledgerApi.split, (ctx) =>
    write(ctx, { action: 'split bill', subject: 'split' }, async (books) => {
      const entries = await splitBill(books, ctx.body);
      const reply = [];
      for (const entry of entries) reply.push(await entryRow(books.scope, entry.id));
      return { id: entries[0]?.splitId ?? null, before: null, after: entries, reply };
    }),
  ),

  route(ledgerApi.update, (ctx) =>
    write(ctx, { action: 'change entry', subject: 'entry' }, async (books) => {
      const before = await books.entries.get(ctx.params.entryId);
      const after = await changeEntry(books, before, ctx.ifMatch ?? 0, ctx.body);
      const reply = await entryRow(books.scope, after.id);
      return { id: after.id, before, after, reply, version: after.version };
    }),
  ),

  route(ledgerApi.void, (ctx) =>
    write(ctx, { action: 'void entry', subject: 'entry' }, async (books) => {
      const before = await books.entries.get(ctx.params.entryId);
      const after = await books.entries.void(before.id, ctx.ifMatch ?? 0, ctx.body.reason);
      const reply = await entryRow(books.scope, after.id);
      return { id: after.id, before, after, reply, version: after.version };
    }),
  ),

  route(ledgerApi.noteReceipt, async (ctx) => {
    const today = await ctx.today();
    return write(ctx, { action: 'hand in receipt', subject: 'entry' }, async (books) => {
      const entry = await noteReceipt(books, ctx.body, today);
      return { id: entry.id, before: null, after: entry, reply: { id: entry.id, what: entry.what ?? '' } };
    });
  }),
];

const reading = (ctx: Pick<Context, 'services' | 'actor'>) => shopScope(ctx.services.database.reader, ctx.actor.shopId);
