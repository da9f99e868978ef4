import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { openDatabase } from '../../server/platform/database.ts';
import { answersDocument } from '../check/answers-document.ts';
import { loadPortfolio } from '../check/load-portfolio.ts';
import { differences } from '../support/agreement.ts';
import { readPortfolio } from '../support/portfolio.ts';

// Source: two invented portfolios with answers worked out by a separate program, outside this code.
const FOLDER = new URL('../fixtures/portfolios/', import.meta.url);
const folder = mkdtempSync(path.join(tmpdir(), 'panelgap-warehouse-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

function load(name: string): Record<string, unknown> {
  return JSON.parse(readFileSync(new URL(name, FOLDER), 'utf8')) as Record<string, unknown>;
}

/** A portfolio's answers after it went through the books of an empty warehouse. */
async function throughWarehouse(json: unknown): Promise<Record<string, unknown>> {
  const portfolio = readPortfolio(json);
  const database = await openDatabase(mkdtempSync(path.join(folder, 'books-')));
  try {
    return answersDocument(await loadPortfolio(database, portfolio), portfolio);
  } finally {
    await database.close();
  }
}

describe('the reference portfolios through the warehouse', () => {
  it('gives every answer of the first', async () => {
    const answers = await throughWarehouse(load('portfolio-sample.json'));
    expect(differences(answers, load('answers-sample.json'))).toEqual([]);
  }, 60_000);

  it('gives every answer of the second, the ladder and the bids among them', async () => {
    const answers = await throughWarehouse(load('portfolio-sample-2.json'));
    expect(differences(answers, load('answers-sample-2.json'))).toEqual([]);
  }, 60_000);

  it('keeps names apart that differ in case only', async () => {
    const project = (id: string, sold: string, category: string) => ({
      id,
      class: 'Van',
      damage: 'front',
      bought: '2025-01-01',
      listed: '2025-02-01',
      sold,
      purchase_cents: 100_000,
      sale_cents: 200_000,
      estimates: { [category]: 10_000 },
      costs: [{ date: '2025-01-10', category, cents: 15_000, foreseen: true }],
    });
    const projects = [project('a1', '2025-03-01', 'parts'), project('A1', '2025-03-01', 'Parts')];
    const answers = await throughWarehouse({ format: 2, portfolio: 'case', as_of: '2025-12-31', projects });
    const overrun = answers['overrun'] as { by_category: { category: string; n: number }[] };
    expect(overrun.by_category.map(({ category, n }) => [category, n])).toEqual([
      ['Parts', 1],
      ['parts', 1],
    ]);
    expect((answers['per_project'] as { id: string }[]).map(({ id }) => id)).toEqual(['A1', 'a1']);
  });
});
