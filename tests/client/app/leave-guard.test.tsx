import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { BrowserRouter, Link, Route, Routes } from 'react-router-dom';
import { expect, test } from 'vitest';
import { lazyPage } from '../../../src/app/lazy-page.tsx';
import { LeaveGuard } from '../../../src/app/leave-guard.tsx';
import { useUnsaved } from '../../../src/lib/unsaved.ts';

function Typing() {
  const [text, setText] = useState('');
  useUnsaved(text !== '');
  return <input aria-label="Lessons" value={text} onChange={(event) => setText(event.target.value)} />;
}

function open() {
  history.replaceState({ idx: 0 }, '', '/');
  render(
    <BrowserRouter>
      <Link to="/other">Other page</Link>
      <Link to="/">Typing page</Link>
      <Link to="?year=2024">Another year</Link>
      <Routes>
        <Route path="/" element={<Typing />} />
        <Route path="/other" element={<p>the other page</p>} />
      </Routes>
      <LeaveGuard />
    </BrowserRouter>,
  );
}

const leaving = () => {
  const event = new Event('beforeunload', { cancelable: true });
  window.dispatchEvent(event);
  return event.defaultPrevented;
};

test('what is typed and not saved is asked about before the page is left, and stays when one stays', async () => {
  open();
  await userEvent.type(screen.getByLabelText('Lessons'), 'look twice');
  expect(leaving()).toBe(true);
  await userEvent.click(screen.getByRole('link', { name: 'Other page' }));
  await userEvent.click(await screen.findByRole('button', { name: 'Stay here' }));
  expect(screen.getByLabelText('Lessons')).toHaveValue('look twice');
  await userEvent.click(screen.getByRole('link', { name: 'Other page' }));
  await userEvent.click(await screen.findByRole('button', { name: 'Leave' }));
  expect(await screen.findByText('the other page')).toBeInTheDocument();
});

test('the way back asks too', async () => {
  open();
  await userEvent.click(screen.getByRole('link', { name: 'Other page' }));
  await userEvent.click(screen.getByRole('link', { name: 'Typing page' }));
  await userEvent.type(screen.getByLabelText('Lessons'), 'look twice');
  history.back();
  await userEvent.click(await screen.findByRole('button', { name: 'Stay here' }));
  expect(screen.getByLabelText('Lessons')).toHaveValue('look twice');
  history.back();
  await userEvent.click(await screen.findByRole('button', { name: 'Leave' }));
  expect(await screen.findByText('the other page')).toBeInTheDocument();
});

test('nothing typed, or only another filter: nobody is asked', async () => {
  open();
  expect(leaving()).toBe(false);
  await userEvent.type(screen.getByLabelText('Lessons'), 'x');
  await userEvent.click(screen.getByRole('link', { name: 'Another year' }));
  expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
  await userEvent.clear(screen.getByLabelText('Lessons'));
  await userEvent.click(screen.getByRole('link', { name: 'Other page' }));
  expect(await screen.findByText('the other page')).toBeInTheDocument();
});

test('a page whose file does not come says so, and does not blame itself', async () => {
  const Page = lazyPage(() => Promise.reject(new TypeError('Failed to fetch')));
  render(<Page />);
  expect(await screen.findByRole('alert')).toHaveTextContent('This page could not be loaded');
  expect(screen.getByRole('button', { name: 'Try again' })).toBeInTheDocument();
});
