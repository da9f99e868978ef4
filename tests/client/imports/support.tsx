import { configure } from '@testing-library/react';
import type { Reading } from '#shared/contracts/import-reading.ts';
import { type Import, type ImportRow, importsApi } from '#shared/contracts/imports.ts';
import { shopApi } from '#shared/contracts/shop.ts';
import { DEFAULT_CATEGORIES, type Role } from '#shared/vocabulary.ts';
import { ImportPage } from '../../../src/pages/import.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';
import './laid-out.ts';

export const ID = idOf('i');
// A reading of a whole file is much to draw, and the machine may be busy.
configure({ asyncUtilTimeout: 8000 });

/** A short list of costs with a bad day in row 4, no vehicle in row 5 and words for an amount in row 6. */
export const SMALL = [
  'Date,Car,What for,Paid,Note',
  '2/8/2020,13 F-150,Purchase,"$3,405.00",bid',
  '2/9/2020,13 F-150,Parts,$40.70,tail light',
  '2/30/2020,13 F-150,Supplies,$31.40,wire',
  '2/23/2020,,Parts,$23.18,clips',
  '2/24/2020,13 F-150,Parts,see receipt,mirror',
  '2/25/2020,13 F-150,Parts,$12.00,hose',
].join('\n');

/** An import of `old.csv` that was read. */
export function buildImport(reading: Reading | null, change: Partial<Import> = {}): Import {
  return {
    id: ID,
    fileName: 'old.csv',
    byteSize: 100,
    state: 'ready',
    shape: reading?.shape ?? null,
    refusal: null,
    createdBy: 'Dana Whitlock',
    createdAt: '2026-06-15T10:00:00Z',
    committedAt: null,
    undoneAt: null,
    rowsTaken: reading?.control.taken ?? null,
    rowsPutAside: reading?.control.putAside ?? null,
    version: 1,
    progress: null,
    reading,
    files: [{ number: 1, name: 'old.csv', byteSize: 100 }],
    settings: {},
    ...change,
  };
}

const lists = on(shopApi.lists, () => ({
  classes: [],
  damages: [],
  workers: [],
  categories: DEFAULT_CATEGORIES.map(({ name }, position) => ({
    id: idOf(String(position % 10)),
    name,
    position,
    isRetired: false,
    isPaidLabor: false,
    version: 1,
  })),
}));

/** The first rows of a reading as the server pages them: a hundred at a time, the cursor saying how many went before. */
export const firstRowsOf = (reading: Reading | null): ImportRow[] =>
  (reading?.firstRows ?? []).map((row) => ({
    ...row,
    lines: row.lines.map((line) => ({ ...line, entryId: null })),
  }));

/**
 * A server that holds one import and its rows; writes change it. `rows` stand in for those of the reading; `starts` lists
 * what was asked of the rows; `reread` is what a change makes of the import; `refuseOnce` refuses the next write.
 */
export function serve(
  start: Import,
  { role = 'owner', rows, reread = {} }: { role?: Role; rows?: readonly ImportRow[]; reread?: Partial<Import> } = {},
) {
  const kept = { file: start };
  const starts: string[] = [];
  const become = (change: Partial<Import>) => {
    kept.file = { ...kept.file, ...change };
    return kept.file;
  };
  const refusals: Refusal[] = [];
  const refuseOnce = (problem: Refusal['problem']) => void refusals.push(new Refusal(problem));
  const write = (change: Partial<Import>) => {
    const refusal = refusals.pop();
    if (refusal) throw refusal;
    return become(change);
  };
  const server = fakeServer([
    signedIn(buildSession(role)),
    lists,
    on(importsApi.show, () => kept.file),
    on(importsApi.rows, ({ query }) => {
      starts.push(JSON.stringify(query));
      const { sheet = 1, row = 1, outcome, cursor } = query;
      const all = (rows ?? firstRowsOf(kept.file.reading)).filter((one) => !outcome || one.outcome === outcome);
      const first = all.findIndex((one) => one.sheet > sheet || (one.sheet === sheet && one.row >= row));
      const from = cursor ? Number(cursor) : first < 0 ? all.length : first;
      return { rows: all.slice(from, from + 100), next: all.length > from + 100 ? String(from + 100) : null };
    }),
    on(importsApi.change, ({ body }) => write({ version: kept.file.version + 1, settings: body, ...reread })),
    on(importsApi.commit, () => write({ state: 'committed' })),
    on(importsApi.undo, () => write({ state: 'undone' })),
  ]);
  return { ...server, become, refuseOnce, starts };
}

/** Opens the import's page; `search` is the end of its address. */
export const open = (search = '') =>
  showPage(<ImportPage />, { path: '/s/:shopId/import/:importId', address: `/s/s/import/${ID}${search}` });
