import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { type Lists, type Shop, shopApi } from '#shared/contracts/shop.ts';
import type { Role } from '#shared/vocabulary.ts';
import { ShopPage } from '../../../src/pages/shop.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

const word = (letter: string, name: string, position: number) => ({
  id: idOf(letter),
  name,
  position,
  isRetired: false,
  version: 1,
});

let shop: Shop;
let lists: Lists;
beforeEach(() => {
  shop = {
    id: idOf('s'),
    name: 'Whitlock Rebuilds',
    currency: 'USD',
    locale: 'en-US',
    timeZone: 'America/Chicago',
    yearStartMonth: 1,
    wantedCentsPerHour: null,
    isDemo: false,
    fixedToday: null,
    version: 1,
  };
  lists = {
    classes: [word('a', 'small car', 0), word('b', 'SUV', 1), word('c', 'pickup', 2)],
    damages: [word('e', 'hail', 0)],
    categories: [
      { ...word('f', 'parts', 0), isPaidLabor: false },
      { ...word('g', 'wages', 1), isPaidLabor: true },
    ],
    workers: [{ id: idOf('w'), name: 'Tess Moran', isPaid: false, userId: null, isRetired: false, version: 1 }],
  };
});

const stale = () => new Refusal({ status: 412, detail: 'Someone changed this meanwhile.' });

/** `meanwhile` is what someone else makes of the shop just before the first change lands. */
function serve(role: Role = 'owner', meanwhile: Partial<Shop> | null = null) {
  return fakeServer([
    signedIn(buildSession(role)),
    on(shopApi.get, () => shop),
    on(shopApi.lists, () => lists),
    on(shopApi.update, ({ body, version }) => {
      if (meanwhile) shop = { ...shop, ...meanwhile, version: shop.version + 1 };
      meanwhile = null;
      if (version !== shop.version) throw stale();
      const change = Object.fromEntries(Object.entries(body).filter(([, value]) => value !== undefined));
      shop = { ...shop, ...change, version: shop.version + 1 };
      return shop;
    }),
    on(shopApi.addItem, ({ params, body }) => {
      const detail = 'This name is taken.';
      if (lists[params.kind].some(({ name }) => name === body.name))
        throw new Refusal({ status: 409, detail, errors: [{ pointer: '/name', detail }] });
      const item = { ...word('n', body.name, 9), isPaidLabor: false };
      lists = { ...lists, [params.kind]: [...lists[params.kind], item] };
      return item;
    }),
    on(shopApi.changeItem, ({ params: { kind, itemId }, body, version }) => {
      const before = lists[kind].find(({ id }) => id === itemId);
      if (!before || before.version !== version) throw stale();
      const { position, ...rest } = body;
      const after = { ...before, ...(rest as object), version: before.version + 1 };
      const others = lists[kind].filter(({ id }) => id !== itemId);
      const order = others.toSpliced(position ?? before.position, 0, after);
      lists = { ...lists, [kind]: order.map((item, at) => ({ ...item, position: at })) };
      return after;
    }),
    on(shopApi.addWorker, ({ body }) => {
      const worker = { id: idOf('v'), ...body, userId: null, isRetired: false, version: 1 };
      lists = { ...lists, workers: [...lists.workers, worker] };
      return worker;
    }),
    on(shopApi.changeWorker, ({ params, body }) => {
      const before = lists.workers.find(({ id }) => id === params.workerId);
      if (!before) throw new Refusal({ status: 404, detail: 'There is no such thing in this shop.' });
      const after = { ...before, ...(body as object), version: before.version + 1 };
      lists = { ...lists, workers: lists.workers.map((one) => (one.id === after.id ? after : one)) };
      return after;
    }),
  ]);
}

const classes = async () => {
  const list = await screen.findByRole('list', { name: 'Vehicle classes in use' });
  return within(list)
    .getAllByRole('listitem')
    .map((item) => item.firstChild?.textContent);
};

