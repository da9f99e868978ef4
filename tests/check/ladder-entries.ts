import type { RebuildFacts } from '../../server/domain/facts.ts';
import {
  type PercentFooting,
  percentOnLadder,
  type TwoPartFooting,
  twoPartOnLadder,
} from '../../server/domain/ladder.ts';
import type { LadderQuestion } from '../support/portfolio-questions.ts';
import { reserve, twoPartReserve } from '#shared/measures/reserves.ts';
import type { Entry } from './answers-document.ts';
import { levelText } from './contingency-entries.ts';

/** What each rule asks for a car, and which rung it is based on (§18.4). */
export function ladderEntry(facts: readonly RebuildFacts[], { car, level, planCents }: LadderQuestion): Entry {
  return {
    ...car,
    level: levelText(level),
    percent: percentEntry(percentOnLadder(facts, car, level), planCents),
    two_part: twoPartEntry(twoPartOnLadder(facts, car, level), planCents),
  };
}

function percentEntry({ rung, n, k, uplift, taken }: PercentFooting, planCents: number): Entry {
  return { rung, n, k, uplift, reserve_cents: taken && reserve(taken, planCents) };
}

function twoPartEntry({ rung, n, k, creepPercent, flatCents }: TwoPartFooting, planCents: number): Entry {
  const isAsked = creepPercent !== null && flatCents !== null;
  const reserveCents = isAsked ? twoPartReserve(creepPercent, flatCents, planCents) : null;
  return { rung, n, k, creep_percent: creepPercent, flat_cents: flatCents, reserve_cents: reserveCents };
}
