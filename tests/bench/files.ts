import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import papaparse from 'papaparse';
import type { Import } from '#shared/contracts/imports.ts';
import { openFile } from '../../server/features/imports/sheets/open-file.ts';
import { bytesOf } from '../../server/features/imports/text/bytes.ts';
import { read } from '../imports/support.ts';
import { type Client, signUp } from './client.ts';
import { interleaved, type Measure, timed } from './rounds.ts';
import { ledgerFiles } from './workbooks.ts';

const ROWS = 50_000;
const ROUNDS = 7;
const POLL_MS = 5;
const SAMPLES = path.resolve(import.meta.dirname, '../fixtures/spreadsheets');

/** The same 50,000 × 12 cells as workbooks, against papaparse over them as CSV: opened only, and read with all meaning. */
export async function benchWorkbooks(): Promise<Measure[]> {
  const { csv, shared, inline, ods } = ledgerFiles(ROWS);
  const open = (bytes: Buffer) => () => timed(() => openFile(bytesOf(bytes)).sheets[0]?.forEachRow(() => undefined));
  const whole = (bytes: Buffer) => () => timed(() => read(bytes));
  const times = await interleaved(ROUNDS, {
    papaparse: () => timed(() => papaparse.parse<string[]>(csv)),
    openShared: open(shared),
    openInline: open(inline),
    openOds: open(ods),
    csv: whole(Buffer.from(csv)),
    shared: whole(shared),
    inline: whole(inline),
    ods: whole(ods),
  });
  const ratio = (name: string, value: number, limit: number | null): Measure => ({
    name,
    value: value / times.papaparse,
    unit: '×',
    limit,
  });
  return [
    { name: 'papaparse over the same cells as CSV', value: times.papaparse, unit: 'ms', limit: null },
    ratio('.xlsx, shared texts: opened', times.openShared, 12),
    ratio('.xlsx, texts in the cells: opened', times.openInline, 12),
    ratio('.ods: opened', times.openOds, 20),
    ratio('.csv: read and understood', times.csv, null),
    ratio('.xlsx, shared texts: read and understood', times.shared, 12),
    ratio('.xlsx, texts in the cells: read and understood', times.inline, 12),
    ratio('.ods: read and understood', times.ods, 20),
  ];
}

/** From sending a file to its first 200 rows understood, over HTTP: the samples, and 50,000 lines in every kind of file. */
export async function benchFirstRows(origin: string): Promise<Measure[]> {
  const { csv, shared, ods } = ledgerFiles(ROWS);
  // Making them blocks this process for seconds; let it notice connections that the server closed meanwhile.
  await wait(200);
  const client = await signUp(origin);
  const samples = readdirSync(SAMPLES).filter((name) => !name.endsWith('.json'));
  const of = async (file: string | Buffer) => {
    const times: number[] = [];
    for (let round = 0; round < 3; round += 1) times.push(await firstRows(client, Buffer.from(file)));
    return middle(times);
  };
  const each: number[] = [];
  for (const name of samples) each.push(await of(readFileSync(path.join(SAMPLES, name))));
  const long = { csv: await of(csv), shared: await of(shared), ods: await of(ods) };
  return [
    {
      name: 'first 200 rows: the median file, of the samples and 50,000 lines',
      value: middle([...each, long.csv]),
      unit: 'ms',
      limit: 1000,
    },
    { name: 'first 200 rows: 50,000 × 12 cells of CSV', value: long.csv, unit: 'ms', limit: 1000 },
    { name: 'first 200 rows: 50,000 × 12 cells of .xlsx', value: long.shared, unit: 'ms', limit: null },
    { name: 'first 200 rows: 50,000 × 12 cells of .ods', value: long.ods, unit: 'ms', limit: null },
  ];
}

/** Milliseconds until the first rows were there; comes back when nothing is under way that would weigh on the next. */
async function firstRows({ call }: Client, bytes: Buffer): Promise<number> {
  const form = new FormData();
  form.append('file', new Blob([new Uint8Array(bytes)]), 'old');
  const start = performance.now();
  let now = await call<Import>('POST', '/api/imports', form);
  const until = async (isReached: () => boolean) => {
    while (!isReached()) {
      await wait(POLL_MS);
      now = await call<Import>('GET', `/api/imports/${now.id}`);
    }
  };
  await until(() => now.reading !== null || now.state !== 'reading');
  const time = performance.now() - start;
  await until(() => now.state !== 'reading');
  return time;
}

function middle(values: readonly number[]): number {
  return values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)] ?? Number.NaN;
}
