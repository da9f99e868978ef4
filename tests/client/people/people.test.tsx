import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { type Invitation, type Member, peopleApi } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import { PeoplePage } from '../../../src/pages/people.tsx';
import { buildSession, fakeServer, idOf, on, Refusal, signedIn } from '../../support/fake-server.ts';
import { showPage } from '../../support/show-page.tsx';

afterEach(() => vi.unstubAllGlobals());

const member = (letter: string, name: string, role: Role): Member => ({
  userId: idOf(letter),
  name,
  email: `${name.split(' ')[0]?.toLowerCase()}@shop.example`,
  role,
  joinedAt: '2026-06-01T02:00:00.000Z',
  version: 3,
});

/** A shop of Dana (owner, looking) and Mo. `meanwhile` is what another owner makes of Mo before the first change lands. */
function serve({ mo = 'bookkeeper' as Role, meanwhile = null as Role | null } = {}) {
  let members = [member('d', 'Dana Whitlock', 'owner'), member('m', 'Mo Reyes', mo)];
  let invitations: Invitation[] = [];
  const stale = new Refusal({ status: 412, detail: 'Someone changed this meanwhile.' });
  const find = (userId: string) => members.find((one) => one.userId === userId) ?? member('x', 'Nobody', 'partner');
  const put = (after: Member) => {
    members = members.map((one) => (one.userId === after.userId ? after : one));
    return after;
  };
  return fakeServer([
    signedIn(buildSession()),
    on(peopleApi.list, () => ({ members, invitations })),
    on(peopleApi.changeRole, ({ params, body, version }) => {
      if (meanwhile) put({ ...find(params.userId), role: meanwhile, version: 4 });
      meanwhile = null;
      const before = find(params.userId);
      if (before.version !== version) throw stale;
      return put({ ...before, role: body.role, version: before.version + 1 });
    }),
    on(peopleApi.remove, ({ params }) => {
      members = members.filter((one) => one.userId !== params.userId);
      return params;
    }),
    on(peopleApi.invite, ({ body }) => {
      const taken = 'This person belongs to the shop already.';
      if (members.some(({ email }) => email === body.email)) {
        throw new Refusal({ status: 409, detail: taken, errors: [{ pointer: '/email', detail: taken }] });
      }
      const times = { createdAt: '2026-06-15T12:00:00Z', expiresAt: '2026-06-22T12:00:00Z' };
      const invitation = { id: idOf('i'), ...body, ...times };
      invitations = [invitation];
      return { ...invitation, token: 't'.repeat(43) };
    }),
    on(peopleApi.withdraw, () => {
      invitations = [];
      return { id: idOf('i') };
    }),
  ]);
}

const roleOfMo = () => screen.findByLabelText('Role of Mo Reyes');

test('shows members with their role in words; the day of joining is the shop’s own', async () => {
  serve();
  showPage(<PeoplePage />);
  expect(await roleOfMo()).toHaveValue('bookkeeper');
  expect(await roleOfMo()).toHaveAccessibleDescription(/sees and keeps all books/i);
  expect(screen.getByText('Owner, that is you')).toBeInTheDocument();
  expect(screen.getAllByText('Joined 31 May 2026')).toHaveLength(2);
});

test('asks before a change takes something away, and can be let be', async () => {
  const { asked } = serve();
  showPage(<PeoplePage />);
  await userEvent.selectOptions(await roleOfMo(), 'mechanic');
  const dialog = await screen.findByRole('dialog', { name: 'Make Mo Reyes mechanic?' });
  expect(within(dialog).getByText('write in the books, import, adopt a rule')).toBeInTheDocument();
  expect(asked).toEqual([]);
  await userEvent.click(within(dialog).getByRole('button', { name: 'Leave Mo Reyes bookkeeper' }));
  expect(asked).toEqual([]);
  await userEvent.selectOptions(await roleOfMo(), 'mechanic');
  await userEvent.click(await screen.findByRole('button', { name: 'Make Mo Reyes mechanic' }));
  expect(await screen.findByText('Mo Reyes is now mechanic')).toBeInTheDocument();
  await waitFor(async () => expect(await roleOfMo()).toHaveValue('mechanic'));
});

