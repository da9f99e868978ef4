import { expect, it } from 'vitest';
import { DEFAULT_CATEGORIES } from '#shared/vocabulary.ts';
import { sheetPlace } from '../../server/domain/sheet-places.ts';

it('tells by its name which category has a field of its own on a sheet', () => {
  const places = DEFAULT_CATEGORIES.map((category) => [
    category.name,
    sheetPlace({ isPaidLabor: false, ...category }),
  ]).filter(([, place]) => place !== null);
  expect(places).toEqual([
    ['auction fees', 'fee'],
    ['transport', 'transport'],
    ['title & registration', 'title'],
    ['inspection', 'title'],
    ['insurance', 'holding'],
    ['selling costs', 'selling'],
    ['tax', 'tax'],
    ['paid labor', 'paid labor'],
  ]);
});
