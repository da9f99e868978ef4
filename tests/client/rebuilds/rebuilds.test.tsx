import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { hoursApi } from '#shared/contracts/hours.ts';
import { ledgerApi } from '#shared/contracts/ledger.ts';
import { type RebuildDetail, type RebuildRow, rebuildsApi } from '#shared/contracts/rebuilds.ts';
import { shopApi } from '#shared/contracts/shop.ts';
import type { Role } from '#shared/vocabulary.ts';
import { RebuildPage } from '../../../src/pages/rebuild.tsx';
import { RebuildsPage } from '../../../src/pages/rebuilds.tsx';
import { buildBoardRow, buildDetail, buildRow, LISTS, NAMES } from '../../support/books-replies.ts';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

const NOTHING = {
  total: 0,
  leftCount: 0,
  lossCount: 0,
  noPurchaseCount: 0,
  keptCents: 0,
  openCount: 0,
  openCostCents: 0,
};

function openList(rows: RebuildRow[], summary: object, role: Role = 'owner', search = '') {
  const user = userEvent.setup({ delay: null });
  const server = fakeServer([
    signedIn(buildSession(role)),
    on(shopApi.lists, () => LISTS),
    on(rebuildsApi.list, () => ({ rows, summary: { ...NOTHING, ...summary }, next: null })),
    on(rebuildsApi.create, ({ body }) => {
      if (body.tag === 'B-062') {
        const detail = 'Another rebuild has this tag.';
        throw new Refusal({ status: 409, detail, errors: [{ pointer: '/tag', detail }] });
      }
      return buildDetail({ tag: body.tag }).rebuild;
    }),
    on(hoursApi.board, () => [buildBoardRow()]),
  ]);
  showPage(<RebuildsPage />, { path: '/s/:shopId/rebuilds', address: `/s/${idOf('s')}/rebuilds${search}` });
  return { ...server, user };
}

describe('the list of rebuilds', () => {
  it('says how many lost nothing, what they kept and what is not counted, above its rows', async () => {
    const sold = buildRow({ stage: 'sold', leftOn: '2026-06-01', keptCents: 174_000, keptPerHourCents: 4519.5 });
    openList([sold], {
      total: 3,
      leftCount: 2,
      lossCount: 1,
      keptCents: 150_000,
      openCount: 1,
      openCostCents: 600_000,
    });
    expect(await screen.findByText('1 of 2')).toBeInTheDocument();
    expect(screen.getByText(/One is still in the shop with \$6,000 in them, not counted/)).toBeInTheDocument();
    const row = within(screen.getByRole('row', { name: /B-062/ }));
    expect(row.getByText('$1,740')).toBeInTheDocument();
    expect(row.getByText('$45.20/h')).toBeInTheDocument();
    expect(
      row.getByRole('img', { name: /Planned \$900, spent \$1,000: \$100 over; \$200 of it surprises/ }),
    ).toBeInTheDocument();
  });

  it('leads an empty shop to the import, and an empty filter back to everything', async () => {
    openList([], {});
    expect(await screen.findByRole('link', { name: 'Import a spreadsheet' })).toBeInTheDocument();
  });

  it('shows that nothing matches a filter of the address', async () => {
    openList([], {}, 'owner', '?stage=sold');
    expect(await screen.findByText('Nothing matches')).toBeInTheDocument();
    expect(screen.getByLabelText('Stage')).toHaveValue('sold');
  });

  it('adds one, and keeps what was typed when the tag is taken', async () => {
    const { user } = openList([buildRow()], { total: 1, openCount: 1 });
    await user.click(await screen.findByRole('button', { name: 'Add a rebuild' }));
    const dialog = within(await screen.findByRole('dialog'));
    await user.type(dialog.getByLabelText('Tag'), 'B-062');
    await user.type(dialog.getByLabelText('Purchase'), '4,200');
    await user.click(dialog.getByRole('button', { name: 'Add it' }));
    expect(await dialog.findByText('Another rebuild has this tag.')).toBeInTheDocument();
    expect(dialog.getByLabelText('Purchase')).toHaveValue('4,200');
    await user.type(dialog.getByLabelText('Tag'), 'b');
    await user.click(dialog.getByRole('button', { name: 'Add it' }));
    expect(await screen.findByText(`at /s/${idOf('s')}/rebuilds/${idOf('r')}`)).toBeInTheDocument();
  });

  it('is a board of hours without money for a mechanic', async () => {
    openList([], {}, 'mechanic');
    const row = await screen.findByRole('link', { name: /B-062/ });
    expect(row).toHaveAttribute('href', `/s/${idOf('s')}/hours?rebuild=${idOf('r')}`);
    expect(document.body).not.toHaveTextContent('$');
  });
});

function openOne(start: RebuildDetail, role: Role = 'owner') {
  const state = { detail: start };
  const user = userEvent.setup({ delay: null });
  const server = fakeServer([
    signedIn(buildSession(role)),
    on(shopApi.lists, () => LISTS),
    on(rebuildsApi.names, () => NAMES),
    on(rebuildsApi.get, () => state.detail),
    on(ledgerApi.list, () => ({ rows: [], totals: { count: 0, cents: 0, freeValueCents: 0 }, next: null })),
    on(hoursApi.list, () => ({ rows: [], totals: { count: 0, ownSeconds: 0, paidSeconds: 0 }, next: null })),
    on(rebuildsApi.update, ({ body, version }) => {
      const before = state.detail.rebuild;
      if (version !== before.version) throw new Refusal({ status: 412, detail: 'Someone changed this.' });
      if (body.soldOn && body.saleCents === undefined && before.saleCents === null) {
        const detail = 'A sale needs its price.';
        throw new Refusal({ status: 422, detail, errors: [{ pointer: '/saleCents', detail }] });
      }
      const change = Object.fromEntries(Object.entries(body).filter(([, value]) => value !== undefined));
      state.detail = { ...state.detail, rebuild: { ...before, ...change, version: before.version + 1 } };
      return state.detail.rebuild;
    }),
  ]);
  showPage(<RebuildPage />, {
    path: '/s/:shopId/rebuilds/:rebuildId',
    address: `/s/${idOf('s')}/rebuilds/${idOf('r')}`,
  });
  return { ...server, state, user };
}

