import { hoursApi } from '#shared/contracts/hours.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { openBoard } from './board.ts';
import { hoursRow, listHours } from './list.ts';
import { listOwnHours, logOwnHours, ownHoursOfToday, ownRow, refuseAhead, refuseClosed } from './own-hours.ts';
import { addHours, changeHours } from './save-hours.ts';

const booksRoutes: Route[] = [
  route(hoursApi.list, (ctx) => listHours(reading(ctx), ctx.query)),

  route(hoursApi.create, (ctx) =>
    write(ctx, { action: 'add hours', subject: 'hours' }, async (books) => {
      const hours = await addHours(books, ctx.body);
      const reply = await hoursRow(books.scope, hours.id);
      return { id: hours.id, before: null, after: hours, reply, version: hours.version };
    }),
  ),

  route(hoursApi.update, (ctx) =>
    write(ctx, { action: 'change hours', subject: 'hours' }, async (books) => {
      const before = await books.hours.get(ctx.params.hoursId);
      const after = await changeHours(books, before.id, ctx.ifMatch ?? 0, ctx.body);
      const reply = await hoursRow(books.scope, after.id);
      return { id: after.id, before, after, reply, version: after.version };
    }),
  ),

  route(hoursApi.void, (ctx) =>
    write(ctx, { action: 'void hours', subject: 'hours' }, async (books) => {
      const before = await books.hours.get(ctx.params.hoursId);
      const after = await books.hours.void(before.id, ctx.ifMatch ?? 0, ctx.body.reason);
      const reply = await hoursRow(books.scope, after.id);
      return { id: after.id, before, after, reply, version: after.version };
    }),
  ),
];

/** A person's own hours, without any money. */
const ownRoutes: Route[] = [
  route(hoursApi.board, (ctx) => openBoard(reading(ctx))),

  route(hoursApi.mine, (ctx) => listOwnHours(reading(ctx), ctx.actor.userId)),

  route(hoursApi.logMine, async (ctx) => {
    const today = await ctx.today();
    return write(ctx, { action: 'log own hours', subject: 'hours' }, async (books) => {
      const hours = await logOwnHours(books, ctx.actor, ctx.body, today);
      const reply = await ownRow(books.scope, ctx.actor.userId, hours.id);
      return { id: hours.id, before: null, after: hours, reply, version: hours.version };
    });
  }),

  route(hoursApi.changeMine, async (ctx) => {
    const today = await ctx.today();
    return write(ctx, { action: 'change own hours', subject: 'hours' }, async (books) => {
      const before = await ownHoursOfToday(books.scope, ctx.actor.userId, ctx.params.hoursId);
      await refuseClosed(books, ctx.body.rebuildId);
      refuseAhead(ctx.body.workedOn, today);
      const after = await books.hours.update(before.id, ctx.ifMatch ?? 0, ctx.body);
      const reply = await ownRow(books.scope, ctx.actor.userId, after.id);
      return { id: after.id, before, after, reply, version: after.version };
    });
  }),

  route(hoursApi.voidMine, (ctx) =>
    write(ctx, { action: 'void own hours', subject: 'hours' }, async (books) => {
      const before = await ownHoursOfToday(books.scope, ctx.actor.userId, ctx.params.hoursId);
      const after = await books.hours.void(before.id, ctx.ifMatch ?? 0, ctx.body.reason);
      const reply = await ownRow(books.scope, ctx.actor.userId, after.id);
      return { id: after.id, before, after, reply, version: after.version };
    }),
  ),
];

export const hoursRoutes: Route[] = [...booksRoutes, ...ownRoutes];

const reading = (ctx: Pick<Context, 'services' | 'actor'>) => shopScope(ctx.services.database.reader, ctx.actor.shopId);
