import { expect, it } from 'vitest';
import { seeded } from '#shared/measures/seeded.ts';

// By hand, from the three shifts (Marsaglia 2003): 1 ^ 1·2^13 = 8,193; >> 17 leaves it; ^ 8,193·32 = 270,369.
it('begins as worked out by hand, and is the same for the same seed', () => {
  expect(seeded(1)()).toBe(270_369 / 2 ** 32);
  const [one, other] = [seeded(20_261_201), seeded(20_261_201)];
  expect([one(), one(), one()]).toEqual([other(), other(), other()]);
});

it('spreads evenly: each tenth is met within four standard errors', () => {
  const chance = seeded(7);
  const counts = Array.from({ length: 10 }, () => 0);
  for (let i = 0; i < 100_000; i += 1) {
    const tenth = Math.floor(chance() * 10);
    counts[tenth] = (counts[tenth] ?? 0) + 1;
  }
  for (const count of counts) expect(Math.abs(count - 10_000)).toBeLessThan(4 * Math.sqrt(100_000 * 0.09));
});

it('refuses the seed that would stay 0', () => expect(() => seeded(0)).toThrow('stay 0'));
