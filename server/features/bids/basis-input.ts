import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import type { FeeTable } from '#shared/contracts/bids-parts.ts';
import type { Rule } from '#shared/contracts/rules.ts';
import type { Day } from '#shared/day.ts';
import type { CarTraits } from '#shared/measures/ladder-rungs.ts';
import type { Named, ShopFacts } from '../../books/shop-facts.ts';
import type { Car } from '../../domain/ladder.ts';
import type { SurpriseEntry } from '../../domain/surprise-groups.ts';

/** What the basis of the pre-bid sheets is worked out from: the facts as of today, and what else the shop has said. */
export interface BasisInput {
  readonly shop: ShopFacts;
  readonly today: Day;
  readonly feeTable: FeeTable;
  readonly ruleInForce: Rule | null;
  readonly surprises: readonly SurpriseEntry[];
  readonly words: Pick<BidBasis, 'classes' | 'damages' | 'categories'>;
}

/** Facts call things by name, a contract by id. */
export function idsOf({ classes, damages, categories }: BasisInput['words']) {
  const finder = (list: readonly Named[]) => {
    const ids = new Map(list.map(({ id, name }) => [name, id]));
    return (name: string | null): string | null => (name === null ? null : (ids.get(name) ?? null));
  };
  const [classId, damageId, categoryId] = [finder(classes), finder(damages), finder(categories)];
  return {
    classId,
    damageId,
    categoryId,
    traits: ({ class: name, damage, seen }: Car): CarTraits => {
      return { classId: classId(name), damageId: damageId(damage), isSeen: seen };
    },
    /** Per category, in the shop's order. */
    inOrder: <T>(byName: ReadonlyMap<string, T>): (T & { categoryId: string })[] =>
      categories.flatMap(({ id, name }) => {
        const found = byName.get(name);
        return found ? [{ categoryId: id, ...found }] : [];
      }),
  };
}

export type Ids = ReturnType<typeof idsOf>;
