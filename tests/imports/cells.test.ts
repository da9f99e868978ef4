import { describe, expect, it } from 'vitest';
import { dayReader } from '../../server/features/imports/cells/days.ts';
import { readHours } from '../../server/features/imports/cells/hours.ts';
import { currenciesIn, decimalVote, moneyReader } from '../../server/features/imports/cells/money.ts';
import { tagMaker } from '../../server/features/imports/read/draft.ts';
import { isSlip, readVehicle } from '../../server/features/imports/understand/vehicle-text.ts';
import { categoryReader } from '../../server/features/imports/words/categories.ts';
import { isTotalLabel } from '../../server/features/imports/words/headings.ts';
import { DEFAULT_CATEGORIES } from '#shared/vocabulary.ts';

// Golden cells, worked out by hand.

describe('money as people type it', () => {
  const point = moneyReader('.');
  const comma = moneyReader(',');
  it.each([
    ['$1,234.56', 123_456],
    ['1234.5', 123_450],
    ['1,234', 123_400],
    ['0', 0],
    ['.50', 50],
    ['$ 12', 1200],
    ['(45.00)', -4500],
    ['45-', -4500],
    ['-$10.00', -1000],
    ['34.00-', -3400],
    ['1250.-', 125_000],
    ['1,250.00 USD', 125_000],
    ['', 'blank'],
    ['  ', 'blank'],
    ['-', 'bad'],
    ['free', 'bad'],
    ['see receipt', 'bad'],
    ['~200', 'rough'],
    ['1,300 ish', 'rough'],
    ['$1.2k', 'rough'],
    ['2x45', 'rough'],
    ['150?', 'rough'],
    ['1.234,50', 'rough'],
    ['12,34', 'rough'],
    ['1.234', 'bad'],
    ['10000000000.00', 1_000_000_000_000],
    ['10000000000.01', 'bad'],
    ['$99999999999.99', 'bad'],
    ['1,2345', 'bad'],
    [',234', 'bad'],
    ['1,,234', 'bad'],
    ['99999999999999999', 'bad'],
  ])('%s with a decimal point is %s', (text, cents) => expect(point(text)).toBe(cents));
  it.each([
    ['1.234,50 €', 123_450],
    ['997,19 €', 99_719],
    ['-31,00 €', -3100],
    ['1234,5', 123_450],
    ['1.234', 123_400],
    ['1,234.50', 'rough'],
  ])('%s with a decimal comma is %s', (text, cents) => expect(comma(text)).toBe(cents));
  it.each(['-', 'n/a', 'free', 'none'])('%s in a cost column means that nothing was spent', (text) =>
    expect(point(text, true)).toBe('blank'),
  );
  it.each([
    ['12.50', 1],
    ['12,50', -1],
    ['1,234.50', 1],
    ['1.234,50', -1],
    ['1,234', 0],
    ['1.234.567', -1],
    ['12', 0],
  ])('%s votes %i for the point', (text, vote) => expect(decimalVote(text)).toBe(vote));
  it('knows which currencies a sign may stand for', () => {
    expect(currenciesIn('12,00 €')).toEqual(['EUR']);
    expect(currenciesIn('$12.00')).toContain('CAD');
    expect(currenciesIn('12.00')).toBeNull();
  });
});

describe('days as people type them', () => {
  const us = dayReader('MDY', '2026-12-01');
  const eu = dayReader('DMY', '2026-12-01');
  it.each([
    ['3/12/2018', '2018-03-12'],
    ['2/29/2020', '2020-02-29'],
    ['2/30/2020', 'bad'],
    ['2/29/2019', 'bad'],
    ['13/1/2020', 'bad'],
    ['1/27/17', '2017-01-27'],
    ['6/1/95', '1995-06-01'],
    ['2017-01-14', '2017-01-14'],
    ['2017-1-4', '2017-01-04'],
    ['2017/01/14', '2017-01-14'],
    ['2017-01-14 00:00:00', '2017-01-14'],
    ['Jan 14 2017', '2017-01-14'],
    ['January 14, 2017', '2017-01-14'],
    ['14-Apr-17', '2017-04-14'],
    ['3rd May 2019', '2019-05-03'],
    ['06.09.2021', '2021-09-06'],
    ['5. März 2021', '2021-03-05'],
    ['0/1/2020', 'bad'],
    ['1/1/1949', 'bad'],
    ['spring', 'bad'],
    ['', 'blank'],
  ])('%s with the month first is %s', (text, day) => expect(us(text)).toBe(day));
  it.each([
    ['3/12/2018', '2018-12-03'],
    ['30/2/2020', 'bad'],
    ['06.09.2021', '2021-09-06'],
  ])('%s with the day first is %s', (text, day) => expect(eu(text)).toBe(day));
});

