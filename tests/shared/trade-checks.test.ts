import { describe, expect, it } from 'vitest';
import { DAMAGE_FAMILIES, GOES_TOGETHER, ANY_DAMAGE, tradeChecks } from '#shared/trade-checks.ts';
import { bidCautions, tradeCautions } from '#shared/trade-cautions.ts';
import { DEFAULT_DAMAGES } from '#shared/vocabulary.ts';

const keys = (...damages: (string | null)[]) => tradeChecks(damages).map(({ key }) => key);

describe('the trade’s common checks', () => {
  it('go by the words of the shop’s own damages, and some are for every car', () => {
    expect(keys('Flood damage')).toEqual(expect.arrayContaining(['flood-wiring', 'flood-high-voltage', 'any-paper']));
    expect(keys('side-front')).toEqual(expect.arrayContaining(['front-structure', 'side-pillar']));
    const always = ANY_DAMAGE.map(({ key }) => key);
    expect(keys('mechanical')).toEqual(always);
    expect(keys(null)).toEqual(always);
    expect(keys('mystery', null)).toEqual(always);
  });

  it('know every damage that a shop starts out with, but for the mechanical', () => {
    const unknown = DEFAULT_DAMAGES.filter((name) => keys(name).length === ANY_DAMAGE.length);
    expect(unknown).toEqual(['mechanical']);
  });

  it('have a key each', () => {
    const all = [...DAMAGE_FAMILIES.flatMap(({ checks }) => checks), ...ANY_DAMAGE, ...GOES_TOGETHER];
    expect(new Set(all.map(({ key }) => key)).size).toBe(all.length);
  });
});

it('a caution stands once, and ends with the maker’s procedure', () => {
  const found = tradeCautions({ damages: ['rollover'], categories: ['restraints (SRS)'], entries: ['driver airbag'] });
  expect(found.map(({ about }) => about)).toEqual(['restraints', 'structure']);
  for (const { text } of found) expect(text).toMatch(/maker’s procedure/);
});

it('a car that is only looked at yet has the cautions of what hides behind its damage', () => {
  const about = (...damages: string[]) => bidCautions({ damages, categories: [] }).map((caution) => caution.about);
  expect(about('front')).toEqual(['restraints', 'structure', 'refrigerant']);
  expect(about('flood')).toEqual(['restraints', 'flood and underbody']);
  expect(about('hail')).toEqual([]);
});
