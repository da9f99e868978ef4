import { readdirSync, readFileSync } from 'node:fs';
import { render, screen, within } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { expect, test } from 'vitest';
import { MEASURES } from '../../../src/features/definitions/measures.ts';
import { DefinitionsPage } from '../../../src/pages/definitions.tsx';

Element.prototype.scrollIntoView = () => undefined;

const measures = MEASURES.flatMap((group) => group.measures);

test('every measure stands once, with its own anchor in the list', () => {
  expect(new Set(measures.map(({ id }) => id)).size).toBe(measures.length);
  render(
    <MemoryRouter initialEntries={['/s/one/definitions']}>
      <DefinitionsPage />
    </MemoryRouter>,
  );
  const list = within(screen.getByRole('navigation', { name: 'Measures' }));
  for (const { id, title } of measures) {
    expect(list.getByRole('link', { name: title })).toHaveAttribute('href', `#${id}`);
    expect(screen.getByRole('region', { name: title })).toHaveAttribute('id', id);
  }
});

test('an address with an anchor puts the focus there', () => {
  render(
    <MemoryRouter initialEntries={['/s/one/definitions#overrun']}>
      <DefinitionsPage />
    </MemoryRouter>,
  );
  expect(screen.getByRole('heading', { name: 'Overrun' })).toHaveFocus();
});

test('whatever a page links to as a definition is there', () => {
  const linked = readdirSync('src', { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('.tsx'))
    .flatMap((name) => [...readFileSync(`src/${name}`, 'utf8').matchAll(/definition="([\w-]+)"|definitions#([\w-]+)/g)])
    .map(([, prop, hash]) => prop ?? hash);
  expect(linked.length).toBeGreaterThan(3);
  expect(measures.map(({ id }) => id)).toEqual(expect.arrayContaining(linked));
});
