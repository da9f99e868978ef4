import { expect, test } from 'vitest';
import { ledgerQuerySchema } from '#shared/contracts/ledger.ts';
import { rebuildsQuerySchema } from '#shared/contracts/rebuilds.ts';
import { readFilters } from '../../../src/lib/address-filters.ts';

test('filters are read from the address, and what does not fit is left out one by one', () => {
  const search = new URLSearchParams('kind=surprise&from=2026-02-30&to=2026-03-01&void=perhaps&colour=red');
  expect(readFilters(ledgerQuerySchema, search)).toEqual({ kind: 'surprise', to: '2026-03-01' });
});

test('numbers of the address become numbers, and a cursor never comes from there', () => {
  const search = new URLSearchParams('year=2025&sort=kept&cursor=abc');
  expect(readFilters(rebuildsQuerySchema, search)).toEqual({ year: 2025, sort: 'kept' });
});
