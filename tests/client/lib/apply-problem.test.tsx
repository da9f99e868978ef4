import { act, render, screen } from '@testing-library/react';
import { useForm } from 'react-hook-form';
import { expect, test } from 'vitest';
import { ApiProblem } from '../../../src/lib/api-problem.ts';
import { applyProblem, fieldName } from '../../../src/lib/apply-problem.ts';

type Values = { name: string; dates: { soldOn: string } };

function Probe({ problem }: { problem: unknown }) {
  const form = useForm<Values>({ defaultValues: { name: '', dates: { soldOn: '' } } });
  const { errors } = form.formState;
  return (
    <>
      <button type="button" onClick={() => applyProblem(form, problem)}>
        Refuse
      </button>
      <p>name: {errors.name?.message}</p>
      <p>sold: {errors.dates?.soldOn?.message}</p>
      <p>form: {errors.root?.['server']?.message}</p>
    </>
  );
}

test('errors go to the fields that their pointers name, the rest to the form', () => {
  const errors = [
    { pointer: '/dates/soldOn', detail: 'Before it was bought.' },
    { pointer: '/elsewhere', detail: 'Something else.' },
  ];
  render(<Probe problem={new ApiProblem({ title: 'Invalid', errors }, 400)} />);
  act(() => screen.getByRole('button').click());
  expect(screen.getByText('sold: Before it was bought.')).toBeInTheDocument();
  expect(screen.getByText('form: Something else.')).toBeInTheDocument();
});

test('a problem without fields stands at the form', () => {
  render(<Probe problem={new ApiProblem({ title: 'Conflict', detail: 'It was changed meanwhile.' }, 412)} />);
  act(() => screen.getByRole('button').click());
  expect(screen.getByText('form: It was changed meanwhile.')).toBeInTheDocument();
});

test('pointers are read as RFC 6901 writes them', () => {
  expect(fieldName('/parts/0/a~1b~0c')).toBe('parts.0.a/b~c');
});
