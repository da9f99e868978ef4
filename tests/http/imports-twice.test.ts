import { expect, it } from 'vitest';
import { sampleBytes } from '../imports/support.ts';
import { testApi } from '../support/api.ts';
import { booked, everything, settled, uploaded } from './imports-support.ts';

// A line more: other bytes, so that it is not stopped at the door, and nothing new.
const withBlankLine = (name: string) => Buffer.concat([sampleBytes(name), Buffer.from('\n')]);
const BESIDE = new Set(['import_sheets']);

it.each([
  'p01_rebuild_summary_us.csv',
  'p02_expense_ledger_us.csv',
  'p03_single_car_sheet.csv',
  'p05_hours_log.tsv',
  'p07_receipts_messy.csv',
  'p08_notes_and_junk.csv',
])('%s brought in twice is in the books once', async (name) => {
  const api = await testApi();
  const ada = await api.owner();
  const books = async () => (await everything(api)).filter(([table]) => !BESIDE.has(table as string));
  const first = await uploaded(ada, sampleBytes(name));
  const answers = Object.fromEntries(
    (first.reading?.choices ?? []).filter(({ mustAsk }) => mustAsk).map(({ id, preset }) => [id, preset]),
  );
  await ada.patch(`/api/imports/${first.id}`, first.version, { answers });
  await booked(ada, await settled(ada, first.id));
  const once = await books();
  const again = await uploaded(ada, withBlankLine(name));
  expect(again.reading?.control).toMatchObject({
    entries: 0,
    costCents: 0,
    saleCents: 0,
    hoursSeconds: 0,
    estimateCents: 0,
  });
  expect(again.reading?.choices.filter(({ mustAsk, answer }) => mustAsk && answer === null)).toEqual([]);
  expect(again.reading?.asideCount).toBe((await settled(ada, first.id)).reading?.asideCount);
  await booked(ada, again);
  expect(await books()).toEqual(once);
});
