import { configure, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Reading } from '#shared/contracts/import-reading.ts';
import { type Import, importsApi } from '#shared/contracts/imports.ts';
import { shopApi } from '#shared/contracts/shop.ts';
import { DEFAULT_CATEGORIES, type Role } from '#shared/vocabulary.ts';
import { ImportPage } from '../../../src/pages/import.tsx';
import { ImportsPage } from '../../../src/pages/imports.tsx';
import { read, sampleBytes } from '../../imports/support.ts';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

const ID = idOf('i');
// A reading of a whole file is much to draw, and the machine may be busy.
configure({ asyncUtilTimeout: 8000 });

function buildImport(reading: Reading | null, change: Partial<Import> = {}): Import {
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

/** A server that holds one import; writes change it. */
function serve(start: Import, role: Role = 'owner') {
  const kept = { file: start };
  const become = (change: Partial<Import>) => {
    kept.file = { ...kept.file, ...change };
    return kept.file;
  };
  const server = fakeServer([
    signedIn(buildSession(role)),
    lists,
    on(importsApi.show, () => kept.file),
    on(importsApi.rows, () => ({ rows: [], next: null })),
    on(importsApi.change, () => become({ version: 2 })),
    on(importsApi.commit, () => become({ state: 'committed' })),
    on(importsApi.undo, () => become({ state: 'undone' })),
  ]);
  return { ...server, become };
}

const open = () => showPage(<ImportPage />, { path: '/s/:shopId/import/:importId', address: `/s/s/import/${ID}` });

afterEach(() => vi.unstubAllGlobals());

describe('one import', () => {
  it('says what comes in, whether it agrees, and what is put aside with its reason', async () => {
    serve(buildImport(read(sampleBytes('p02_expense_ledger_us.csv'))));
    open();
    expect(await screen.findByText('80 of 83 rows')).toBeInTheDocument();
    const aside = screen.getByRole('region', { name: 'Rows and cells put aside' });
    expect(within(aside).getByRole('row', { name: /^25 Names no vehicle Car nothing \$23\.18/ })).toBeInTheDocument();
    const costs = screen.getByRole('region', { name: 'Costs' });
    expect(within(costs).getByRole('row', { name: /Costs together \$22,000\.46/ })).toBeInTheDocument();
  });

  it('holds the file’s own totals against what comes in', async () => {
    const text =
      'Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00\n2020-01-03,13 F-150,Towing,20.00\n,,total,31.00';
    serve(buildImport(read(text)));
    open();
    const totals = await screen.findByRole('region', { name: 'The file’s own totals' });
    expect(within(totals).getByRole('row', { name: /^Paid .*\$31\.00 \$30\.00 \$1\.00/ })).toBeInTheDocument();
    expect(screen.getByText(/the one total that the file states differs/)).toBeInTheDocument();
  });

  it('books by one press, and takes out after asking', async () => {
    const { asked } = serve(buildImport(read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00')));
    open();
    await userEvent.click(await screen.findByRole('button', { name: 'Book 1 row' }));
    await userEvent.click(await screen.findByRole('button', { name: 'Take it out again' }));
    await userEvent.click(screen.getByRole('button', { name: 'Take it out' }));
    expect(await screen.findByText(/the books are as they were before it/)).toBeInTheDocument();
    expect(asked).toEqual([`POST /api/imports/${ID}/commit`, `POST /api/imports/${ID}/undo`]);
  });

  it('lets nothing be booked before a question that must be asked is answered', async () => {
    const { asked } = serve(buildImport(read(sampleBytes('p05_hours_log.tsv'))));
    open();
    expect(await screen.findByRole('button', { name: 'Answer the questions first' })).toBeDisabled();
    await userEvent.selectOptions(screen.getByLabelText(/does the month or the day stand first/), 'The month');
    await userEvent.click(screen.getByRole('button', { name: 'Read again with 1 change' }));
    await waitFor(() => expect(asked).toEqual([`PATCH /api/imports/${ID} {"answers":{"date-order:1":"MDY"}}`]));
  });

  it('takes another meaning for a column', async () => {
    const { asked } = serve(buildImport(read('Date,Car,What for,Paid\n2020-01-02,13 F-150,Parts,10.00')));
    open();
    await userEvent.selectOptions(await screen.findByLabelText('What What for holds'), 'Vendor');
    await userEvent.click(screen.getByRole('button', { name: 'Read again with 1 change' }));
    await waitFor(() => expect(asked[0]).toContain('{"sheet":1,"col":3,"meaning":"vendor","category":null}'));
  });

  it('says why a file cannot come in', async () => {
    const reading = read('Date,What for,Paid\n2020-01-02,Parts,10.00');
    serve(buildImport(reading, { state: 'refused', refusal: reading.refusal?.message ?? null }));
    open();
    expect(await screen.findByText(/No column names the vehicle/)).toBeInTheDocument();
    expect(screen.queryByRole('button', { name: /^Book/ })).not.toBeInTheDocument();
  });

  it('shows how far it is while the file is read, then what was understood', async () => {
    const { become } = serve(buildImport(null, { state: 'reading', progress: 0.4 }));
    open();
    expect(await screen.findByRole('progressbar')).toHaveAttribute('aria-valuenow', '40');
    become({ state: 'ready', reading: read(sampleBytes('p01_rebuild_summary_us.csv')), progress: null });
    expect(await screen.findByText('10 of 10 rows')).toBeInTheDocument();
  });

  it('an accountant looks and changes nothing', async () => {
    serve(buildImport(read(sampleBytes('p01_rebuild_summary_us.csv'))), 'accountant');
    open();
    await screen.findByText('10 of 10 rows');
    expect(screen.queryByRole('button', { name: /Book|Drop/ })).not.toBeInTheDocument();
    expect(screen.queryByLabelText('What Stock holds')).not.toBeInTheDocument();
  });
});

describe('the list of imports', () => {
  const show = () => showPage(<ImportsPage />, { path: '/s/:shopId/import', address: '/s/s/import' });
  const file = new File(['Date,Car'], 'old.csv', { type: 'text/csv' });

  it('teaches when empty, and leads to a file once it is uploaded', async () => {
    fakeServer([
      signedIn(buildSession()),
      on(importsApi.list, () => ({ rows: [], next: null })),
      on(importsApi.upload, () => buildImport(null, { state: 'reading' })),
    ]);
    show();
    expect(await screen.findByText('Every file that was brought in will stand here')).toBeInTheDocument();
    await userEvent.upload(screen.getByLabelText('File to bring in'), file);
    expect(await screen.findByText(`at /s/${idOf('s')}/import/${ID}`)).toBeInTheDocument();
  });

  it('says when a file is in already, and brings it in again only when told', async () => {
    let times = 0;
    fakeServer([
      signedIn(buildSession()),
      on(importsApi.list, () => ({ rows: [], next: null })),
      on(importsApi.upload, () => {
        times += 1;
        if (times === 1)
          throw new Refusal({
            status: 409,
            detail: 'This very file came in before.',
            type: '/problems/already-in',
          } as Refusal['problem']);
        return buildImport(null, { state: 'reading' });
      }),
    ]);
    show();
    await userEvent.upload(await screen.findByLabelText('File to bring in'), file);
    expect(await screen.findByText('old.csv is in already')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Bring it in once more all the same' }));
    expect(await screen.findByText(`at /s/${idOf('s')}/import/${ID}`)).toBeInTheDocument();
  });

  it('tells at the place why a file is refused', async () => {
    fakeServer([
      signedIn(buildSession()),
      on(importsApi.list, () => ({ rows: [], next: null })),
      on(importsApi.upload, () => {
        throw new Refusal({ status: 422, detail: 'This is a picture, whatever its name says.' });
      }),
    ]);
    show();
    await userEvent.upload(await screen.findByLabelText('File to bring in'), file);
    expect(await screen.findByRole('alert')).toHaveTextContent('This is a picture');
  });
});