test('a change that only adds is made at once and can be undone', async () => {
  serve({ mo: 'accountant' });
  showPage(<PeoplePage />);
  await userEvent.selectOptions(await roleOfMo(), 'owner');
  await userEvent.click(await screen.findByRole('button', { name: 'Undo' }));
  await waitFor(async () => expect(await roleOfMo()).toHaveValue('accountant'));
});

test('when another owner was quicker, both roles stand side by side and mine can be saved over', async () => {
  const { asked } = serve({ mo: 'accountant', meanwhile: 'partner' });
  showPage(<PeoplePage />);
  await userEvent.selectOptions(await roleOfMo(), 'bookkeeper');
  const dialog = await screen.findByRole('dialog', { name: /Someone changed the role of Mo Reyes/ });
  expect(within(dialog).getByRole('row', { name: 'Role Partner Bookkeeper' })).toBeInTheDocument();
  await userEvent.click(within(dialog).getByRole('button', { name: 'Save mine over it' }));
  await waitFor(async () => expect(await roleOfMo()).toHaveValue('bookkeeper'));
  expect(asked).toHaveLength(2);
});

test('takes a member out only after asking', async () => {
  serve();
  showPage(<PeoplePage />);
  await userEvent.click(await screen.findByRole('button', { name: 'Take out Mo Reyes' }));
  const dialog = await screen.findByRole('dialog', { name: 'Take Mo Reyes out of the shop?' });
  await userEvent.click(within(dialog).getByRole('button', { name: 'Take Mo Reyes out' }));
  await waitFor(() => expect(screen.queryByLabelText('Role of Mo Reyes')).not.toBeInTheDocument());
});

test('invites: the link stands there once, is copied, and the open invitation can be withdrawn', async () => {
  serve();
  showPage(<PeoplePage />);
  const user = userEvent.setup();
  expect(await screen.findByText(/None. Who is invited/)).toBeInTheDocument();
  await user.click(screen.getByRole('button', { name: 'Invite someone' }));
  await user.type(await screen.findByLabelText('Their email'), 'mo@shop.example');
  await user.click(screen.getByRole('button', { name: 'Make the link' }));
  await waitFor(() =>
    expect(screen.getByLabelText('Their email')).toHaveAccessibleDescription(/belongs to the shop already/),
  );
  await user.clear(screen.getByLabelText('Their email'));
  await user.type(screen.getByLabelText('Their email'), 'bea@shop.example');
  await user.selectOptions(screen.getByLabelText('Role'), 'accountant');
  await user.click(screen.getByRole('button', { name: 'Make the link' }));
  const link = `${window.location.origin}/join/${'t'.repeat(43)}`;
  expect(await screen.findByLabelText('Link')).toHaveValue(link);
  await user.click(screen.getByRole('button', { name: 'Copy the link' }));
  expect(await screen.findByText('Copied.')).toBeInTheDocument();
  expect(await navigator.clipboard.readText()).toBe(link);
  await user.click(screen.getByRole('button', { name: 'Done' }));
  expect(await screen.findByText(/As accountant; the link works until 22 Jun 2026/)).toBeInTheDocument();
  await user.click(screen.getByRole('button', { name: 'Withdraw the invitation of bea@shop.example' }));
  expect(await screen.findByText(/None. Who is invited/)).toBeInTheDocument();
});

test('says plainly to others that people are the owner’s matter', async () => {
  fakeServer([signedIn(buildSession('bookkeeper'))]);
  showPage(<PeoplePage />);
  expect(await screen.findByText(/Your role here is bookkeeper/)).toBeInTheDocument();
  expect(screen.queryByRole('button', { name: 'Invite someone' })).not.toBeInTheDocument();
});

test('a list that does not load says so and can be tried again', async () => {
  let fails = true;
  fakeServer([
    signedIn(buildSession()),
    on(peopleApi.list, () => {
      if (fails) throw new Refusal({ status: 500, detail: 'Something broke.' });
      return { members: [member('m', 'Mo Reyes', 'mechanic')], invitations: [] };
    }),
  ]);
  showPage(<PeoplePage />);
  const again = await screen.findByRole('button', { name: 'Try again' });
  fails = false;
  await userEvent.click(again);
  expect(await roleOfMo()).toHaveValue('mechanic');
});
