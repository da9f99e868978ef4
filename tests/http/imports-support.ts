import { randomUUID } from 'node:crypto';
import type { Import } from '#shared/contracts/imports.ts';
import type { Member, TestApi } from '../support/api.ts';

/** Uploads a file as the page does. */
export const upload = (
  member: Member,
  bytes: Buffer | string,
  name = 'old.csv',
  query = '',
  key: string = randomUUID(),
) =>
  member
    .request('post', `/api/imports${query}`)
    .set('Idempotency-Key', key)
    .attach('file', Buffer.isBuffer(bytes) ? bytes : Buffer.from(bytes), name);

export type NamedFile = readonly [name: string, content: Buffer | string];

/** Uploads several files as one import. */
export function uploadFiles(member: Member, files: readonly NamedFile[], query = '') {
  const request = member.request('post', `/api/imports${query}`).set('Idempotency-Key', randomUUID());
  for (const [name, content] of files)
    request.attach('file', Buffer.isBuffer(content) ? content : Buffer.from(content), name);
  return request;
}

/** Uploads, reads and books several files as one import. */
export async function filesBroughtIn(member: Member, files: readonly NamedFile[]): Promise<Import> {
  const reply = await uploadFiles(member, files);
  if (reply.status !== 201) throw new Error(`upload answered ${reply.status}: ${reply.text}`);
  return booked(member, await settled(member, reply.body.id));
}

/** Waits until nothing is being done with an import, as the page does by asking again. */
export async function settled(member: Member, id: string): Promise<Import> {
  for (let tries = 0; tries < 200; tries++) {
    const { body } = await member.get(`/api/imports/${id}`);
    if (body.state !== 'reading' && body.state !== 'committing') return body as Import;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  throw new Error('The import did not come to an end');
}

/** Uploads and reads a file. */
export async function uploaded(member: Member, bytes: Buffer | string, name = 'old.csv'): Promise<Import> {
  const reply = await upload(member, bytes, name);
  if (reply.status !== 201) throw new Error(`upload answered ${reply.status}: ${reply.text}`);
  return settled(member, reply.body.id);
}

/** Uploads, reads and books a file. */
export async function broughtIn(member: Member, bytes: Buffer | string, name = 'old.csv'): Promise<Import> {
  return booked(member, await uploaded(member, bytes, name));
}

/** Books a file that was read. */
export async function booked(member: Member, { id }: Pick<Import, 'id'>): Promise<Import> {
  const reply = await member.post(`/api/imports/${id}/commit`);
  if (reply.status >= 300) throw new Error(`commit answered ${reply.status}: ${reply.text}`);
  return settled(member, id);
}

/** A list of expenses with these rows under the usual headings. */
export const expenseList = (...rows: string[]) => ['Date,Car,What for,Details,Paid', ...rows].join('\n');

const BOOKS = [
  'rebuilds',
  'entries',
  'hours',
  'estimates',
  'estimate_lines',
  'workers',
  'rollup_categories',
  'rollup_months',
  'rollup_rebuilds',
  'rollup_overhead',
  'import_facts',
  'import_sheets',
];

const VERSIONS = new Set(['version', 'undone_versions', 'refreshed_version']);

/** Every row of the books in one order, but for the versions that editing raises. */
export async function everything(api: TestApi) {
  const tables = await Promise.all(
    BOOKS.map(async (table) => [table, await api.services.database.reader(table)] as const),
  );
  return tables.map(([table, rows]) => [
    table,
    rows
      .map((row: Record<string, unknown>) =>
        Object.fromEntries(Object.entries(row).filter(([column]) => !VERSIONS.has(column))),
      )
      .toSorted((a: object, b: object) => JSON.stringify(a).localeCompare(JSON.stringify(b))),
  ]);
}