describe('hours as people type them', () => {
  it.each([
    ['2.5', 9000],
    ['1:45', 6300],
    ['2h15', 8100],
    ['3h45', 13_500],
    ['30 min', 1800],
    ['135 min', 8100],
    ['4', 14_400],
    ['2,5', 9000],
    ['3 hrs', 10_800],
    ['0', 0],
    ['', 'blank'],
    ['half day', 'bad'],
    ['100000', 360_000_000],
    ['103197', 'bad'],
    ['1:75', 'bad'],
  ])('%s is %s seconds', (text, seconds) => expect(readHours(text)).toBe(seconds));
});

describe('vehicles as people type them', () => {
  it.each([
    ['13 F-150', 2013, null, 'f150'],
    ['2013 F-150 red', 2013, null, 'f150'],
    ['F-150 13', 2013, null, 'f150'],
    ["'05 Altima", 2005, null, 'altima'],
    ['2012 Dodge Caravan', 2012, 'Dodge', 'caravan'],
    ['2010 Ceed weiß', 2010, null, 'ceed'],
    ['Land Rover Discovery 98', 1998, 'Land Rover', 'discovery'],
    ['TC-01', null, null, 'tc01'],
    ['2011 Mazda', 2011, null, 'mazda'],
  ])('%s', (text, year, make, key) => expect(readVehicle(text, 2026)).toMatchObject({ year, make, key }));
  it.each([
    ['caravan', 'caavan', true],
    ['escape', 'escaape', true],
    ['silverado', 'silverdo', true],
    ['f150', 'f250', false],
    ['civic', 'civci', true],
    ['golf', 'polo', false],
    ['a4', 'a6', false],
    ['mazda3', 'mazda6', false],
  ])('%s and %s: a slip of the pen is %s', (a, b, isOne) => expect(isSlip(a, b)).toBe(isOne));
});

describe('tags given to rebuilds', () => {
  it('stay within what a rebuild may be called, and unlike each other, however many share a name', () => {
    const tagFor = tagMaker(['B-7']);
    const tags = Array.from({ length: 1200 }, () => tagFor('the same long name of one and the same car'));
    expect(Math.max(...tags.map((tag) => tag.length))).toBeLessThanOrEqual(40);
    expect(new Set(tags).size).toBe(1200);
    expect(tagFor('b-7')).toBe('b-7 (2)');
    expect(tagFor(`x${'\u{1F697}'.repeat(30)}`)).toBe(`x${'\u{1F697}'.repeat(16)}`);
  });
});

describe('category words', () => {
  const of = categoryReader(DEFAULT_CATEGORIES.map(({ name }) => name));
  it.each([
    ['Auction fee', 'auction fees'],
    ['Towing', 'transport'],
    ['Paint/body', 'paint & body materials'],
    ['Title/DMV', 'title & registration'],
    ['Ads', 'selling costs'],
    ['Body shop', 'outside labor (sublet)'],
    ['Teile', 'parts'],
    ['TÜV', 'inspection'],
    ['Auktionsgebühr', 'auction fees'],
    ['Purchase', 'purchase'],
    ['SOLD', 'sale'],
    ['airbags', 'restraints (SRS)'],
  ])('%s is %s', (word, category) => expect(of(word)).toEqual({ category, isSure: true }));
  it('guesses from a part of the words, and says that it is a guess', () =>
    expect(of('brake parts and such')).toEqual({ category: 'parts', isSure: false }));
  it('does not guess from nothing', () => expect(of('widdershins')).toBeNull());
  it('finds the shop’s own word for the same thing', () =>
    expect(categoryReader(['Hauling', 'Misc'])('tow')).toEqual({ category: 'Hauling', isSure: true }));
});

it.each([
  ['TOTAL', true],
  ['total Jan', true],
  ['car total', true],
  ['Summe', true],
  ['Zwischensumme', true],
  ['Parts subtotal', true],
  ['total loss fee waived by them', true],
  ['door shell', false],
])('%s labels a total: %s', (text, isTotal) => expect(isTotalLabel(text)).toBe(isTotal));
