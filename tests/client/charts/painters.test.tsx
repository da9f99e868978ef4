import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { ReactNode } from 'react';
import { MemoryRouter, Route, Routes } from 'react-router-dom';
import { expect, test } from 'vitest';
import { createFormatter } from '#shared/formatter.ts';
import { BackTestBars } from '../../../src/charts/back-test-bars.tsx';
import { GapBar } from '../../../src/charts/gap-bar.tsx';
import { type GridCell, GridCells } from '../../../src/charts/grid-cells.tsx';
import { YearBars } from '../../../src/charts/year-bars.tsx';

const format = createFormatter({ currency: 'USD', locale: 'en-US' });

const show = (picture: ReactNode) =>
  render(
    <MemoryRouter>
      <Routes>
        <Route path="/" element={picture} />
        <Route path="/rebuilds/:id" element={<p>one rebuild</p>} />
      </Routes>
    </MemoryRouter>,
  );

const bars = [
  { label: 'B-001', href: '/rebuilds/1', year: 2024, rate: 0.1, ruleRate: null, shortCents: null },
  { label: 'B-002', href: '/rebuilds/2', year: 2024, rate: 0.4, ruleRate: 0.2, shortCents: 64_000 },
  { label: 'B-003', href: '/rebuilds/3', year: 2025, rate: -0.05, ruleRate: 0.2, shortCents: 0 },
];

test('a chart says its finding and holds its figures as a table', async () => {
  show(<BackTestBars caption="One of two ran short." bars={bars} format={format} />);
  expect(screen.getByRole('figure')).toHaveTextContent('One of two ran short.');
  await userEvent.click(screen.getByText('As a table'));
  const rows = within(screen.getByRole('table', { name: 'One of two ran short.' })).getAllByRole('row');
  expect(rows.map((row) => row.textContent)).toEqual([
    'RebuildLeft inOver or underRule at the timeShort by',
    'B-0012024+10%too few yet–',
    'B-0022024+40%20.0%$640',
    'B-0032025−5%20.0%–',
  ]);
});

test('two charts with their tables open are told apart', async () => {
  show(
    <>
      <BackTestBars caption="One of two ran short." bars={bars} format={format} />
      <BackTestBars caption="None ran short." bars={bars.slice(2)} format={format} />
    </>,
  );
  for (const fold of screen.getAllByText('As a table')) await userEvent.click(fold);
  const names = screen.getAllByRole('region').map((region) => region.getAttribute('aria-label'));
  expect(names).toEqual(['As a table: One of two ran short.', 'As a table: None ran short.']);
});

test('its points are one stop for Tab; arrows move between them and each opens its rebuild', async () => {
  show(<BackTestBars caption="One of two ran short." bars={bars} format={format} />);
  await userEvent.tab();
  expect(screen.getByRole('link', { name: 'B-001: +10%, too few before it to set a rule' })).toHaveFocus();
  await userEvent.keyboard('{ArrowRight}');
  expect(screen.getByRole('link', { name: 'B-002: +40%, rule 20%, short by $640' })).toHaveFocus();
  await userEvent.keyboard('{End}');
  expect(screen.getByRole('link', { name: 'B-003: −5%, rule 20%, covered' })).toHaveFocus();
  await userEvent.click(screen.getByRole('link', { name: /^B-003/ }));
  expect(screen.getByText('one rebuild')).toBeInTheDocument();
});

test('the gap bar says in words what it draws', () => {
  const { rerender } = render(
    <GapBar lockedCents={100_000} foreseenCents={110_000} surpriseCents={12_000} overrunRate={0.22} format={format} />,
  );
  expect(
    screen.getByRole('img', { name: 'Planned $1,000, spent $1,220: $220 over; $120 of it surprises' }),
  ).toBeInTheDocument();
  expect(screen.getByText('+22%')).toBeInTheDocument();
  rerender(<GapBar lockedCents={null} foreseenCents={5_000} surpriseCents={0} overrunRate={null} format={format} />);
  expect(screen.getByRole('img', { name: 'No locked estimate; spent $50' })).toBeInTheDocument();
  expect(screen.getByText('no estimate')).toBeInTheDocument();
});

test('the grid says value, range and count, and too few where it cannot', () => {
  const cell = (value: number | null, n: number): GridCell => ({
    value,
    low: value === null ? null : value - 500,
    high: value === null ? null : value + 500,
    n,
  });
  show(
    <GridCells
      caption="Hail pays best."
      corner="Class by damage"
      columns={['front', 'hail', 'flood']}
      rows={[{ label: 'SUV', cells: [cell(2_500, 11), cell(null, 2), cell(null, 0)], all: cell(2_000, 13) }]}
      columnAll={[cell(2_500, 11), cell(null, 2), cell(null, 0)]}
      allColumnsLabel="All damage"
      allRowsLabel="All classes"
      format={format}
      unit="/h"
    />,
  );
  const [, suv] = screen.getAllByRole('row');
  const cells = within(suv ?? document.body).getAllByRole('cell');
  expect(cells.map((one) => one.textContent)).toEqual([
    '$25 /h$20 to $3011 rebuilds',
    '2 rebuildstoo few yet',
    'no rebuilds',
    '$20 /h$15 to $2513 rebuilds',
  ]);
});

test('every year has its bar, its figure and its name; where there is no room the latest are drawn', async () => {
  const years = Array.from({ length: 40 }, (_, at) => ({
    year: `${1987 + at}`,
    cents: at % 2 === 0 ? 90_000 : -4_000,
    note: '3 left',
    isShown: at === 39,
  }));
  const { container } = show(<YearBars caption="Half of the years kept money." bars={years} format={format} />);
  const names = [...container.querySelectorAll('svg text')].map((text) => text.textContent);
  expect(names).toContain('2026');
  expect(names).toContain('−$40');
  expect(names).not.toContain('1987');
  expect(container.querySelector('.chart')).toHaveAttribute('aria-hidden', 'true');
  await userEvent.click(screen.getByText('As a table'));
  expect(screen.getByRole('table', { name: 'Half of the years kept money.' })).toHaveTextContent('1987$9003 left');
});
