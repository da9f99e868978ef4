import type { AnswerQuery, LeftOut, LeftOutReason, RebuildRef, WithoutOne } from '#shared/contracts/answers-parts.ts';
import { LEFT_OUT_LISTED } from '#shared/contracts/answers-parts.ts';
import type { Rule } from '#shared/contracts/rules.ts';
import type { Day } from '#shared/day.ts';
import type { ShopFacts, ShopRebuild } from '../../books/shop-facts.ts';
import type { NetFlows } from '../../domain/net-flows.ts';
import type { TiedUp } from '../../domain/years.ts';

/** What an answer is worked out from: the shop's facts as they stand today, and four looks into the warehouse. */
export interface AnswerInput {
  readonly shop: ShopFacts;
  readonly today: Day;
  readonly byId: ReadonlyMap<string, ShopRebuild>;
  tiedUpOn(on: Day): TiedUp;
  spentBy(ids: readonly string[], on: Day): ReadonlyMap<string, number>;
  /** Cash flows of these rebuilds together, by day. */
  flowsOf(ids: readonly string[]): NetFlows;
  rules(): Rule[];
  /** Left otherwise than by sale and not counted, as an address may ask; nobody unless it does. */
  readonly otherExits: readonly ShopRebuild[];
}

/** The same as an old sheet would have it, when asked: without any rebuild that left otherwise than by sale. */
export function countedBy(input: AnswerInput, exits: AnswerQuery['exits']): AnswerInput {
  if (exits === undefined) return input;
  const { rebuilds } = input.shop;
  const isOther = ({ exit }: ShopRebuild) => exit !== null && exit.kind !== 'sold';
  return {
    ...input,
    shop: { ...input.shop, rebuilds: rebuilds.filter((one) => !isOther(one)) },
    otherExits: rebuilds.filter(isOther),
  };
}

export function refOf({ id, tag, name }: ShopRebuild): RebuildRef {
  return { id, tag, name };
}

/** The rebuild of an id that a measure gave back. */
export function rebuildOf({ byId }: Pick<AnswerInput, 'byId'>, id: string): ShopRebuild {
  const rebuild = byId.get(id);
  if (!rebuild) throw new RangeError(`no rebuild ${id} among the facts`);
  return rebuild;
}

/** The rebuild that a figure was worked out without, by its name. */
export function namedWithoutOne(
  input: Pick<AnswerInput, 'byId'>,
  found: { readonly id: string; readonly value: number } | null,
): WithoutOne | null {
  return found && { rebuild: refOf(rebuildOf(input, found.id)), value: found.value };
}

/** What is left out of a figure and why; reasons that hold for nobody do not stand. */
export function leftOut(reasons: readonly (readonly [LeftOutReason, readonly ShopRebuild[]])[]): LeftOut[] {
  return reasons
    .filter(([, rebuilds]) => rebuilds.length > 0)
    .map(([reason, rebuilds]) => ({
      reason,
      count: rebuilds.length,
      rebuilds: rebuilds.slice(0, LEFT_OUT_LISTED).map(refOf),
    }));
}
