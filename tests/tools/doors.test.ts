import { describe, expect, it } from 'vitest';
import { breach, roomOf } from './doors.ts';
import { importsOf } from './imports.ts';

describe('the doors', () => {
  it.each([
    ['shared/money.ts', './day.ts'],
    ['shared/contracts/rebuilds.ts', '../vocabulary.ts'],
    ['shared/problem.ts', 'zod'],
    ['server/domain/overrun.ts', '#shared/money.ts'],
    ['server/domain/overrun.ts', 'simple-statistics'],
    ['server/books/entries.ts', '../platform/database.ts'],
    ['server/features/ledger/routes.ts', '../../books/entries.ts'],
    ['server/features/ledger/routes.ts', './store.ts'],
    ['server/app.ts', './features/ledger/routes.ts'],
    ['server/main.ts', '../migrations/001-warehouse.ts'],
    ['server/platform/session.ts', 'lucia'],
    ['server/run/start.mjs', 'node:fs'],
    ['src/features/ledger/queries.ts', '../../lib/api.ts'],
    ['src/pages/year.tsx', '../features/answers/year-chart.tsx'],
    ['src/main.tsx', './app/router.tsx'],
    ['seeds/demo.ts', '../server/books/entries.ts'],
    ['tests/http/ledger.test.ts', '../../server/app.ts'],
  ])('open from %s to %s', (path, name) => {
    expect(breach(path, name)).toBeNull();
  });

  it.each([
    ['shared/money.ts', 'papaparse'],
    ['shared/money.ts', 'node:fs'],
    ['shared/money.ts', '../server/app.ts'],
    ['shared/money.ts', '#shared/day.ts'],
    ['server/domain/overrun.ts', 'knex'],
    ['server/domain/overrun.ts', '../books/entries.ts'],
    ['server/platform/config.ts', '../books/entries.ts'],
    ['server/books/entries.ts', '../features/ledger/store.ts'],
    ['server/features/ledger/routes.ts', '../rebuilds/store.ts'],
    ['server/features/ledger/routes.ts', '../../../src/lib/api.ts'],
    ['server/features/ledger/routes.ts', '../../app.ts'],
    ['server/features/ledger/routes.ts', '../../../shared/money.ts'],
    ['server/features/ledger/routes.ts', 'react'],
    ['server/features/ledger/routes.ts', 'lucia'],
    ['server/run/start.mjs', '../main.ts'],
    ['server/run/start.mjs', 'tsx'],
    ['src/lib/api.ts', '../ui/button.tsx'],
    ['src/charts/gap.tsx', '../features/answers/queries.ts'],
    ['src/features/ledger/queries.ts', '../rebuilds/queries.ts'],
    ['src/features/ledger/queries.ts', '../../pages/year.tsx'],
    ['src/pages/year.tsx', '../../server/domain/overrun.ts'],
    ['src/pages/year.tsx', 'node:path'],
    ['src/pages/year.tsx', '../lib/api'],
    ['src/utils/text.ts', '../lib/api.ts'],
    ['docs/notes.ts', 'zod'],
  ])('closed from %s to %s', (path, name) => {
    expect(breach(path, name)).toContain(path);
  });

  it('keep two features apart by name', () => {
    expect(roomOf('server/features/ledger/routes.ts')).toBe('server/features/ledger');
    expect(roomOf('src/features/ledger/parts/row.tsx')).toBe('src/features/ledger');
  });
});

it('every way of naming a module is seen, and text that only looks like one is not', () => {
  const source = `
    import type { A } from './a.ts';
    import './b.css';
    export * from './c.ts';
    export { d } from './d.ts';
    const late = () => import('./e.tsx');
    type F = import('./f.ts').F;
    // import { no } from './comment.ts'
    const text = "import { no } from './text.ts'";
    const element = <a href="x">{late}</a>;
  `;
  const names = ['./a.ts', './b.css', './c.ts', './d.ts', './e.tsx', './f.ts'];
  expect(importsOf(source, 'x.tsx').toSorted()).toEqual(names);
});
