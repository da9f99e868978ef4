import { openDatabase } from '../../server/platform/database.ts';
import { startServer } from '../e2e/support/server.ts';
import { benchAnswers, coldTotal } from './answers.ts';
import { peakMegabytes, signUp } from './client.ts';
import { benchFirstRows, benchWorkbooks } from './files.ts';
import { fillShop } from './fill.ts';
import { benchImport } from './imports.ts';
import { inventLines, inventRebuilds } from './invent.ts';
import { benchRules } from './rules.ts';
import { interleaved, type Measure, printTable } from './rounds.ts';

/** `npm run bench`: speed as ratios taken in one run. Takes a few minutes; not part of the tests. */
const REBUILDS = 2000;
const PER_REBUILD = 60;
const GROWTH_ROUNDS = 5;

printTable('What the contingency page computes, in this process', await benchRules());

const server = await startServer({ demo: false });
try {
  const rebuilds = inventRebuilds(REBUILDS);
  const lines = inventLines(rebuilds, PER_REBUILD);
  const filled = async (count: number, perRebuild: number) => {
    const client = await signUp(server.origin);
    const database = await openDatabase(server.dataDir);
    const some = inventRebuilds(count);
    await fillShop(database, client.shopId, some, inventLines(some, perRebuild));
    await database.close();
    return client;
  };
  const whole = await filled(REBUILDS, PER_REBUILD);
  const answers = await benchAnswers(whole, rebuilds, lines);
  printTable(`Answers over ${lines.length} lines of ${REBUILDS} rebuilds, over HTTP`, answers);

  const tenth = await filled(REBUILDS, PER_REBUILD / 10);
  const few = await filled(REBUILDS / 10, PER_REBUILD);
  const times = await interleaved(GROWTH_ROUNDS, {
    whole: await coldTotal(whole),
    tenth: await coldTotal(tenth),
    few: await coldTotal(few),
  });
  const growth: Measure[] = [
    {
      name: 'ten times the lines over the same rebuilds (flat)',
      value: times.whole / times.tenth,
      unit: '×',
      limit: 1.5,
    },
    { name: 'ten times the rebuilds, 60 lines each (linear)', value: times.whole / times.few, unit: '×', limit: 12 },
  ];
  printTable('Growth of all five answers, cold', growth);
  const atAnswers = peakMegabytes(server.pid);

  printTable('Import', await benchImport(server.origin, rebuilds, lines));
  const vehicles = inventRebuilds(900);
  printTable('Import of 900 vehicles', await benchImport(server.origin, vehicles, inventLines(vehicles, 56)));
  printTable('First rows of a file, over HTTP', await benchFirstRows(server.origin));
  printTable('50,000 × 12 cells as workbooks ÷ papaparse', await benchWorkbooks());
  printTable('Memory of the server, the most it held', [
    { name: 'through the answers', value: atAnswers, unit: 'MB', limit: 300 },
    { name: 'through the imports too', value: peakMegabytes(server.pid), unit: 'MB', limit: 400 },
  ]);
} finally {
  await server.stop();
}
