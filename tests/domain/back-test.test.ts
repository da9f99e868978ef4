import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addDays } from '#shared/day.ts';
import { backTest, backTestTwoPart, type Knowledge, walkForward } from '../../server/domain/back-test.ts';
import { contingency, LEVELS, type Level } from '../../server/domain/contingency.ts';
import { RankTree } from '../../server/domain/rank-tree.ts';
import type { PlannedOutcome } from '../../server/domain/sets.ts';
import { twoPartRule } from '../../server/domain/two-part-rule.ts';
import { flatReserve, reserve, twoPartReserve } from '#shared/measures/reserves.ts';
import { buildLine, buildOutcome, buildRebuild, sale } from '../support/facts.ts';

/** The definition taken at its word: the rule made anew from each history. */
function straightforward(outcomes: readonly PlannedOutcome[], level: Level, knowledge: Knowledge) {
  return outcomes.map((one, i) => {
    const before = outcomes.slice(0, i);
    const { boughtOn } = one;
    const known = before.filter(({ exitOn }) => boughtOn !== null && exitOn < boughtOn);
    const history = knowledge === 'sequence' ? before : known;
    const { taken } = contingency(history, level);
    const { creepPercent, flatCents } = twoPartRule(history, level);
    if (history.length < 5 || taken === null || creepPercent === null || flatCents === null) return null;
    return {
      percent: reserve(taken, one.estimateCents),
      twoPart: twoPartReserve(creepPercent, flatCents, one.estimateCents),
      flat15: flatReserve(15, one.estimateCents),
      overrun: one.overrunCents,
    };
  });
}

const outcome: fc.Arbitrary<Omit<PlannedOutcome, 'id'>> = fc
  .record({
    exit: fc.nat({ max: 400 }),
    held: fc.option(fc.nat({ max: 120 }), { nil: null, freq: 10 }),
    estimateCents: fc.integer({ min: 1, max: 500 }),
    overrunCents: fc.integer({ min: -300, max: 900 }),
    surpriseCents: fc.nat({ max: 300 }),
  })
  .map(({ exit, held, ...rest }) => {
    const exitOn = addDays('2024-01-01', exit);
    return { ...rest, exitOn, boughtOn: held === null ? null : addDays(exitOn, -held) };
  });

const history = fc
  .array(outcome, { maxLength: 60 })
  .map((list) =>
    list
      .toSorted((a, b) => (a.exitOn < b.exitOn ? -1 : a.exitOn > b.exitOn ? 1 : 0))
      .map((one, i) => ({ ...one, id: String(i).padStart(3, '0') })),
  );

