import type { Day } from '#shared/day.ts';
import { commit } from '../../server/books/write.ts';
import { adoptRule } from '../../server/features/rules/adopt-rule.ts';
import type { Services } from '../../server/platform/http.ts';
import type { DemoShop } from './open-demo-shop.ts';

/** The shop began to set rules in January 2025, each on what was known then. */
const ADOPTED: readonly { readonly year: number; readonly on: Day; readonly note: string }[] = [
  { year: 2025, on: '2025-01-04', note: 'First winter with a rule' },
  { year: 2026, on: '2026-01-03', note: 'Set anew over all years' },
];

/** Were the shop's rules adopted, by the seed or by a visitor? */
export async function areRulesAdopted({ database }: Services, { shopId }: DemoShop): Promise<boolean> {
  return (await database.reader('contingency_rules').where({ shop_id: shopId }).first('id')) !== undefined;
}

/** Adopts a rule for each of the last two years, as the shop would have: so there is one to look back at. */
export async function adoptRules({ database }: Services, shop: DemoShop): Promise<void> {
  const { shopId, ownerId: userId, requestId } = shop;
  const write = {
    action: 'adopt rule',
    subject: 'rule',
    once: null,
    toJson: (reply: unknown) => JSON.stringify(reply),
  };
  for (const { year, on: today, note } of ADOPTED) {
    await commit(database, { shopId, userId, requestId, ...write }, async ({ scope }) => {
      const wish = { year, today, note, userId, level: '4/5', kind: 'percent' } as const;
      const { before, after } = await adoptRule(scope, wish);
      return { id: after.id, before, after, reply: null };
    });
  }
}
