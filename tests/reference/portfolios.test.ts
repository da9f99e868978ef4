import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { planned } from '../../server/domain/sets.ts';
import { answersDocument } from '../check/answers-document.ts';
import { differences } from '../support/agreement.ts';
import { readPortfolio } from '../support/portfolio.ts';
import { portfolioInput } from '../support/portfolio-facts.ts';

// Source: two invented portfolios with answers worked out by a separate program, outside this code.
const FOLDER = new URL('../fixtures/portfolios/', import.meta.url);

function load(name: string): Record<string, unknown> {
  return JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8')) as Record<string, unknown>;
}

function answersOf(name: string): Record<string, unknown> {
  const portfolio = readPortfolio(load(name));
  return answersDocument(portfolioInput(portfolio), portfolio);
}

describe('the reference portfolios', () => {
  it('gives every answer of the first', () => {
    expect(differences(answersOf('portfolio-sample.json'), load('answers-sample.json'))).toEqual([]);
  });

  it('gives every answer of the second, the ladder and the bids among them', () => {
    expect(differences(answersOf('portfolio-sample-2.json'), load('answers-sample-2.json'))).toEqual([]);
  });
});

// By hand: eight rebuilds carry no rule on any rung, at any level.
it('answers with nothing where a rule has too few past rebuilds', () => {
  const file = load('portfolio-sample-2.json') as { projects: { id: string }[]; bids: { id: string }[] };
  const inPlan = new Set(planned(portfolioInput(readPortfolio(file)).facts).map(({ id }) => id));
  const projects = file.projects.filter(({ id }) => inPlan.has(id)).slice(0, 8);
  const portfolio = readPortfolio({ ...file, projects, bids: file.bids.filter(({ id }) => id.startsWith('rule-')) });
  const answers = answersDocument(portfolioInput(portfolio), portfolio);
  const nothing = { rung: null, repair_budget_cents: null, room: null, bid_cents: null };
  expect(answers['bids']).toHaveLength(6);
  for (const bid of answers['bids'] as unknown[])
    expect(bid).toMatchObject({ ...nothing, fee_cents: null, tax_cents: null, left_cents: null });
  const rules = answers['ladder'] as { percent: unknown }[];
  expect(rules[0]?.percent).toEqual({ rung: null, n: 8, k: 5, uplift: null, reserve_cents: null });
});

describe('what a portfolio may not hold', () => {
  const first = (): Record<string, unknown> => {
    const file = load('portfolio-sample-2.json') as { projects: Record<string, unknown>[] };
    return { ...file, projects: [{ ...file.projects[0] }] };
  };
  const withProject = (change: Record<string, unknown>) => () => {
    const file = first() as { projects: Record<string, unknown>[] };
    return readPortfolio({ ...file, projects: [{ ...file.projects[0], ...change }] });
  };
  const exit = { kind: 'scrapped', on: '2024-01-01', proceeds_cents: 0 };

  it('reads it unchanged', () => expect(readPortfolio(first()).rebuilds).toHaveLength(1));

  it.each([
    ['sold and another exit together', { exit }, 'sold and another exit together'],
    ['sold without a price', { sale_cents: null }, 'sold without a price'],
    ['a price without a sale', { sold: null }, 'a price without a sale'],
    [
      'an exit without a price',
      { sold: null, sale_cents: null, exit: { ...exit, proceeds_cents: null } },
      'proceeds_cents',
    ],
    ['a sale after the as-of day', { sold: '2026-02-01' }, 'after the as-of day'],
    ['an exit after it', { sold: null, sale_cents: null, exit: { ...exit, on: '2026-02-01' } }, 'after the as-of day'],
    ['a free line with cents', { costs: [{ category: 'parts', cents: 1, free_value_cents: 5 }] }, 'free line'],
    ['a cost in fractions of a cent', { costs: [{ category: 'parts', cents: 1.5 }] }, 'expected int'],
    ['a day that does not exist', { bought: '2023-02-30' }, 'not a day'],
  ])('%s', (_what, change, reason) => expect(withProject(change)).toThrow(reason));

  it('overhead after the as-of day', () => {
    expect(() => readPortfolio({ ...first(), overhead: [{ date: '2026-02-01', cents: 1 }] })).toThrow(
      'after the as-of day',
    );
  });
});

describe('agreement', () => {
  it('sees a wrong, a missing and an additional figure, each to its tolerance', () => {
    expect(differences({ cents: 5 }, { cents: 6 })).toHaveLength(1);
    expect(differences({}, { n: 1 })).toEqual(['.n: missing']);
    expect(differences({ n: 1, m: 1 }, { n: 1 })).toEqual(['.m: not in the reference']);
    expect(differences([1], [1, 2])).toHaveLength(1);
    expect(differences({ lo: 0 }, { lo: null })).toHaveLength(1);
    expect(differences({ rate: 0.5 + 1e-10, mu: 0.5 + 5e-9 }, { rate: 0.5, mu: 0.5 })).toEqual([]);
    expect(differences({ rate: 0.5 + 2e-9 }, { rate: 0.5 })).toHaveLength(1);
    expect(differences({ xirr: 9.0000005 }, { xirr: 9 })).toEqual([]);
    expect(differences({ p: 1.00001e-9 }, { p: 1e-9 })).toHaveLength(1);
  });
});
