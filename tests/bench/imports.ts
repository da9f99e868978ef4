import { copyFileSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import type { Import } from '#shared/contracts/imports.ts';
import { DEFAULT_CATEGORIES } from '#shared/vocabulary.ts';
import { signUp } from './client.ts';
import type { InventedLine, InventedRebuild } from './invent.ts';
import { plainImport, plainWarehouse } from './plain-import.ts';
import { interleaved, type Measure, timed } from './rounds.ts';

const ROUNDS = 5;
const POLL_MS = 50;

/** Upload to durable commit through the API, against a plain script that puts the same rows into the same tables. */
export async function benchImport(
  origin: string,
  rebuilds: readonly InventedRebuild[],
  lines: readonly InventedLine[],
): Promise<Measure[]> {
  const folder = mkdtempSync(path.join(tmpdir(), 'panelgap-bench-'));
  const file = path.join(folder, 'ledger.csv');
  const rows = writeLedger(file, rebuilds, lines);
  const template = path.join(folder, 'template.sqlite');
  await plainWarehouse(template);
  let round = 0;
  try {
    const times = await interleaved(ROUNDS, {
      product: () => importThroughApi(origin, file, rows),
      plain: async () => {
        round += 1;
        const copy = path.join(folder, `${round}.sqlite`);
        copyFileSync(template, copy);
        return timed(() => plainImport(copy, file));
      },
    });
    return [
      { name: `import of ${rows} lines: upload to commit`, value: times.product, unit: 'ms', limit: null },
      { name: 'import: plain script, no sums kept', value: times.plain, unit: 'ms', limit: null },
      { name: 'import ÷ plain script', value: times.product / times.plain, unit: '×', limit: 2.5 },
    ];
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** The lines of rebuilds as an old ledger would hold them. Gives how many. */
function writeLedger(file: string, rebuilds: readonly InventedRebuild[], lines: readonly InventedLine[]): number {
  const rows = lines.flatMap(({ rebuild, category, on, cents, isSurprise }, i) => {
    if (rebuild === null) return [];
    const amount = (cents / 100).toFixed(2);
    const kind = DEFAULT_CATEGORIES[category]?.name ?? 'other';
    return [`${on},${rebuilds[rebuild]?.tag},${kind},bill ${i},${isSurprise ? 'no' : 'yes'},${amount}`];
  });
  writeFileSync(file, `Date,Vehicle,Category,Description,Planned?,Amount\n${rows.join('\n')}\n`);
  return rows.length;
}

async function importThroughApi(origin: string, file: string, rows: number): Promise<number> {
  // The plain script blocks this process for seconds; let it notice connections that the server closed meanwhile.
  await wait(200);
  const { call } = await signUp(origin);
  const form = new FormData();
  form.append('file', new Blob([readFileSync(file)]), 'ledger.csv');
  const settled = async (id: string): Promise<Import> => {
    for (;;) {
      const now = await call<Import>('GET', `/api/imports/${id}`);
      if (now.state !== 'reading' && now.state !== 'committing') return now;
      await wait(POLL_MS);
    }
  };
  const time = await timed(async () => {
    const { id } = await call<Import>('POST', '/api/imports', form);
    await settled(id);
    await call('POST', `/api/imports/${id}/commit`);
    const done = await settled(id);
    if (done.state !== 'committed')
      throw new Error(`the import ended as ${done.state}: ${JSON.stringify(done).slice(0, 500)}`);
  });
  const { totals } = await call<{ totals: { count: number } }>('GET', '/api/entries');
  if (totals.count !== rows) throw new Error(`${totals.count} of ${rows} lines came in`);
  return time;
}
