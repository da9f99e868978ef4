import { readdirSync, readFileSync } from 'node:fs';
import { relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { expect, it } from 'vitest';
import { breach } from './tools/doors.ts';
import { importsOf } from './tools/imports.ts';

const top = fileURLToPath(new URL('..', import.meta.url));
const files = ['shared', 'server', 'src', 'migrations', 'seeds', 'tests'].flatMap(codeBelow);
const product = files.filter(({ path }) => /^(shared|server|src)\//.test(path));

function codeBelow(folder: string) {
  return readdirSync(`${top}${folder}`, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(ts|tsx|mjs)$/.test(entry.name))
    .map((entry) => {
      const full = `${entry.parentPath}/${entry.name}`;
      return { path: relative(top, full), source: readFileSync(full, 'utf8') };
    });
}

it('there is code to look at', () => {
  expect(files.map(({ path }) => path)).toEqual(expect.arrayContaining(['shared/money.ts', 'server/run/start.mjs']));
});

it('every import goes through an open door', () => {
  const breaches = files.flatMap(({ path, source }) => importsOf(source, path).map((name) => breach(path, name)));
  expect(breaches.filter((sentence) => sentence !== null)).toEqual([]);
});

it('no file of the product is over 250 lines', () => {
  const long = product.filter(({ source }) => source.split('\n').length > 251);
  expect(long.map(({ path }) => path)).toEqual([]);
});

it('the product exports by name only', () => {
  const nameless = product.filter(({ source }) => /^export\s+(default\b|\{[^}]*\bas default\b)/m.test(source));
  expect(nameless.map(({ path }) => path)).toEqual([]);
});

it('files and folders are named in kebab-case', () => {
  const isKebab = (name: string) => /^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+)*$/.test(name);
  const odd = files.filter(({ path }) => !path.split('/').every(isKebab));
  expect(odd.map(({ path }) => path)).toEqual([]);
});
