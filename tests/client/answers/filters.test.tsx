import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { answersApi } from '#shared/contracts/answers.ts';
import { filterOf, levelOf } from '../../../src/features/answers/address.ts';
import { filterWords } from '../../../src/features/answers/filter-words.ts';
import { OverrunsPage } from '../../../src/pages/overruns.tsx';
import { openPage, serve } from './open-page.tsx';
import { category, head, idOf, overrunsReply } from './replies.ts';

afterEach(() => vi.unstubAllGlobals());

const { filters } = head();

describe('an address', () => {
  test('gives the filters that it can and leaves out what it cannot read', () => {
    const search = new URLSearchParams({ from: '2024', to: 'later', class: idOf('suv'), damage: 'x', seen: 'no' });
    expect(filterOf(search)).toEqual({ from: 2024, class: idOf('suv'), seen: 'no' });
  });

  test('gives the level, or 4 in 5', () => {
    expect(levelOf(new URLSearchParams('level=9-10'))).toBe('9/10');
    expect(levelOf(new URLSearchParams('level=7'))).toBe('4/5');
  });
});

test('the button says in words what is shown', () => {
  expect(filterWords({}, filters)).toBe('All rebuilds');
  expect(filterWords({ from: 2024, to: 2026, class: idOf('suv'), seen: 'no' }, filters)).toBe(
    '2024 to 2026 · SUV · bought unseen',
  );
  expect(filterWords({ from: 2024, to: 2024 }, filters)).toBe('2024');
  expect(filterWords({ from: 2024, damage: 'unknown' }, filters)).toBe('since 2024 · damage not known');
});

test('a filter goes into the address and to the server; show all takes it out', async () => {
  const asked = serve([
    { contract: answersApi.overruns, reply: () => overrunsReply(9, 0.2, [category('parts', 9, 0.2)]) },
  ]);
  const { place } = openPage(<OverrunsPage />);
  await userEvent.click(await screen.findByRole('button', { name: /All rebuilds/ }));
  const choices = within(await screen.findByRole('dialog', { name: 'Which rebuilds' }));
  await userEvent.selectOptions(choices.getByLabelText('Damage'), 'Hail (12)');
  await userEvent.click(choices.getByLabelText('seen (12)'));
  expect(place()).toBe(`/s/one/page?damage=${idOf('hail')}&seen=yes`);
  expect(asked.at(-1)?.url.search).toBe(`?damage=${idOf('hail')}&seen=yes`);
  await userEvent.keyboard('{Escape}');
  await userEvent.click(screen.getByRole('button', { name: 'Show all' }));
  expect(place()).toBe('/s/one/page');
});
