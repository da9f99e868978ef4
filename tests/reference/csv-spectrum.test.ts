import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, it } from 'vitest';
import { bytesOf } from '../../server/features/imports/text/bytes.ts';
import { findFormat, forEachRow } from '../../server/features/imports/text/rows.ts';

// The acid tests of CSV that the package csv-spectrum carries: each file beside the objects that it must come to.
const FOLDER = path.resolve(import.meta.dirname, '../../node_modules/csv-spectrum');
// The truth of this one is a single object with another phone number than its file.
const MISPRINT = { name: 'location_coordinates', stated: '1234567890', inFile: '2095257564' };
const NAMES = readdirSync(path.join(FOLDER, 'csvs')).map((file) => path.parse(file).name);

it.each(NAMES)('csv-spectrum: %s', (name) => {
  const source = bytesOf(readFileSync(path.join(FOLDER, 'csvs', `${name}.csv`)));
  const rows: string[][] = [];
  forEachRow(source, findFormat(source), (cells, _line, isMalformed) => {
    expect(isMalformed).toBe(false);
    rows.push(cells);
  });
  const [heading = [], ...data] = rows;
  const objects = data.map((cells) => Object.fromEntries(heading.map((key, i) => [key, cells[i]])));
  expect(objects).toEqual(truthOf(name));
});

it('all twelve were there', () => {
  expect(NAMES).toHaveLength(12);
});

function truthOf(name: string): unknown {
  // We read every line end as one \n; the truth keeps those inside quotes as they were.
  const text = readFileSync(path.join(FOLDER, 'json', `${name}.json`), 'utf8').replaceAll('\\r\\n', '\\n');
  return name === MISPRINT.name ? [JSON.parse(text.replace(MISPRINT.stated, MISPRINT.inFile))] : JSON.parse(text);
}
