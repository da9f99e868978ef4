import { beforeAll, expect, test } from 'vitest';
import type { CheckKind, ChecksAnswer } from '#shared/contracts/checks.ts';
import { seedDemo } from '../../seeds/demo.ts';
import { demoBook } from '../../seeds/demo/generate.ts';
import { readChecks } from '../../server/features/checks/read-model.ts';
import { testApi } from '../support/api.ts';

// Source of what must be found: the flaws that the generator plants, one by one, in seeds/demo/flaws.ts.
const book = demoBook();
const planted = (flaw: string) => [...(book.planted.get(flaw) ?? [])];

let answer: ChecksAnswer;
beforeAll(async () => {
  const { services } = await testApi();
  await seedDemo(services);
  const { reader } = services.database;
  const { id } = await reader('shops').first('id');
  answer = await readChecks(services.database, id, '2026-12-15');
});

const found = (kind: CheckKind) => answer.findings.find((one) => one.kind === kind);
const tagsOf = (kind: CheckKind) => (found(kind)?.items ?? []).flatMap(({ rebuild }) => rebuild?.tag ?? []).sort();

test.each([
  ['receipt twice', 'receipt twice'],
  ['refund as cost', 'core refund entered as a cost'],
  ['long day', 'timer left running 14 hours'],
  ['entry before purchase', 'receipt before the purchase'],
  ['estimate written over', 'baseline overwritten'],
] as const)('finds the planted “%s”, and nothing else of its kind', (kind, flaw) => {
  expect(planted(flaw)).toHaveLength(1);
  expect(tagsOf(kind)).toEqual(planted(flaw));
});

test('finds every rebuild without an estimate and without hours, the planted ones and those of the old sheets', () => {
  expect(tagsOf('no estimate')).toEqual(expect.arrayContaining(planted('no baseline')));
  expect(tagsOf('no own hours')).toEqual(expect.arrayContaining(planted('no hours')));
  expect(tagsOf('no estimate').length).toBeLessThan(answer.finishedCount / 2);
});

test('finds the vehicle number with a letter O among those that do not check', () => {
  expect(tagsOf('vehicle number')).toEqual(expect.arrayContaining(planted('VIN with a letter O')));
});

test('says that rows of the old sheets were put aside, and which file they lie in', () => {
  expect(found('rows put aside')?.items.map(({ text }) => text)).toEqual(
    expect.arrayContaining([expect.stringMatching(/\.csv: \d+ rows?$/)]),
  );
});
