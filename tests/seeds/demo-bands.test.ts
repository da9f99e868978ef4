import { describe, expect, test } from 'vitest';
import { bands } from '../../seeds/demo/bands.ts';
import type { DemoVehicle } from '../../seeds/demo/demo-book.ts';
import { measured } from '../../seeds/demo/facts.ts';
import { demoBook } from '../../seeds/demo/generate.ts';
import { lessons } from '../../seeds/demo/lessons.ts';
import { BOUGHT_PER_YEAR, DAMAGE_TRAITS, DEMO_CLASSES, DEMO_DAMAGES, FIRST_YEAR } from '../../seeds/demo/parameters.ts';
import { isOverwritten } from '../../server/domain/sets.ts';

// The bounds are those of the demo's scenario; the figures come from the product's own measures.
const book = demoBook();
const data = measured(book);
const tagged = (flaw: string) => {
  const tags = book.planted.get(flaw) ?? [];
  return book.vehicles.filter(({ tag }) => tags.includes(tag));
};
const only = (flaw: string): DemoVehicle => {
  const [first, ...others] = tagged(flaw);
  if (!first || others.length > 0) throw new Error(`${flaw}: planted ${tagged(flaw).length} times`);
  return first;
};

describe('figures of the demo', () => {
  test.each(bands(data).map((band) => [band.name, band] as const))(
    '%s lies in its band',
    (_name, { value, low, high }) => {
      expect(value).toBeGreaterThanOrEqual(low);
      expect(value).toBeLessThanOrEqual(high);
    },
  );
});

describe('lessons hidden in the demo', () => {
  test.each(lessons(data).map(({ name, holds }) => [name, holds] as const))('%s', (_name, holds) => {
    expect(holds).toBe(true);
  });
});

describe('make-up of the demo', () => {
  test('the same seed gives the same book, another seed another one', () => {
    expect(demoBook()).toEqual(book);
    expect(demoBook(book.seed + 1).vehicles).not.toEqual(book.vehicles);
  });

  test('64 vehicles are bought over six years and end as the scenario says', () => {
    const perYear = BOUGHT_PER_YEAR.map(
      (_, index) => book.vehicles.filter(({ dates }) => dates.boughtOn?.startsWith(String(FIRST_YEAR + index))).length,
    );
    expect(perYear).toEqual([6, 9, 11, 12, 14, 12]);
    const sold = book.vehicles.filter(({ dates }) => dates.soldOn !== null);
    const partedOut = book.vehicles.filter(({ exit }) => exit?.kind === 'parted out');
    const unsold = book.vehicles.filter(({ dates, exit }) => dates.soldOn === null && exit === null);
    expect(sold).toHaveLength(57);
    expect(partedOut.map(({ damage }) => damage).sort()).toEqual(['flood', 'flood', 'rollover']);
    expect(unsold.filter(({ dates }) => dates.listedOn !== null)).toHaveLength(2);
    expect(unsold.filter(({ dates }) => dates.listedOn === null)).toHaveLength(2);
  });

  test.each(DEMO_DAMAGES)('%s comes in every class as often as its quota', (damage) => {
    const counts = DEMO_CLASSES.map(
      (name) => book.vehicles.filter((one) => one.damage === damage && one.class === name).length,
    );
    expect(counts).toEqual([...DAMAGE_TRAITS[damage].quota]);
  });

  test('nothing is dated after its today, and tags are unique', () => {
    const days = book.vehicles.flatMap(({ dates, entries, hours, exit }) => [
      ...Object.values(dates),
      ...entries.map(({ datedOn }) => datedOn),
      ...hours.map(({ workedOn }) => workedOn),
      exit?.on ?? null,
    ]);
    const all = [...days, ...book.overhead.map(({ datedOn }) => datedOn)].filter((day) => day !== null);
    expect(all.filter((day) => day > book.today)).toEqual([]);
    expect(new Set(book.vehicles.map(({ tag }) => tag)).size).toBe(64);
  });

  test('marking dates come in order, but for an ad that is out before the title', () => {
    for (const { dates } of book.vehicles) {
      const { boughtOn, paidOn, pickedUpOn, startedOn, roadworthyOn, inspectedOn, titleIssuedOn, soldOn, settledOn } =
        dates;
      const days = [
        boughtOn,
        paidOn,
        pickedUpOn,
        startedOn,
        roadworthyOn,
        inspectedOn,
        titleIssuedOn,
        soldOn,
        settledOn,
      ];
      const known = days.filter((day) => day !== null);
      expect(known).toEqual([...known].sort());
      expect((dates.listedOn ?? '9999') >= (roadworthyOn ?? '')).toBe(true);
    }
  });
});