describe('the fast walk', () => {
  it.each(['sequence', 'asKnown'] as const)('asks what the rule made anew from each history asks (%s)', (knowledge) => {
    fc.assert(
      fc.property(history, (outcomes) => {
        for (const result of walkForward(outcomes, { levels: LEVELS, knowledge, withTwoPart: true })) {
          const plain = straightforward(outcomes, result.level, knowledge);
          for (const name of ['percent', 'twoPart'] as const) {
            const asked = result.trials[name]?.map((trial) => trial.asked?.reserveCents ?? null) ?? [];
            expect(asked).toEqual(plain.map((one) => one && one[name]));
          }
          const scored = plain.filter((one) => one !== null);
          for (const name of ['percent', 'twoPart', 'flat15'] as const) {
            expect(result.scores[name]).toMatchObject({
              n: scored.length,
              x: scored.filter((one) => one.overrun <= one[name]).length,
              shortCents: scored.reduce((total, one) => total + Math.max(0, one.overrun - one[name]), 0),
              unusedCents: scored.reduce((total, one) => total + Math.max(0, one[name] - Math.max(0, one.overrun)), 0),
              reserveCents: scored.reduce((total, one) => total + one[name], 0),
            });
          }
          expect(result.skippedCount + result.notAttainableCount + scored.length).toBe(outcomes.length);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('finds the k-th smallest as sorting would', () => {
    const ranks = fc
      .integer({ min: 1, max: 70 })
      .chain((size) =>
        fc.tuple(fc.constant(size), fc.array(fc.nat({ max: size - 1 }), { minLength: 1, maxLength: 80 })),
      );
    fc.assert(
      fc.property(ranks, ([size, added]) => {
        const tree = new RankTree(size);
        for (const rank of added) tree.add(rank);
        const sorted = added.toSorted((a, b) => a - b);
        expect(sorted.map((_, i) => tree.kth(i + 1))).toEqual(sorted);
      }),
    );
  });

  it('walks 20,000 rebuilds in well under the hours that sorting anew would take', () => {
    const outcomes = Array.from({ length: 20_000 }, (_, i) => ({
      id: String(i).padStart(5, '0'),
      exitOn: addDays('2000-01-01', Math.floor(i / 3)),
      boughtOn: addDays('2000-01-01', Math.floor(i / 3) - 90),
      estimateCents: 100_000 + ((i * 7919) % 900_000),
      overrunCents: ((i * 104_729) % 300_000) - 60_000,
      surpriseCents: (i * 31) % 50_000,
    }));
    const start = performance.now();
    const [result] = walkForward(outcomes, { levels: [{ p: 4, q: 5 }], knowledge: 'asKnown', withTwoPart: true });
    expect(result?.scores.percent?.n).toBeGreaterThan(19_000);
    expect(performance.now() - start).toBeLessThan(5000);
  });
});

describe('over the books', () => {
  // By hand: six rebuilds in exit order, each planned at 1,000; the sixth is judged by the five before it.
  const actuals = [1100, 1200, 1300, 1400, 1500, 1450];
  const facts = actuals.map((actual, i) =>
    buildOutcome(`r${i}`, actual, 1000, {
      boughtOn: i === 5 ? '2025-01-06' : '2024-12-01',
      exit: sale(`2025-01-0${i + 1}`, 1),
    }),
  );
  const half = [{ p: 1, q: 2 }];

  it('judges the sixth by the five before it', () => {
    const [one] = backTest(facts, half, 'sequence');
    expect(one).toMatchObject({ skippedCount: 5, notAttainableCount: 0 });
    expect(one?.scores.percent).toMatchObject({
      n: 1,
      x: 0,
      rate: 0,
      shortCents: 150,
      unusedCents: 0,
      reserveCents: 300,
    });
    expect(one?.trials.percent?.[5]).toEqual({
      id: 'r5',
      exitOn: '2025-01-06',
      estimateCents: 1000,
      overrunCents: 450,
      historySize: 5,
      k: 3,
      asked: { reserveCents: 300, uplift: 0.3, isCovered: false, shortCents: 150, unusedCents: 0 },
    });
    expect(one?.trials.percent?.[4]?.asked).toBeNull();
  });

  it('as known, an exit on the day of purchase was not known yet', () => {
    expect(backTest(facts, half, 'asKnown')[0]?.scores.percent?.n).toBe(1);
    const sameDay = facts.map((one) => (one.id === 'r5' ? { ...one, boughtOn: '2025-01-05' } : one));
    expect(backTest(sameDay, half, 'asKnown')[0]).toMatchObject({
      skippedCount: 6,
      scores: { percent: { n: 0, rate: null, reserveCents: 0 } },
    });
    const unknownDay = facts.map((one) => (one.id === 'r5' ? { ...one, boughtOn: null } : one));
    expect(backTest(unknownDay, half, 'asKnown')[0]?.skippedCount).toBe(6);
  });

  it('counts a level for which too few were known', () => {
    expect(backTest(facts, [{ p: 9, q: 10 }], 'sequence')[0]).toMatchObject({
      skippedCount: 5,
      notAttainableCount: 1,
      scores: { percent: { n: 0 } },
    });
  });

  it('scores the two-part rule only where every entry was said to be foreseen or not', () => {
    const untold = buildRebuild({ id: 'r9', exit: sale('2025-02-01', 1) }, [buildLine({ isForeseen: null })]);
    const [one] = backTestTwoPart([...facts, untold], half, 'sequence');
    expect(one?.trials.twoPart).toHaveLength(6);
    expect(one?.scores.twoPart?.n).toBe(one?.scores.percent?.n);
    expect(backTest([...facts, untold], half, 'sequence')[0]?.trials.percent).toHaveLength(7);
  });

  it('of nothing is nothing', () => {
    expect(backTest([], half, 'asKnown')[0]).toMatchObject({
      skippedCount: 0,
      notAttainableCount: 0,
      scores: { percent: { n: 0, rate: null } },
    });
  });
});
