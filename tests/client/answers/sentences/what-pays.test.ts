import { expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { plain } from '../../../../src/features/answers/sentences/parts.ts';
import { oldSheetPays, sayWhatPays } from '../../../../src/features/answers/sentences/what-pays.ts';
import { comparison, group, whatPaysReply } from '../what-pays-reply.ts';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });
const say = (reply: ReturnType<typeof whatPaysReply>) => plain(sayWhatPays(reply, format).answer);

const hailSuv = group({ class: 'SUV', damage: 'hail' }, 8, 5_200);
const floodSmall = group({ class: 'small car', damage: 'flood' }, 6, -800);
const rearVan = group({ class: 'van', damage: 'rear' }, 2, 9_900);

test('kinds with enough rebuilds are named, best and least', () => {
  expect(say(whatPaysReply({ cells: comparison([hailSuv, floodSmall, rearVan]) }))).toBe(
    'SUV with hail damage pays best, at $52 an hour; small car with flood damage loses $8.',
  );
});

test('a kind with too few is never named, however well it did', () => {
  const { answer, cautions } = sayWhatPays(
    whatPaysReply({ cells: comparison([hailSuv, floodSmall, rearVan]) }),
    format,
  );
  expect(plain(answer)).not.toContain('van');
  expect(cautions).toContain('One kind of wreck has fewer than 5 rebuilds: too few yet.');
});

test('where most kinds have too few, damage and class each speak for all', () => {
  const reply = whatPaysReply({
    cells: comparison([hailSuv, floodSmall, ...Array.from({ length: 9 }, (_, at) => group({ class: `c${at}` }, 4, 0))]),
    damages: comparison([group({ damage: 'hail' }, 8, 6_400), group({ damage: 'flood' }, 7, 500)]),
    classes: comparison([group({ class: 'pickup' }, 10, 5_300), group({ class: 'small car' }, 12, -400)]),
  });
  expect(say(reply)).toBe(
    'Hail damage pays best, at $64 an hour; flood damage brings least, $5. By class, pickup pays best, at $53; small car loses $4.',
  );
});

test('a group whose whole range is below zero is called out', () => {
  const reply = whatPaysReply({ cells: comparison([hailSuv, floodSmall]) });
  expect(sayWhatPays(reply, format).cautions).toContain(
    'Small car with flood damage: the whole range lies below zero.',
  );
});

test('no difference shown means no best and no worst', () => {
  const same = comparison([hailSuv, floodSmall], 0);
  expect(say(whatPaysReply({ cells: same, classes: same, damages: same }))).toBe(
    'No kind of wreck can be told from another yet: all together they bring $19 an hour.',
  );
});

test('too few of everything: only what they kept all together', () => {
  const cells = comparison([group({ class: 'SUV', damage: 'hail' }, 2, 5_000), group({ class: 'van' }, 1, 100)]);
  expect(say(whatPaysReply({ cells }, 3))).toBe(
    'Too few yet to say which wrecks pay. Three finished rebuilds all together kept $600 so far.',
  );
});

test('nothing finished, or no hours', () => {
  expect(say(whatPaysReply({}, 0))).toBe('Nothing has been finished yet, so nothing can be said of what pays.');
  expect(say(whatPaysReply({}, 4))).toBe(
    'Hours are not known for any finished rebuild, so nothing can be said by the hour. Four finished rebuilds all together kept $800 so far.',
  );
});

test('on cost it speaks in percent', () => {
  const cells = comparison([
    group({ class: 'SUV', damage: 'hail' }, 8, 0.31, 0.1),
    group({ class: 'van', damage: 'rear' }, 6, 0.02, 0.1),
  ]);
  expect(say(whatPaysReply({ cells }, 20, 'on-cost'))).toBe(
    'SUV with hail damage pays best, at 31% on cost; van with rear damage brings least, 2%.',
  );
});

test('after a wage it speaks of a rebuild, and says where no wage is set', () => {
  const cells = comparison([
    group({ class: 'SUV', damage: 'hail' }, 8, 90_000),
    group({ class: 'van', damage: 'rear' }, 6, -40_000),
  ]);
  const reply = whatPaysReply({ cells }, 20, 'after-wage');
  expect(say(reply)).toMatch(/^No wanted pay per hour is set on the Shop page/);
  const afterWage = { ...reply.views.afterWage, wantedCentsPerHour: 2500, leftCents: -1, leftPerRebuildCents: -1 };
  expect(say({ ...reply, views: { ...reply.views, afterWage } })).toBe(
    'SUV with hail damage pays best, at $900 a rebuild after the wage for own hours; van with rear damage loses $400.',
  );
});

test('the old sheet stands beside the whole books, and after the wage', () => {
  const reply = whatPaysReply({});
  expect(oldSheetPays(reply, format)).toBe(
    'An old sheet, with sold ones only and purchase and parts as their cost, would have said $300 a rebuild. ' +
      'Every bill and every way out leave $200.',
  );
  const afterWage = { ...reply.views.afterWage, wantedCentsPerHour: 2500, leftPerRebuildCents: -35_500 };
  expect(oldSheetPays({ ...reply, views: { ...reply.views, afterWage } }, format)).toMatch(
    /leave \$200; after \$25 for each own hour, −\$355\.$/,
  );
  expect(oldSheetPays({ ...reply, oldSheet: { ...reply.oldSheet, old: { n: 0, keptCents: 0 } } }, format)).toBeNull();
});
