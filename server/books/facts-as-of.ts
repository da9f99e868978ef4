import type { Day } from '#shared/day.ts';
import { notYetLeft } from './shop-facts-rows.ts';
import type { ShopFacts } from './shop-facts.ts';

/** The facts as they stand at the end of a day: who leaves later has not left, overhead of later days is not paid. */
export function asOf(shop: ShopFacts, today: Day): ShopFacts {
  return {
    ...shop,
    rebuilds: shop.rebuilds.map((one) => (one.exit && one.exit.on > today ? notYetLeft(one) : one)),
    overhead: shop.overhead.filter(({ on }) => on <= today),
  };
}