test('sends only what was changed, says so, and takes it back on Undo', async () => {
  const { asked } = serve();
  showPage(<ShopPage />);
  const pay = await screen.findByLabelText('Wanted pay per hour');
  expect(screen.getByText(/Per hour is counted on unpaid hours/)).toBeInTheDocument();
  await userEvent.type(pay, '32.5');
  await userEvent.selectOptions(screen.getByLabelText('The year starts in'), 'July');
  await userEvent.click(screen.getByRole('button', { name: 'Save the shop' }));
  expect(await screen.findByText('Shop saved')).toBeInTheDocument();
  expect(asked).toEqual([`PATCH /api/shop ${JSON.stringify({ yearStartMonth: 7, wantedCentsPerHour: 3250 })}`]);
  await userEvent.click(screen.getByRole('button', { name: 'Undo' }));
  await waitFor(() => expect(screen.getByLabelText('The year starts in')).toHaveValue('1'));
  expect(shop).toMatchObject({ yearStartMonth: 1, wantedCentsPerHour: null, version: 3 });
});

test('a new way of writing numbers shows in the amounts of the form', async () => {
  shop = { ...shop, wantedCentsPerHour: 3250 };
  serve();
  showPage(<ShopPage />);
  const pay = await screen.findByLabelText('Wanted pay per hour');
  expect(pay).toHaveValue('32.50');
  await userEvent.selectOptions(screen.getByLabelText('How numbers are written'), 'de-DE');
  await userEvent.click(screen.getByRole('button', { name: 'Save the shop' }));
  await waitFor(() => expect(pay).toHaveValue('32,50'));
  expect(shop).toMatchObject({ locale: 'de-DE', wantedCentsPerHour: 3250 });
});

test('an amount that cannot be read is said at its field and stays there', async () => {
  const { asked } = serve();
  showPage(<ShopPage />);
  const pay = await screen.findByLabelText('Wanted pay per hour');
  await userEvent.type(pay, 'plenty');
  await userEvent.click(screen.getByRole('button', { name: 'Save the shop' }));
  await waitFor(() => expect(pay).toHaveAccessibleDescription(/“plenty” cannot be read as an amount/));
  expect(pay).toHaveValue('plenty');
  expect(asked).toEqual([]);
});

test('when someone saved first, both versions stand side by side; theirs can be kept', async () => {
  serve('owner', { name: 'Whitlock & Sons' });
  showPage(<ShopPage />);
  const name = await screen.findByLabelText('Name');
  await userEvent.clear(name);
  await userEvent.type(name, 'Whitlock & Daughters');
  await userEvent.click(screen.getByRole('button', { name: 'Save the shop' }));
  const dialog = await screen.findByRole('dialog', { name: /Someone changed the shop/ });
  expect(within(dialog).getByRole('row', { name: 'Name Whitlock & Sons Whitlock & Daughters' })).toBeInTheDocument();
  await userEvent.click(within(dialog).getByRole('button', { name: 'Keep what is there' }));
  await waitFor(() => expect(name).toHaveValue('Whitlock & Sons'));
  expect(shop.name).toBe('Whitlock & Sons');
});

test('when someone saved first, mine can be saved over it', async () => {
  serve('owner', { yearStartMonth: 4 });
  showPage(<ShopPage />);
  await userEvent.selectOptions(await screen.findByLabelText('The year starts in'), 'July');
  await userEvent.click(screen.getByRole('button', { name: 'Save the shop' }));
  const dialog = await screen.findByRole('dialog');
  expect(within(dialog).getByRole('row', { name: 'The year starts in April July' })).toBeInTheDocument();
  await userEvent.click(within(dialog).getByRole('button', { name: 'Save mine over it' }));
  await waitFor(() => expect(shop.yearStartMonth).toBe(7));
});

test('a word is renamed in place; a name that is taken is said at the field', async () => {
  serve();
  showPage(<ShopPage />);
  await userEvent.click(await screen.findByRole('button', { name: 'Rename SUV' }));
  const field = screen.getByLabelText('New name of SUV');
  expect(field).toHaveFocus();
  await userEvent.keyboard('crossover{Enter}');
  await waitFor(async () => expect(await classes()).toEqual(['small car', 'crossover', 'pickup']));
  await userEvent.type(screen.getByLabelText('New class'), 'pickup{Enter}');
  await waitFor(() => expect(screen.getByLabelText('New class')).toHaveAccessibleDescription('This name is taken.'));
  expect(screen.getByLabelText('New class')).toHaveValue('pickup');
});

