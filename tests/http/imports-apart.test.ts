import { spawn } from 'node:child_process';
import { describe, expect, it } from 'vitest';
import { recoverImports } from '../../server/features/imports/background.ts';
import { importFile } from '../../server/features/imports/import-file.ts';
import { importPath } from '../../server/features/imports/files.ts';
import { sampleBytes } from '../imports/support.ts';
import { testApi } from '../support/api.ts';
import { expenseList, settled, uploaded } from './imports-support.ts';

/** A list long enough that its commit takes a while. */
const longList = (rows: number) =>
  expenseList(
    ...Array.from(
      { length: rows },
      (_, i) => `2020-01-${String((i % 28) + 1).padStart(2, '0')},T-${i % 500},Parts,part ${i},${i + 1}.00`,
    ),
  );

const BOOKING = `
  const { work } = await import(process.argv[1]);
  work(JSON.parse(process.argv[2], (key, value) => (key === 'now' ? new Date(value) : value)), (share) => share > 0.5 && process.stdout.write('half'));
  process.stdout.write('done');
`;

describe('an import and everything else', () => {
  it('a process killed in the middle of booking leaves nothing, and the file is ready again', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { database, config } = api.services;
    const read = await uploaded(ada, longList(12_000));
    await database.writer('imports').where({ id: read.id }).update({ state: 'committing' });
    const job = {
      kind: 'commit',
      databaseFile: database.file,
      shopId: ada.shopId,
      importId: read.id,
      userId: null,
      now: new Date(),
      settings: {},
      control: read.reading?.control,
      at: new Date().toISOString(),
      requestId: 'x',
      files: [{ name: 'old.csv', path: importPath(config.dataDir, read.id) }],
    };
    const entry = new URL('../../server/features/imports/work.ts', import.meta.url).href;
    const child = spawn(
      process.execPath,
      ['--import', 'tsx', '--input-type=module', '-e', BOOKING, entry, JSON.stringify(job)],
      { stdio: ['ignore', 'pipe', 'inherit'] },
    );
    const said = await new Promise<string>((resolve) => {
      child.stdout.once('data', (data: Buffer) => {
        child.kill('SIGKILL');
        child.once('exit', () => resolve(data.toString()));
      });
    });
    expect(said).toMatch(/^half/);
    expect(said).not.toContain('done');
    await recoverImports(api.services);
    expect((await ada.get('/api/entries')).body.rows).toEqual([]);
    expect((await ada.get('/api/rebuilds')).body.rows).toEqual([]);
    expect((await settled(ada, read.id)).state).toBe('ready');
    await ada.post(`/api/imports/${read.id}/commit`);
    expect((await settled(ada, read.id)).state).toBe('committed');
  }, 60_000);

  it('reads go on and writes wait their turn while an import is booked', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await uploaded(ada, longList(8000));
    await ada.post(`/api/imports/${read.id}/commit`);
    const write = ada.post('/api/rebuilds', { tag: 'Meanwhile' });
    const seen = new Set<number>();
    for (let i = 0; i < 20; i++) seen.add((await ada.get('/api/rebuilds')).body.rows.length);
    expect((await write).status).toBe(201);
    await settled(ada, read.id);
    // All at once or nothing: a reader sees no part of the five hundred rebuilds (a page holds a hundred).
    expect([...seen].every((count) => [0, 1, 100].includes(count))).toBe(true);
  }, 60_000);

  it('a list brought in for the demo or by a tool is booked as by the page', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { database, config } = api.services;
    const { userId } = (await database
      .reader('memberships')
      .where({ shop_id: ada.shopId })
      .first('user_id as userId')) as { userId: string };
    const file = { database, config, shopId: ada.shopId, userId, requestId: 'tool', fileName: 'cars.csv' };
    const { importId } = await importFile({ ...file, bytes: sampleBytes('p01_rebuild_summary_us.csv') });
    expect((await ada.get(`/api/imports/${importId}`)).body).toMatchObject({ state: 'committed', rowsTaken: 10 });
    await expect(importFile({ ...file, bytes: sampleBytes('p05_hours_log.tsv') })).rejects.toThrow('month or the day');
    await expect(
      importFile({ ...file, bytes: Buffer.from('Date,What for,Paid\n2020-01-02,Parts,10.00') }),
    ).rejects.toThrow('No column');
  });
});