const section = async (name: string) => {
  const heading = await screen.findByRole('heading', { name });
  return within(heading.closest('section') ?? document.body);
};

describe('one rebuild', () => {
  it('shows plan against actual, and what it holds', async () => {
    openOne(buildDetail());
    const plan = await section('Plan against actual');
    expect(plan.getByRole('row', { name: /^Parts \$900 \$1,000/ })).toBeInTheDocument();
    expect(screen.getByText('$6,000', { selector: 'mark' })).toBeInTheDocument();
  });

  it('saves only the part that was changed, with the version that was read, and takes it back by Undo', async () => {
    const { user, state, asked } = openOne(buildDetail());
    const words = await section('Notes and lessons');
    expect(words.queryByRole('button', { name: 'Save' })).not.toBeInTheDocument();
    await user.type(words.getByLabelText('Notes'), 'Frame pulled.');
    await user.click(words.getByRole('button', { name: 'Save' }));
    await waitFor(() => expect(state.detail.rebuild.notes).toBe('Frame pulled.'));
    expect(asked[0]).toBe(`PATCH /api/rebuilds/${idOf('r')} {"notes":"Frame pulled."}`);
    await user.click(await screen.findByRole('button', { name: 'Undo' }));
    await waitFor(() => expect(state.detail.rebuild.notes).toBeNull());
    await waitFor(async () => expect((await section('Notes and lessons')).getByLabelText('Notes')).toHaveValue(''));
  });

  it('marks the field that a refusal names and keeps the rest', async () => {
    const { user, state } = openOne(buildDetail());
    const sale = await section('Sale, or another way out');
    await user.type(sale.getByLabelText('Sold on'), '2026-06-10');
    await user.click(sale.getByRole('button', { name: 'Save' }));
    expect(await sale.findByText('A sale needs its price.')).toBeInTheDocument();
    expect(sale.getByLabelText('Sold on')).toHaveValue('2026-06-10');
    await user.type(sale.getByLabelText('Sale price'), '9,900');
    await user.click(sale.getByRole('button', { name: 'Save' }));
    await waitFor(() => expect(state.detail.rebuild).toMatchObject({ soldOn: '2026-06-10', saleCents: 990_000 }));
  });

  it('shows both versions when someone was quicker; keeping theirs shows theirs', async () => {
    const { user, state } = openOne(buildDetail());
    const words = await section('Notes and lessons');
    state.detail = { ...buildDetail({ notes: 'Theirs.', version: 2 }) };
    await user.type(words.getByLabelText('Notes'), 'Mine.');
    await user.click(words.getByRole('button', { name: 'Save' }));
    expect(await screen.findByRole('row', { name: 'Notes Theirs. Mine.' })).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Keep what is there' }));
    await waitFor(async () =>
      expect((await section('Notes and lessons')).getByLabelText('Notes')).toHaveValue('Theirs.'),
    );
    expect(state.detail.rebuild.version).toBe(2);
  });

  it('points out odd dates, a VIN that does not fit, and a plan that should be locked by now', async () => {
    const estimate = {
      id: idOf('z'),
      rebuildId: idOf('r'),
      revision: 0,
      isBaseline: false,
      madeOn: '2026-03-01',
      lockedAt: null,
      version: 1,
      lines: [{ categoryId: idOf('p'), cents: 90_000 }],
      plannedSeconds: null,
      expectedSaleCents: null,
      expectedDays: null,
      note: null,
    };
    const { user } = openOne(
      buildDetail(
        { startedOn: '2026-02-01', vin: '1HGCM82633AOO4352' },
        {
          estimates: [estimate],
          warnings: [{ pointer: '/startedOn', detail: 'Started before bought.' }],
          vinCheck: { isValid: false, problem: 'character', suggestions: ['1HGCM82633A004352'] },
        },
      ),
    );
    expect((await section('Its dates')).getByLabelText('Started')).toHaveAccessibleDescription(
      'Started before bought.',
    );
    expect(screen.getByText(/Work has started and the plan is not locked/)).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Take 1HGCM82633A004352' }));
    expect(screen.getByLabelText('VIN')).toHaveValue('1HGCM82633A004352');
  });

  it('shows cautions, which can be put away, and those of a date when it is marked', async () => {
    const { user } = openOne(
      buildDetail(
        {},
        {
          cautions: [
            { about: 'fire', text: 'Follow the maker’s procedure.', asked: null },
            { about: 'roadworthy', text: 'Restraints and brakes done?', asked: 'roadworthyOn' },
          ],
        },
      ),
    );
    expect(await screen.findByText('Follow the maker’s procedure.')).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: 'Put away the caution on fire' }));
    expect(screen.queryByText('Follow the maker’s procedure.')).not.toBeInTheDocument();
    expect(screen.queryByText('Restraints and brakes done?')).not.toBeInTheDocument();
    await user.type(screen.getByLabelText('Roadworthy'), '2026-06-01');
    expect(await screen.findByText('Restraints and brakes done?')).toBeInTheDocument();
  });

  it('is read only for an accountant', async () => {
    openOne(buildDetail(), 'accountant');
    expect((await section('What it is')).getByLabelText('Make')).toBeDisabled();
    expect(screen.queryByRole('button', { name: 'Make the plan' })).not.toBeInTheDocument();
  });
});
