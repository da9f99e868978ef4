import { expect, it } from 'vitest';
import { type SurpriseEntry, surpriseGroups } from '../../server/domain/surprise-groups.ts';

function entry(rebuildId: string, cents: number, what: string | null, category = 'parts'): SurpriseEntry {
  return { rebuildId, cents, what, category };
}

// Worked out by hand.
const entries = [
  entry('a', 20_000, 'Radiator'),
  entry('a', 10_000, 'fan'),
  entry('b', 50_000, ' radiator  '),
  entry('c', 70_000, null, 'restraints'),
  entry('c', 5_000, 'RADIATOR'),
  entry('elsewhere', 99_000, 'engine'),
];

it('counts rebuilds, not entries, and takes the middle of what they cost', () => {
  expect(surpriseGroups(entries, new Set(['a', 'b', 'c', 'd']))).toEqual([
    {
      category: 'parts',
      x: 3,
      medianCents: 30_000,
      whats: [
        { what: 'Radiator', x: 3, medianCents: 20_000 },
        { what: 'fan', x: 1, medianCents: 10_000 },
      ],
    },
    { category: 'restraints', x: 1, medianCents: 70_000, whats: [] },
  ]);
});

it('names three things at most, cut to a line', () => {
  const many = ['one', 'two', 'three', 'four', 'x'.repeat(200)].map((what, i) => entry('a', 100 * i + 1, what));
  const [group] = surpriseGroups(many, new Set(['a']));
  expect(group?.whats.map(({ what }) => what)).toEqual(['x'.repeat(60), 'four', 'three']);
  expect(surpriseGroups([], new Set(['a']))).toEqual([]);
});
