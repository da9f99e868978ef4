import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';

/** Which of the two rules the page speaks of. */
export type Kind = 'percent' | 'two-part';

export const KINDS = [
  { value: 'percent', label: 'One percentage' },
  { value: 'two-part', label: 'Percentage and sum' },
] as const;

/** The kind that an address asks for. */
export function kindOf(search: URLSearchParams): Kind {
  return search.get('rule') === 'two-part' ? 'two-part' : 'percent';
}

/** The back-test that a kind is judged by: the two-part rule leaves out rebuilds where foreseen is not said. */
export function testOf(answer: ContingencyAnswer, kind: Kind): ContingencyAnswer['backTest'] {
  return kind === 'percent' ? answer.backTest : answer.twoPartBackTest;
}

type Row = ContingencyAnswer['trail'][number];

/** The rebuilds that a kind looks at, each with what that rule asked for it then. */
export function trailOf(answer: ContingencyAnswer, kind: Kind): { row: Row; asked: Row['asked'] }[] {
  return answer.trail.flatMap((row) => {
    if (kind === 'percent') return [{ row, asked: row.asked }];
    return row.twoPart ? [{ row, asked: row.twoPart.asked }] : [];
  });
}
