import { checksApi } from '#shared/contracts/checks.ts';
import { sendKept } from '../../books/kept-replies.ts';
import { settledChecks } from '../../books/settled-checks.ts';
import { write } from '../../books/write.ts';
import { type Route, route } from '../../platform/http.ts';
import { impossible } from '../../platform/problems.ts';
import { keptChecks, readChecks } from './read-model.ts';

export const checksRoutes: Route[] = [
  route(checksApi.show, async (ctx) =>
    sendKept(ctx, await keptChecks(ctx.services.database, ctx.actor.shopId, await ctx.today())),
  ),

  route(checksApi.settle, async (ctx) => {
    const { kind, key, isSettled, note } = ctx.body;
    const { findings } = await readChecks(ctx.services.database, ctx.actor.shopId, await ctx.today());
    const item = findings.find((one) => one.kind === kind)?.items.find((one) => one.key === key);
    if (!item) throw impossible('/key', 'This does not stand on the data check any more.');
    return write(ctx, { action: isSettled ? 'find right' : 'reopen check', subject: 'check' }, async (books) => {
      const store = settledChecks(books.scope, ctx.actor.userId);
      await (isSettled ? store.settle(kind, key) : store.reopen(kind, key));
      const reply = { kind, key, isSettled };
      return { id: null, before: { ...reply, isSettled: item.isSettled }, after: { ...reply, note }, reply };
    });
  }),
];
