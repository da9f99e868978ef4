import { readFileSync } from 'node:fs';
import path from 'node:path';
import { unzipSync } from 'fflate';
import { expect, it } from 'vitest';
import type { Import } from '#shared/contracts/imports.ts';
import { randomFrom } from '../bench/invent.ts';
import { zipOf } from '../imports/workbooks.ts';
import { type Member, testApi } from '../support/api.ts';
import { upload } from './imports-support.ts';

const FIXTURES = path.resolve(import.meta.dirname, '../fixtures');
const SAMPLES = [
  'spreadsheets/p01_rebuild_summary_us.csv',
  'spreadsheets/p02_expense_ledger_us.csv',
  'spreadsheets/p03_single_car_sheet.csv',
  'spreadsheets/p04_workbook_2021.xlsx',
  'spreadsheets/p05_hours_log.tsv',
  'spreadsheets/p06_ausgaben_werkstatt.csv',
  'spreadsheets/p07_receipts_messy.csv',
  'spreadsheets/p08_notes_and_junk.csv',
  'workbooks/receipts.xlsx',
  'workbooks/receipts.ods',
].map((name) => readFileSync(path.join(FIXTURES, name)));
const ROUNDS = 15;
const POLL_MS = 5;
const WAIT_MS = 20_000;
// What stands in a file by meaning and not by chance.
const TELLING = [
  '"',
  ',',
  ';',
  '\t',
  '\r',
  '\n',
  '<',
  '>',
  '&',
  '\0',
  '=',
  '-',
  '\xff',
  '\ufeff',
  '9'.repeat(40),
  'x'.repeat(3000),
];

/** Changes of bytes, the same for the same seed: flipped, cut off, doubled, swapped, put in between. */
function mutator(seed: number) {
  const random = randomFrom(seed);
  const below = (end: number) => Math.floor(random() * end);
  const change = (bytes: Buffer): Buffer => {
    const at = below(bytes.length);
    const to = Math.min(bytes.length, at + 1 + below(400));
    const piece = bytes.subarray(at, to);
    switch (below(5)) {
      case 0:
        return Buffer.concat([bytes.subarray(0, at), Buffer.from([below(256)]), bytes.subarray(at + 1)]);
      case 1:
        return below(4) === 0 ? bytes.subarray(0, at + 1) : Buffer.concat([bytes.subarray(0, at), bytes.subarray(to)]);
      case 2:
        return Buffer.concat([bytes.subarray(0, to), piece, bytes.subarray(to)]);
      case 3: {
        const other = below(at + 1);
        return Buffer.concat([bytes.subarray(0, other), piece, bytes.subarray(other)]);
      }
      default:
        return Buffer.concat([
          bytes.subarray(0, at),
          Buffer.from(TELLING[below(TELLING.length)] ?? ''),
          bytes.subarray(at),
        ]);
    }
  };
  const changed = (bytes: Buffer): Buffer => {
    let result = bytes;
    for (let times = 1 + below(6); times > 0; times--) if (result.length > 0) result = change(result);
    return result;
  };
  /** A workbook is changed as an archive, or in one of its parts: else the archive's own checks see all there is. */
  return (bytes: Buffer): Buffer => {
    if (bytes.readUInt16LE(0) !== 0x4b50 || below(3) === 0) return changed(bytes);
    const parts = Object.entries(unzipSync(bytes)).filter(([, part]) => part.length > 0);
    const chosen = below(parts.length);
    return zipOf(
      Object.fromEntries(
        parts.map(([name, part], i) => [name, i === chosen ? changed(Buffer.from(part)) : Buffer.from(part)]),
      ),
    );
  };
}

async function ended(member: Member, id: string): Promise<Import> {
  for (const until = Date.now() + WAIT_MS; Date.now() < until; ) {
    const { body, status } = await member.get(`/api/imports/${id}`);
    if (status !== 200) throw new Error(`the import answered ${status}`);
    if (body.state !== 'reading') return body as Import;
    await new Promise((resolve) => setTimeout(resolve, POLL_MS));
  }
  throw new Error('reading hangs');
}

/** How a file ends: read, refused once read, or refused at the door. */
async function outcomeOf(member: Member, bytes: Buffer): Promise<{ state: string; refusal: string | null }> {
  const { status, body } = await upload(member, bytes);
  if (status === 201) return ended(member, body.id);
  return { state: status === 422 ? 'refused' : `answered ${status}`, refusal: String(body.detail) };
}

it('files with broken bytes are read or refused in words: no crash, no hang, and the books stay as they are', async () => {
  const api = await testApi();
  const ada = await api.owner();
  const mutate = mutator(20_261_201);
  const states = new Map<string, number>();
  const faults: string[] = [];
  for (let round = 0; round < ROUNDS; round++) {
    for (const [place, sample] of SAMPLES.entries()) {
      const { state, refusal } = await outcomeOf(ada, mutate(sample));
      states.set(state, (states.get(state) ?? 0) + 1);
      // The words are those for a reader that broke, not for a file that is broken.
      const isFault = !['ready', 'refused'].includes(state) || refusal?.startsWith('This file could not be read.');
      if (isFault) faults.push(`round ${round}, sample ${place}: ${state}, ${refusal}`);
    }
  }
  expect(faults).toEqual([]);
  // Both ends are reached, so that the changes are neither too gentle nor too rough.
  expect(Math.min(states.get('ready') ?? 0, states.get('refused') ?? 0)).toBeGreaterThan(20);
  for (const url of ['/api/rebuilds', '/api/entries']) expect((await ada.get(url)).body.rows).toEqual([]);
}, 120_000);
