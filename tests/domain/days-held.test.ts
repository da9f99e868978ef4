import { expect, it } from 'vitest';
import { daysHeldUntilSold } from '../../server/domain/days-held.ts';
import { buildRebuild, sale } from '../support/facts.ts';

const bought = (id: string, exit: ReturnType<typeof sale>, boughtOn: string | null = '2025-01-01') =>
  buildRebuild({ id, boughtOn, readyOn: null, listedOn: null, exit });

// By hand, as in definitions §7: sold after 10, 30 and 40 days, parted out at 20: S = 3/4, then 3/8.
it('counts who waits still, and who left otherwise as lost sight of', () => {
  const facts = [
    bought('a', sale('2025-01-11', 1)),
    bought('b', { kind: 'parted out', on: '2025-01-21', proceedsCents: 0 }),
    bought('c', sale('2025-01-31', 1)),
    bought('d', sale('2025-02-10', 1)),
  ];
  expect(daysHeldUntilSold(facts, '2025-06-01')).toMatchObject({
    n: 4,
    soldCount: 3,
    unsoldCount: 0,
    otherExitCount: 1,
    median: 30,
  });
});

it('says nothing of what is not bought yet, of no known day, or in an impossible order', () => {
  const facts = [
    bought('later', null, '2026-01-01'),
    bought('unknown', sale('2025-02-01', 1), null),
    bought('odd', sale('2024-12-01', 1)),
    bought('waits', null),
  ];
  expect(daysHeldUntilSold(facts, '2025-06-01')).toEqual({
    n: 1,
    soldCount: 0,
    unsoldCount: 1,
    otherExitCount: 0,
    median: null,
    lower: null,
    upper: null,
  });
});
