import { addDays } from '#shared/day.ts';
import { seeded } from '#shared/measures/seeded.ts';
import { walkForward } from '../../server/domain/back-test.ts';
import { LEVELS, levelOf } from '../../server/domain/contingency.ts';
import { drift } from '../../server/domain/drift.ts';
import type { RebuildFacts } from '../../server/domain/facts.ts';
import { percentOnLadder, twoPartOnLadder } from '../../server/domain/ladder.ts';
import { percentWithoutOne, twoPartWithoutOne } from '../../server/domain/leave-one-out.ts';
import { type PlannedOutcome, plannedAndTold, plannedOutcomes } from '../../server/domain/sets.ts';
import { buildOutcome, sale } from '../support/facts.ts';
import { inventPast } from '../support/invented-past.ts';
import { interleaved, type Measure, timed } from './rounds.ts';

const SIZES = [2_000, 20_000] as const;
const ROUNDS = 5;
const LEVEL = levelOf('4/5');
const CLASSES = ['SUV', 'pickup', 'van', 'small car'];
const DAMAGES = ['front', 'rear', 'side', 'hail', 'flood'];
const AS_OF = '2026-12-15';

/** What the contingency page computes, apart from reading: the time at both sizes, and how it grows with ten times the rebuilds. */
export async function benchRules(): Promise<Measure[]> {
  const small = worksOf(SIZES[0]);
  const large = worksOf(SIZES[1]);
  const measures: Measure[] = [];
  for (const name of Object.keys(small) as (keyof typeof small)[]) {
    small[name]();
    large[name]();
    const times = await interleaved(ROUNDS, { small: () => timed(small[name]), large: () => timed(large[name]) });
    measures.push(
      { name: `${name}: ${SIZES[0]} rebuilds`, value: times.small, unit: 'ms', limit: null },
      { name: `${name}: ${SIZES[1]} rebuilds`, value: times.large, unit: 'ms', limit: null },
      {
        name: `${name}: ten times the rebuilds (n log n)`,
        value: times.large / times.small,
        unit: '×',
        limit: null,
      },
    );
  }
  return measures;
}

function worksOf(count: number) {
  const facts = inventFacts(count);
  const outcomes = plannedOutcomes(plannedAndTold(facts));
  const car = { class: 'SUV', damage: 'front', seen: false };
  return {
    'walk-forward, all rules at four levels': () => tested(outcomes),
    'ladder, both rules': () => [percentOnLadder(facts, car, LEVEL), twoPartOnLadder(facts, car, LEVEL)],
    drift: () => drift(outcomes, LEVEL, AS_OF),
    'each rebuild left out, both rules': () => [percentWithoutOne(outcomes, LEVEL), twoPartWithoutOne(outcomes, LEVEL)],
  };
}

function tested(outcomes: readonly PlannedOutcome[]) {
  return walkForward(outcomes, { levels: LEVELS, knowledge: 'asKnown', withTwoPart: true });
}

/** Ten years of rebuilds, the same for the same count. */
function inventFacts(count: number): RebuildFacts[] {
  const chance = seeded(20_261_201);
  const pick = <T>(list: readonly T[]) => list[Math.floor(chance() * list.length)] as T;
  return inventPast({ count, chance }).map(({ id, estimateCents, overrunCents }, i) => {
    const exitOn = addDays('2016-12-15', Math.floor((i * 3650) / count));
    const place = { class: pick(CLASSES), damage: pick(DAMAGES), seen: chance() < 0.5 };
    const frame = { ...place, boughtOn: addDays(exitOn, -120), exit: sale(exitOn, 1_000_000) };
    return buildOutcome(id, estimateCents + overrunCents, estimateCents, frame);
  });
}
