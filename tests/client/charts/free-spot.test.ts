import { expect, test } from 'vitest';
import { freeSpot } from '../../../src/charts/free-spot.ts';

const label = { from: 100, to: 200 };
const limits = { top: 10, bottom: 300 };
/** Level at 150, then up to 50 at x 150, level again. */
const step = [
  { x: 0, y: 150 },
  { x: 150, y: 50 },
  { x: 400, y: 50 },
];

test('a label stays where it is wanted when nothing crosses it', () => {
  expect(freeSpot(label, 250, [step], [], limits).y).toBe(250);
});

test('a label in the way of a rising step moves to the nearest free height', () => {
  const { y } = freeSpot(label, 140, [step], [], limits);
  // The step takes up 50 to 150; the label needs 15 px above its base line, so it goes below.
  expect(y - 15).toBeGreaterThanOrEqual(149);
  expect(y).toBeLessThan(175);
});

test('two labels do not share a height', () => {
  const first = freeSpot(label, 250, [step], [], limits);
  const second = freeSpot(label, 250, [step], [first], limits);
  expect(Math.abs(second.y - first.y)).toBeGreaterThan(15);
});

test('where there is no room it stays: a label is better than none', () => {
  expect(freeSpot(label, 140, [step], [], { top: 60, bottom: 140 }).y).toBe(140);
});
