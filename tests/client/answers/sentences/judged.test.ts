import { expect, test } from 'vitest';
import type { Trend } from '#shared/contracts/answers-parts.ts';
import type { StageOfDays } from '#shared/contracts/answers-time-to-sell.ts';
import { createFormatter } from '#shared/formatter.ts';
import {
  differenceWords,
  points,
  trendVerdict,
  trendWords,
} from '../../../../src/features/answers/sentences/judged.ts';
import { whereTheDaysGo } from '../../../../src/features/answers/sentences/stages.ts';
import { oldSheetSelling } from '../../../../src/features/answers/sentences/time-to-sell.ts';
import { oldSheetYear } from '../../../../src/features/answers/sentences/year.ts';
import { timeToSellReply, yearReply } from '../replies.ts';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });
const inPoints = (rate: number) => points(rate, format);
const trend = (slope: number, lower: number, upper: number, n = 50): Trend => {
  return { n, isCapped: false, slope, lower, upper, isThin: n < 5 };
};

test('a slope whose range holds zero could be luck', () => {
  expect(trendWords(trend(0.021, -0.014, 0.055), 'down', inPoints)).toBe(
    '+2 points a year, could be luck (−1 point to +6 points)',
  );
  expect(trendVerdict(trend(0.08, 0.01, 0.16), 'down')).toBe('getting worse');
  expect(trendVerdict(trend(0.08, 0.01, 0.16), 'up')).toBe('getting better');
  expect(trendVerdict(trend(-0.08, -0.16, -0.01), 'down')).toBe('getting better');
  expect(trendVerdict(trend(0.08, 0.01, 0.16, 4), 'down')).toBe('too few yet');
});

test('a gap names its range, and luck or not', () => {
  const gap = { difference: 0.17, lower: 0.014, upper: 0.32, isThin: false };
  expect(differenceWords(gap, inPoints)).toBe('+17 points (+1 point to +32 points): hardly luck');
  expect(differenceWords({ ...gap, lower: -0.1 }, inPoints)).toMatch(/: could be luck$/);
  expect(differenceWords({ ...gap, isThin: true }, inPoints)).toMatch(/: too few yet$/);
  expect(differenceWords(null, inPoints)).toBe('too few to compare');
});

const stage = (name: StageOfDays['stage'], median: number, n = 9): StageOfDays => {
  return { stage: name, n, oddCount: 0, median, q10: median, q90: median, isThin: n < 5 };
};

test('the stage that takes most days is named, one that rests on too few is not', () => {
  const stages = [stage('queue', 9), stage('build', 82), stage('paper', 300, 4), stage('held', 149)];
  expect(whereTheDaysGo({ ...timeToSellReply(), stages }, format)).toBe(
    'Most days go here: in the shop, 82 days, of 149 in all.',
  );
  expect(whereTheDaysGo(timeToSellReply(), format)).toBe('Too few yet to say which stage takes the most days.');
});

test('the old sheet is quoted only where it leaves something out', () => {
  expect(oldSheetSelling(timeToSellReply(), format)).toBe(
    'An old sheet, with sold ones only, would have said 26 days: it leaves out the 2 that did not sell.',
  );
  expect(oldSheetSelling(timeToSellReply({ n: 10 }), format)).toBeNull();
  expect(oldSheetYear(yearReply(), format)).toBeNull();
  expect(oldSheetYear(yearReply({ soldOnly: { n: 8, keptCents: -50_000 } }), format)).toBe(
    'An old sheet, with sold ones only, would have said that 2026 lost $500; with every way out it kept $18,420.',
  );
});
