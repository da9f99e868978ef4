import { rulesApi } from '#shared/contracts/rules.ts';
import { readRules } from '../../books/rules.ts';
import { write } from '../../books/write.ts';
import { rawHandle } from '../../platform/database.ts';
import { type Route, route } from '../../platform/http.ts';
import { adoptRule } from './adopt-rule.ts';

export const rulesRoutes: Route[] = [
  route(rulesApi.list, async (ctx) => {
    return { rules: readRules(await rawHandle(ctx.services.database.reader), ctx.actor.shopId) };
  }),

  route(rulesApi.adopt, async (ctx) => {
    const today = await ctx.today();
    return write(ctx, { action: 'adopt rule', subject: 'rule' }, async ({ scope }) => {
      const { before, after } = await adoptRule(scope, { ...ctx.body, userId: ctx.actor.userId, today });
      return { id: after.id, before, after, reply: after };
    });
  }),
];
