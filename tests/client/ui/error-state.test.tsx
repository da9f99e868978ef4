import { render, screen } from '@testing-library/react';
import { expect, test } from 'vitest';
import { ApiProblem } from '../../../src/lib/api-problem.ts';
import { ErrorState } from '../../../src/ui/states.tsx';

const problem = (status: number, title: string, detail: string) =>
  new ApiProblem({ title, detail, requestId: 'r-17' }, status);

test('what was refused is said in plain words, without what HTTP calls it and without a number', () => {
  render(<ErrorState error={problem(422, 'Unprocessable Entity', 'This is a picture, no spreadsheet.')} />);
  expect(screen.getByRole('alert')).toHaveTextContent('This is a picture, no spreadsheet.');
  expect(screen.getByRole('alert')).not.toHaveTextContent(/Unprocessable|r-17/);
});

test('a fault of ours can be asked about by its number', () => {
  render(<ErrorState error={problem(500, 'Internal Server Error', 'It is being looked at.')} />);
  expect(screen.getByRole('alert')).toHaveTextContent('r-17');
});
