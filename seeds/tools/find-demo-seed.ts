import { failures } from '../demo/find-seed.ts';

/** `npx tsx seeds/tools/find-demo-seed.ts 1 5000` prints the seeds of a range that the demo may use. */
const [from = 1, to = 1_000] = process.argv.slice(2).map(Number);
for (let seed = from; seed <= to; seed += 1) {
  if (failures(seed).length === 0) process.stdout.write(`${seed}\n`);
}
