import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { expect, test, vi } from 'vitest';
import { MoneyField } from '../../../src/ui/money-field.tsx';
import { PickField } from '../../../src/ui/pick-field.tsx';
import { Segmented } from '../../../src/ui/segmented.tsx';
import { TextField } from '../../../src/ui/text-field.tsx';

test('an error is tied to its field and stays out of its name', () => {
  render(<TextField label="What" hint="In a word." error="Say what it was." />);
  const field = screen.getByRole('textbox', { name: 'What' });
  expect(field).toBeInvalid();
  expect(field).toHaveAccessibleDescription('In a word. Say what it was.');
});

test('money shows what was understood', async () => {
  render(<MoneyField label="Amount" hint="With or without cents" />);
  const field = screen.getByRole('textbox', { name: 'Amount' });
  expect(field).toHaveAccessibleDescription('With or without cents');
  await userEvent.type(field, '1 250.5');
  expect(field).toHaveAccessibleDescription('= $1,250.50');
  await userEvent.clear(field);
  await userEvent.type(field, 'about ten');
  expect(field).toHaveAccessibleDescription('With or without cents');
});

test('a choice of a few is a radio group', async () => {
  const onChange = vi.fn<(value: string) => void>();
  const options = [
    { value: '2/3', label: '2 in 3' },
    { value: '4/5', label: '4 in 5' },
  ];
  render(<Segmented label="Level" options={options} value="2/3" onChange={onChange} />);
  expect(screen.getByRole('group', { name: 'Level' })).toBeInTheDocument();
  expect(screen.getByRole('radio', { name: '2 in 3' })).toBeChecked();
  await userEvent.click(screen.getByRole('radio', { name: '4 in 5' }));
  expect(onChange).toHaveBeenCalledExactlyOnceWith('4/5');
});

function Picker() {
  const [value, setValue] = useState<string | null>(null);
  const options = [
    { value: 'a', label: 'B-061 · 2015 sedan' },
    { value: 'b', label: 'B-060 · 2012 pickup' },
  ];
  return (
    <>
      <PickField label="Rebuild" value={value} onChange={setValue} options={options} />
      <output>{value}</output>
    </>
  );
}

test('one of many is found by typing and taken by Enter', async () => {
  render(<Picker />);
  await userEvent.type(screen.getByRole('combobox', { name: 'Rebuild' }), 'pick');
  await screen.findByRole('option', { name: 'B-060 · 2012 pickup' });
  await userEvent.keyboard('{Enter}');
  expect(screen.getByRole('status')).toHaveTextContent('b');
});
