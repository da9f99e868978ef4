import type { Client } from './client.ts';
import { duckDb } from './duck.ts';
import type { InventedLine, InventedRebuild } from './invent.ts';
import { interleaved, type Measure, timed } from './rounds.ts';

export const QUESTIONS = ['year', 'what-pays', 'overruns', 'time-to-sell', 'contingency'] as const;
const ROUNDS = 9;
/** Asked before anything is measured: a server that has just started has not compiled its own code yet. */
const WARM_UP = 15;
const COLD_MS = 50;
const WARM_MS = 5;

/**
 * Every answer over HTTP against DuckDB on the raw lines: cold, since an entry has just changed the books; with every
 * rebuild read anew, as the first after a start or after a category was renamed; and warm.
 */
export async function benchAnswers(
  client: Client,
  rebuilds: readonly InventedRebuild[],
  lines: readonly InventedLine[],
): Promise<Measure[]> {
  const duck = await duckDb(rebuilds, lines);
  const change = await changes(client);
  const measures: Measure[] = [];
  for (const question of QUESTIONS) {
    const ask = () => client.call('GET', `/api/answers/${question}`);
    const after = (before: () => Promise<unknown>) => async () => {
      await before();
      return timed(ask);
    };
    for (let i = 0; i < WARM_UP; i += 1) await after(change.add)();
    const times = await interleaved(ROUNDS, {
      anew: after(change.rename),
      patched: after(change.add),
      warm: after(ask),
      duck: () => timed(() => duck.ask(question)),
    });
    measures.push(
      { name: `${question}: cold, after one entry`, value: times.patched, unit: 'ms', limit: COLD_MS },
      { name: `${question}: every rebuild read anew, as after a start`, value: times.anew, unit: 'ms', limit: COLD_MS },
      { name: `${question}: warm`, value: times.warm, unit: 'ms', limit: WARM_MS },
      { name: `${question}: DuckDB on the raw lines`, value: times.duck, unit: 'ms', limit: null },
      { name: `${question}: cold ÷ DuckDB`, value: times.patched / times.duck, unit: '×', limit: 1 },
      { name: `${question}: every rebuild read anew ÷ DuckDB`, value: times.anew / times.duck, unit: '×', limit: null },
    );
  }
  duck.close();
  return measures;
}

/** Two writes that make answers stale: one touches a single rebuild, the other every category's name. */
export async function changes(client: Client) {
  const { categories } = await client.call<{ categories: { id: string; version: number }[] }>('GET', '/api/shop/lists');
  const { rows } = await client.call<{ rows: { id: string }[] }>('GET', '/api/rebuilds');
  let category = categories[0] ?? { id: '', version: 0 };
  let round = 0;
  return {
    async rename(): Promise<void> {
      round += 1;
      const path = `/api/shop/lists/categories/${category.id}`;
      category = await client.call('PATCH', path, { name: `fees ${round}` }, category.version);
    },
    async add(): Promise<void> {
      const place = { rebuildId: rows[0]?.id ?? null, categoryId: category.id, datedOn: '2026-05-01' };
      await client.call('POST', '/api/entries', { ...place, cents: 100, foreseen: 'foreseen' });
    },
  };
}

/** Cold times of one shop, every question together: everything read anew each time. */
export async function coldTotal(client: Client): Promise<() => Promise<number>> {
  const change = await changes(client);
  return async () => {
    let total = 0;
    for (const question of QUESTIONS) {
      await change.rename();
      total += await timed(() => client.call('GET', `/api/answers/${question}`));
    }
    return total;
  };
}