describe('flaws planted in the demo', () => {
  test('three have no baseline, two no hours, nine stand only in old sheets, one is not settled', () => {
    expect(tagged('no baseline').map(({ baseline }) => baseline)).toEqual([null, null, null]);
    expect(tagged('no hours').map(({ hours }) => hours)).toEqual([[], []]);
    expect(tagged('only in old sheets')).toHaveLength(9);
    expect(only('not settled').dates.settledOn).toBeNull();
  });

  test('one baseline is overwritten, so that its overrun is nothing in every category', () => {
    const overwritten = data.facts.filter(isOverwritten).map(({ id }) => id);
    expect(overwritten).toEqual([only('baseline overwritten').tag]);
  });

  test('one receipt stands twice, and no other does', () => {
    const doubled = book.vehicles.filter(({ entries }) => {
      const texts = entries.filter(({ datedOn }) => datedOn !== null).map((entry) => JSON.stringify(entry));
      return new Set(texts).size < texts.length;
    });
    expect(doubled).toEqual([only('receipt twice')]);
  });

  test('one receipt is dated before its vehicle was bought', () => {
    const early = book.vehicles.filter(({ entries, dates }) =>
      entries.some(({ datedOn }) => datedOn !== null && datedOn < (dates.boughtOn ?? '')),
    );
    expect(early).toEqual([only('receipt before the purchase')]);
  });

  test('a core refund is a cost, a VIN has a letter O, a buyer traded in, a timer ran 14 hours', () => {
    const refund = only('core refund entered as a cost').entries.find(({ what }) => what?.startsWith('core refund'));
    expect(refund?.cents).toBeGreaterThan(0);
    expect(only('VIN with a letter O').vin).toMatch(/^(?=.*O).{17}$/);
    expect(only('trade-in payment').buyerChannel).toContain('trade-in');
    expect(only('timer left running 14 hours').hours.filter(({ seconds }) => seconds === 14 * 3600)).toHaveLength(1);
    expect(only('maybe kept for own use').dates.soldOn).toBeNull();
  });

  test('a part moves between two vehicles without a cent lost', () => {
    const moves = tagged('part moved between vehicles').map(({ entries }) =>
      entries.filter(({ what }) => what?.startsWith('battery, ')).map(({ cents, datedOn }) => ({ cents, datedOn })),
    );
    expect(moves.flat()).toHaveLength(2);
    expect(moves.flat().reduce((sum, { cents }) => sum + cents, 0)).toBe(0);
    expect(new Set(moves.flat().map(({ datedOn }) => datedOn)).size).toBe(1);
  });

  test('one comes back 45 days after its sale, in the next year', () => {
    const { dates, entries } = only('comeback in the next year');
    const late = entries.filter(({ datedOn }) => datedOn !== null && datedOn > (dates.soldOn ?? ''));
    expect(late).toHaveLength(1);
    expect(Date.parse(late[0]?.datedOn ?? '') - Date.parse(dates.soldOn ?? '')).toBe(45 * 86_400_000);
    expect(late[0]?.datedOn?.slice(0, 4)).not.toBe(dates.soldOn?.slice(0, 4));
  });
});
