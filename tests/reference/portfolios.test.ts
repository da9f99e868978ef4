import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { answersDocument } from '../check/answers-document.ts';
import { differences } from '../support/agreement.ts';
import { readPortfolio } from '../support/portfolio.ts';
import { portfolioInput } from '../support/portfolio-facts.ts';

// Source: two invented portfolios with answers worked out by a separate program, outside this code.
const FOLDER = new URL('../fixtures/portfolios/', import.meta.url);

function load(name: string): Record<string, unknown> {
  return JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8')) as Record<string, unknown>;
}

describe('the reference portfolios', () => {
  it('gives every answer of the first', () => {
    const answers = answersDocument(portfolioInput(readPortfolio(load('portfolio-sample.json'))));
    expect(differences(answers, load('answers-sample.json'))).toEqual([]);
  });

  it('gives every answer of the second but the ladder and the bids', () => {
    const answers = answersDocument(portfolioInput(readPortfolio(load('portfolio-sample-2.json'))));
    const { ladder, bids, ...expected } = load('answers-sample-2.json');
    expect([ladder, bids].every(Array.isArray)).toBe(true);
    expect(differences(answers, expected)).toEqual([]);
  });
});
