import { expect, it } from 'vitest';
import { type StageDates, stageDays } from '../../server/domain/stage-days.ts';

const NONE: StageDates = {
  class: null,
  boughtOn: null,
  pickedUpOn: null,
  startedOn: null,
  readyOn: null,
  titleIssuedOn: null,
  listedOn: null,
  exit: null,
};

// Source of the figures: counted on a calendar; 2024 is a leap year.
it('gives the days of each stage, over those that have both days in order', () => {
  const whole: StageDates = {
    ...NONE,
    class: 'van',
    boughtOn: '2024-02-20',
    pickedUpOn: '2024-02-25',
    startedOn: '2024-03-01',
    readyOn: '2024-03-31',
    titleIssuedOn: '2024-04-20',
    listedOn: '2024-04-20',
    exit: { on: '2024-05-20' },
  };
  const { all, classes } = stageDays([
    whole,
    { ...NONE, boughtOn: '2024-01-01', pickedUpOn: '2024-01-04' },
    { ...NONE, boughtOn: '2024-01-01', pickedUpOn: '2023-12-31' },
  ]);
  expect(all.map(({ stage, n, oddCount, median }) => [stage, n, oddCount, median])).toEqual([
    ['haul', 2, 1, 4],
    ['queue', 1, 0, 5],
    ['build', 1, 0, 30],
    ['paper', 1, 0, 20],
    ['listing', 1, 0, 0],
    ['held', 1, 0, 90],
  ]);
  expect(all[0]).toMatchObject({ q10: 3.2, q90: 4.8, isThin: true });
  expect([...classes.keys()]).toEqual(['van']);
  expect(classes.get('van')?.[0]).toMatchObject({ n: 1, median: 5, oddCount: 0 });
});

it('says nothing of nothing', () => {
  const { all, classes } = stageDays([]);
  expect(all[0]).toEqual({ stage: 'haul', n: 0, oddCount: 0, median: null, q10: null, q90: null, isThin: true });
  expect(classes.size).toBe(0);
});
