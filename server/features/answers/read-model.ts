import type { Day } from '#shared/day.ts';
import { asOf } from '../../books/facts-as-of.ts';
import { pooledFlows } from '../../books/flows.ts';
import { type KeptReply, keptReply } from '../../books/kept-replies.ts';
import { readRules } from '../../books/rules.ts';
import type { ShopFacts } from '../../books/shop-facts.ts';
import { spentBy, tiedUpOn } from '../../books/spent-by.ts';
import type { Database, RawDatabase } from '../../platform/database.ts';
import type { AnswerInput } from './input.ts';

/** Answers a question about a shop, or gives the answer that was kept. */
export function keptAnswer(
  database: Database,
  { shopId, today, question }: { readonly shopId: string; readonly today: Day; readonly question: string },
  workOut: (input: AnswerInput) => string,
): Promise<KeptReply> {
  return keptReply(database, { shopId, question: `${today} ${question}` }, (raw, facts) =>
    workOut(inputOf(raw, facts, today)),
  );
}

/** What the answers are worked out from, on this connection. Only valid inside its transaction. */
export function inputOf(raw: RawDatabase, facts: ShopFacts, today: Day): AnswerInput {
  const shop = asOf(facts, today);
  let byId: AnswerInput['byId'] | undefined;
  return {
    shop,
    today,
    get byId() {
      byId ??= new Map(shop.rebuilds.map((rebuild) => [rebuild.id, rebuild]));
      return byId;
    },
    tiedUpOn: (on) => tiedUpOn(raw, shop.shopId, shop.rebuilds, on),
    spentBy: (ids, on) => spentBy(raw, shop.shopId, ids, on),
    flowsOf: (ids) => pooledFlows(raw, shop.shopId, ids),
    rules: () => readRules(raw, shop.shopId),
    otherExits: [],
  };
}
