import { readFileSync } from 'node:fs';
import { expect } from 'vitest';

/** The published checks; each names its source and how its figures were verified in the file itself. */
const file = JSON.parse(readFileSync(new URL('../reference/public-checks.json', import.meta.url), 'utf8')) as {
  checks: { id: string; name: string; input: unknown; expected: unknown }[];
};

export const publicCheckIds: readonly string[] = file.checks.map((check) => check.id);

/** What a published check feeds in and asks for. */
export function publicCheck<Input, Expected>(id: string): { input: Input; expected: Expected } {
  const check = file.checks.find((one) => one.id === id);
  if (!check) throw new RangeError(`no public check ${id}`);
  return { input: check.input as Input, expected: check.expected as Expected };
}

/** Agrees to a relative tolerance; null must be null. */
export function expectNear(actual: number | null | undefined, expected: number | null, relative: number): void {
  if (expected === null || actual === null || actual === undefined) {
    expect(actual).toBe(expected);
    return;
  }
  expect(Math.abs(actual - expected), `${actual} should be ${expected}`).toBeLessThanOrEqual(
    relative * Math.abs(expected),
  );
}

/** `expectNear` for each of a list. */
export function expectAllNear(
  actual: readonly (number | null | undefined)[],
  expected: readonly (number | null)[],
  relative: number,
): void {
  expect(actual.length).toBe(expected.length);
  for (const [i, value] of expected.entries()) expectNear(actual[i], value, relative);
}

/** Agrees to an absolute tolerance. */
export function expectWithin(actual: number | null | undefined, expected: number, absolute: number): void {
  expect(Math.abs((actual ?? Number.NaN) - expected), `${actual} should be ${expected}`).toBeLessThanOrEqual(absolute);
}