test('Escape leaves a name as it was and goes back to its button', async () => {
  const { asked } = serve();
  showPage(<ShopPage />);
  await userEvent.click(await screen.findByRole('button', { name: 'Rename SUV' }));
  await userEvent.keyboard('crossover{Escape}');
  await waitFor(() => expect(screen.getByRole('button', { name: 'Rename SUV' })).toHaveFocus());
  expect(asked).toEqual([]);
});

test('a word moves by its buttons, which keep the focus; at the end they do nothing', async () => {
  const { asked } = serve();
  showPage(<ShopPage />);
  const down = await screen.findByRole('button', { name: 'Move small car down' });
  await userEvent.click(down);
  await waitFor(async () => expect(await classes()).toEqual(['SUV', 'small car', 'pickup']));
  await waitFor(() => expect(screen.getByRole('button', { name: 'Move small car down' })).toHaveFocus());
  await userEvent.keyboard('{Enter}');
  await waitFor(async () => expect(await classes()).toEqual(['SUV', 'pickup', 'small car']));
  const before = asked.length;
  await userEvent.keyboard('{Enter}');
  expect(asked).toHaveLength(before);
});

test('a retired word leaves the list, comes back on Undo, or later from among the retired', async () => {
  serve();
  showPage(<ShopPage />);
  await userEvent.click(await screen.findByRole('button', { name: 'Retire SUV' }));
  await waitFor(async () => expect(await classes()).toEqual(['small car', 'pickup']));
  await userEvent.click(
    within((await screen.findByText('SUV retired')).closest('[role=dialog]') as HTMLElement).getByText('Undo'),
  );
  await waitFor(async () => expect(await classes()).toEqual(['small car', 'SUV', 'pickup']));
  await userEvent.click(screen.getByRole('button', { name: 'Retire pickup' }));
  await userEvent.click(await screen.findByText('Retired (1)'));
  await userEvent.click(screen.getByRole('button', { name: 'Bring pickup back' }));
  await waitFor(async () => expect(await classes()).toEqual(['small car', 'SUV', 'pickup']));
});

test('shows which category is paid labor', async () => {
  serve();
  showPage(<ShopPage />);
  const list = await screen.findByRole('list', { name: 'Categories in use' });
  const [parts, wages] = within(list).getAllByRole('listitem');
  expect(parts).not.toHaveTextContent('Wages for hours');
  expect(wages).toHaveTextContent('Wages for hours on a rebuild');
});

test('a bookkeeper adds workers and says who is paid, and only reads the rest', async () => {
  serve('bookkeeper');
  showPage(<ShopPage />);
  expect(await screen.findByText('Only an owner changes this.')).toBeInTheDocument();
  expect(screen.queryByRole('button', { name: 'Save the shop' })).not.toBeInTheDocument();
  const list = await screen.findByRole('list', { name: 'Workers in use' });
  expect(screen.queryByRole('button', { name: 'Rename SUV' })).not.toBeInTheDocument();
  await userEvent.type(screen.getByLabelText("New worker's name"), 'Ike Boone');
  await userEvent.click(screen.getByRole('checkbox', { name: 'Paid' }));
  await userEvent.click(screen.getByRole('button', { name: 'Add' }));
  expect(await within(list).findByText('Ike Boone')).toBeInTheDocument();
  await userEvent.click(screen.getByRole('button', { name: 'Make unpaid: Ike Boone' }));
  expect(await screen.findByRole('button', { name: 'Make paid: Ike Boone' })).toBeInTheDocument();
});

test('an accountant reads; a mechanic is told whom to ask', async () => {
  serve('accountant');
  const page = showPage(<ShopPage />);
  expect(await screen.findByText('not said')).toBeInTheDocument();
  expect(await screen.findByText('Tess Moran')).toBeInTheDocument();
  expect(screen.queryByRole('button')).not.toBeInTheDocument();
  page.unmount();
  serve('mechanic');
  showPage(<ShopPage />);
  expect(await screen.findByText(/Your role here is mechanic/)).toBeInTheDocument();
});
