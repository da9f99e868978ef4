import { openDatabase, rawHandle } from '../../server/platform/database.ts';
import { differences, kept, recount } from './recount.ts';

/** npm run rollup:check: are the kept sums of every shop under DATA_DIR those that a recount gives? Exits 1 if not. */
const database = await openDatabase(process.env['DATA_DIR'] ?? './data');
try {
  const raw = await rawHandle(database.reader);
  const shops = raw.prepare('SELECT id, name FROM shops').all() as { id: string; name: string }[];
  for (const shop of shops) {
    const counted = recount(raw, shop.id);
    const faults = differences(counted, kept(raw, shop.id));
    process.stdout.write(`${shop.name}: ${counted.size} sums, ${faults.length} differ\n`);
    for (const fault of faults) process.stdout.write(`  ${fault}\n`);
    if (faults.length > 0) process.exitCode = 1;
  }
} finally {
  await database.close();
}
