import { describe, expect, it } from 'vitest';
import { percentOnLadder, type Rung, twoPartOnLadder } from '../../server/domain/ladder.ts';
import { buildLine, buildOutcome, buildRebuild } from '../support/facts.ts';

const HALF = { p: 1, q: 2 };
const CAR = { class: 'SUV', damage: 'front', seen: false };

/** `count` past rebuilds of one kind, each `percent` over its plan of 1,000.00. */
function past(count: number, percent: number, frame: Parameters<typeof buildRebuild>[0] = CAR) {
  const name = JSON.stringify(frame);
  return Array.from({ length: count }, (_, i) => buildOutcome(`${name}${i}`, 1000 * (100 + percent), 100_000, frame));
}

// Worked out by hand: each kind of rebuild has an overrun of its own, so the uplift says which rung was taken.
describe('the ladder', () => {
  const others = [
    ...past(9, 20, { ...CAR, class: 'van' }),
    ...past(9, 30, { ...CAR, class: 'van', damage: 'rear' }),
    ...past(9, 40, { ...CAR, class: 'van', damage: 'rear', seen: true }),
  ];
  const rungOf = (...facts: ReturnType<typeof past>[]): [Rung | null, number] => {
    const { rung, n } = percentOnLadder(facts.flat(), CAR, HALF);
    return [rung, n];
  };

  it('takes the finest rung with nine', () => {
    expect(rungOf(past(9, 10), others)).toEqual(['class+damage+seen', 9]);
    expect(rungOf(past(8, 10), others)).toEqual(['damage+seen', 17]);
    expect(rungOf(past(8, 10), others.slice(9))).toEqual(['seen', 17]);
    expect(rungOf(past(8, 10), others.slice(18))).toEqual(['all', 17]);
  });

  it('climbs past a rung too thin for the level, and takes the rule from that rung alone', () => {
    const facts = [...past(9, 10), ...others];
    expect(percentOnLadder(facts, CAR, HALF)).toMatchObject({ rung: 'class+damage+seen', k: 5, uplift: 0.1 });
    expect(percentOnLadder(facts, CAR, { p: 9, q: 10 })).toMatchObject({ rung: 'class+damage+seen', k: 9 });
    expect(percentOnLadder(facts, CAR, { p: 10, q: 11 })).toMatchObject({
      rung: 'damage+seen',
      n: 18,
      k: 18,
      uplift: 0.2,
    });
    expect(percentOnLadder(facts, CAR, { p: 19, q: 20 })).toMatchObject({ rung: 'seen', n: 27, k: 27, uplift: 0.3 });
  });

  it('says too few yet with the n and k of all, and gives no figure', () => {
    const nothing = { rung: null, taken: null, uplift: null, guarantee: null, outcomes: [] };
    expect(percentOnLadder(past(8, 10), CAR, HALF)).toMatchObject({ ...nothing, n: 8, k: 5 });
    expect(percentOnLadder(past(9, 10), CAR, { p: 19, q: 20 })).toMatchObject({ ...nothing, n: 9, k: 10 });
    expect(percentOnLadder([], CAR, HALF)).toMatchObject({ ...nothing, n: 0, k: 1 });
    expect(twoPartOnLadder(past(8, 10), CAR, HALF)).toMatchObject({
      rung: null,
      n: 8,
      k: 5,
      creepPercent: null,
      flatCents: null,
    });
  });

  it('lists every rung tried, so that a reader sees why it was that one', () => {
    const { tried } = percentOnLadder([...past(8, 10), ...others], CAR, { p: 19, q: 20 });
    expect(tried).toEqual([
      { rung: 'class+damage+seen', n: 8, k: 9, carries: false },
      // Enough of them, but 18 × 19/20 = 17.1, raised: the 18th of 17.
      { rung: 'damage+seen', n: 17, k: 18, carries: false },
      { rung: 'seen', n: 26, k: 26, carries: true },
      { rung: 'all', n: 35, k: 35, carries: true },
    ]);
  });

  it('takes what is not known as like nothing', () => {
    const facts = past(9, 10);
    expect(percentOnLadder(facts, { ...CAR, seen: null }, HALF).rung).toBe('all');
    expect(percentOnLadder(facts, { ...CAR, damage: null }, HALF).rung).toBe('seen');
    expect(percentOnLadder(facts, { ...CAR, class: null }, HALF).rung).toBe('damage+seen');
    expect(percentOnLadder(past(9, 10, { ...CAR, seen: null }), { ...CAR, seen: null }, HALF).rung).toBe('all');
    expect(percentOnLadder(past(9, 10, { ...CAR, seen: null }), CAR, HALF)).toMatchObject({ rung: 'all', n: 9 });
    const noClass = { ...CAR, class: null };
    expect(percentOnLadder(past(9, 10, noClass), noClass, HALF).rung).toBe('damage+seen');
  });

  it('climbs for the two-part rule apart: it leaves out rebuilds with an entry of unknown foreseen', () => {
    const untold = buildRebuild({ ...CAR, id: 'untold', estimates: new Map([['parts', 100_000]]) }, [
      buildLine({ cents: 110_000, isForeseen: null }),
    ]);
    const facts = [untold, ...past(8, 10), ...others];
    expect(percentOnLadder(facts, CAR, HALF)).toMatchObject({ rung: 'class+damage+seen', n: 9 });
    // Creep of the 17 unseen fronts: (8 × 10 + 9 × 20) / 17 = 15.3, raised to 16 %; the ninth residual is 20 − 16 = 4 %.
    expect(twoPartOnLadder(facts, CAR, HALF)).toMatchObject({
      rung: 'damage+seen',
      n: 17,
      k: 9,
      creepPercent: 16,
      flatCents: 4_000,
    });
  });
});
