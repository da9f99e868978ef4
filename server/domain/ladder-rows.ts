import { FEWEST_ON_RUNG, type Rung } from '#shared/measures/ladder-rungs.ts';
import { byOverrun, contingency, type Level } from './contingency.ts';
import type { RebuildFacts } from './facts.ts';
import type { Car } from './ladder.ts';
import { grouped } from './grouped.ts';
import { byExit, type Completed, planned, plannedOutcomes } from './sets.ts';
import { twoPartRule } from './two-part-rule.ts';

/** The rules of one rung, at each of the levels asked for. What the rung does not look at is null. */
export interface LadderRow extends Car {
  readonly rung: Rung;
  /** Set K: the overrun taken and its estimate, cents. null = too few yet. */
  readonly percent: { readonly n: number; readonly taken: readonly (readonly [number, number] | null)[] };
  /** Set K2. */
  readonly twoPart: {
    readonly n: number;
    readonly creepPercent: number | null;
    readonly flatCents: readonly (number | null)[];
  };
}

/**
 * Both rules on every rung of the shop worked out beforehand (definitions §18.4), from the finest to "all": what a
 * browser needs to climb the ladder without signal. Rungs with fewer than nine carry no rule and are left out.
 */
export function ladderRows(facts: readonly RebuildFacts[], levels: readonly Level[]): LadderRow[] {
  // In the order in which they left once, so that no rung has to be brought into it again.
  const set = planned(facts).sort(byExit);
  return [
    ...groupsOf(set, 'class+damage+seen', ({ class: name, damage, seen }) => [name, damage, seen]),
    ...groupsOf(set, 'damage+seen', ({ damage, seen }) => [null, damage, seen]),
    ...groupsOf(set, 'seen', ({ seen }) => [null, null, seen]),
    { rung: 'all' as const, class: null, damage: null, seen: null, members: set },
  ].map(({ members, ...rung }) => ({ ...rung, ...rulesOf(members, levels) }));
}

type Key = readonly [name: string | null, damage: string | null, seen: boolean | null];

function groupsOf(set: readonly Completed[], rung: Rung, keyOf: (car: Car) => Key) {
  const isKnown = ({ class: name, damage, seen }: Car) =>
    seen !== null && (rung === 'seen' || damage !== null) && (rung !== 'class+damage+seen' || name !== null);
  const groups = grouped(set.filter(isKnown), (one) => JSON.stringify(keyOf(one)));
  return [...groups.values()].flatMap((members) => {
    const [first] = members;
    if (first === undefined || members.length < FEWEST_ON_RUNG) return [];
    const [name, damage, seen] = keyOf(first);
    return [{ rung, class: name, damage, seen, members }];
  });
}

function rulesOf(members: readonly Completed[], levels: readonly Level[]): Pick<LadderRow, 'percent' | 'twoPart'> {
  // In order once: each level sorts anew, which costs next to nothing then.
  const outcomes = plannedOutcomes(members).sort(byOverrun);
  const untold = new Set(members.filter(({ hasUnknownForeseen }) => hasUnknownForeseen).map(({ id }) => id));
  const told = outcomes.filter(({ id }) => !untold.has(id));
  const twoPart = levels.map((level) => twoPartRule(told, level));
  return {
    percent: {
      n: outcomes.length,
      taken: levels.map((level) => {
        const { taken } = contingency(outcomes, level);
        return taken && [taken.overrunCents, taken.estimateCents];
      }),
    },
    twoPart: {
      n: told.length,
      creepPercent: twoPart[0]?.creepPercent ?? null,
      flatCents: twoPart.map(({ flatCents }) => flatCents),
    },
  };
}
