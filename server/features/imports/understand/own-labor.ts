import type { Choice } from '#shared/contracts/import-reading.ts';

/** What becomes of money for own time: its rows are put aside, or it was paid to somebody, or it is hours at a rate. */
export type OwnLabor =
  | { readonly as: 'aside' }
  | { readonly as: 'paid' }
  | { readonly as: 'hours'; readonly rate: number };

const RATES = [10, 12, 15, 18, 20, 25, 30, 35, 40, 45, 50, 60, 75];
const QUARTERS = 4;

/** Hours, in whole seconds, that an amount buys at a rate, both in cents; to the second. */
export const hoursAt = (cents: number, rate: number) => Math.round((cents * 3600) / rate);

/**
 * Asks what amounts for own time are, since the books hold own time in hours and not in money. `cents`: the amounts;
 * rates are offered at which each of them is whole quarters of an hour. null = there are no such amounts.
 */
export function ownLabor(
  cents: readonly number[],
  sheet: number,
  answers: ReadonlyMap<string, string>,
): { labor: OwnLabor; choice: Choice | null } {
  const paid = cents.filter((value) => value > 0);
  if (paid.length === 0) return { labor: { as: 'aside' }, choice: null };
  const rates = RATES.filter((rate) => paid.every((value) => (value * QUARTERS) % (rate * 100) === 0));
  const id = sheet === 1 ? 'own-labor' : `own-labor:${sheet}`;
  const answer = answers.get(id) ?? null;
  const sum = paid.reduce((all, value) => all + value, 0);
  const rate = Number(/^hours at (\d+)$/.exec(answer ?? '')?.[1] ?? 0);
  const choice: Choice = {
    id,
    kind: 'own-labor',
    column: null,
    question: `${paid.length === 1 ? 'One row holds' : `${paid.length} rows hold`} money for labor and no hours. Was it your own time?`,
    options: [
      { value: 'leave out', label: 'yes: put these rows aside, own time is no money' },
      { value: 'paid work', label: 'no: it was paid to somebody' },
      ...rates.map((one) => ({
        value: `hours at ${one}`,
        label: `yes: hours at ${one} an hour, ${(sum / one / 100).toFixed(2).replace(/\.?0+$/, '')} hours in all`,
      })),
    ],
    preset: 'leave out',
    answer,
    mustAsk: true,
    why: 'Own time counts in hours and never as a cost; work that somebody was paid for is a cost.',
  };
  if (answer === 'paid work') return { labor: { as: 'paid' }, choice };
  return { labor: rate > 0 ? { as: 'hours', rate: rate * 100 } : { as: 'aside' }, choice };
}
