import type { RuleFigures } from './rule-words.ts';

/** What is typed into the two fields of a rule. */
export type TypedRule = { percent: string; flat: string };

export type ReadRule = {
  /** null = cannot be read; `flatCents` undefined = the kind has none. */
  percent: number | null;
  flatCents: number | null | undefined;
  /** Less than the books ask for in either part. */
  isBelow: boolean;
  isAbove: boolean;
};

/** Typed figures as a rule of the same kind as the one asked for. `readCents` reads money as the shop writes it. */
export function readRule(typed: TypedRule, asked: RuleFigures, readCents: (text: string) => number | null): ReadRule {
  const percent = /^\s*\d{1,4}\s*%?\s*$/.test(typed.percent) ? Number.parseInt(typed.percent, 10) : null;
  const cents = asked.flatCents === null ? undefined : readCents(typed.flat);
  const flatCents = cents !== undefined && cents !== null && cents < 0 ? null : cents;
  const compare = (one: number | null | undefined, other: number | null) => (one ?? other ?? 0) - (other ?? 0);
  const differences = [compare(percent, asked.percent), compare(flatCents, asked.flatCents)];
  return {
    percent,
    flatCents,
    isBelow: differences.some((one) => one < 0),
    isAbove: differences.some((one) => one > 0),
  };
}
