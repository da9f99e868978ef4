import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';
import { broughtIn, expenseList, settled, upload, uploaded } from './imports-support.ts';

const PNG = Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex');

it('a booking that fails says so, leaves nothing, and can be tried again', async () => {
  const api = await testApi();
  const ada = await api.owner();
  const { writer } = api.services.database;
  await writer.raw(`CREATE TRIGGER broken BEFORE INSERT ON entries BEGIN SELECT RAISE(ABORT, 'broken'); END`);
  const failed = await broughtIn(ada, expenseList('1/22/2020,13 F-150,Parts,door,10.00'));
  expect(failed).toMatchObject({ state: 'ready', refusal: expect.stringContaining('nothing of it stands') });
  expect((await ada.get('/api/rebuilds')).body.rows).toEqual([]);
  await writer.raw('DROP TRIGGER broken');
  await ada.post(`/api/imports/${failed.id}/commit`);
  expect(await settled(ada, failed.id)).toMatchObject({ state: 'committed', refusal: null });
});

describe('files that cannot come in', () => {
  it.each([
    ['a picture named .csv', PNG, 'picture'],
    ['a workbook of the old kind', Buffer.from('d0cf11e0a1b11ae1', 'hex'), '.xlsx'],
    ['an empty file', Buffer.alloc(0), 'empty'],
  ])('%s is refused at the door with what to do', async (_, bytes, word) => {
    const api = await testApi();
    const ada = await api.owner();
    const reply = await upload(ada, bytes, 'books.csv');
    expect(reply.status).toBe(422);
    expect(reply.headers['content-type']).toContain('application/problem+json');
    expect(reply.body.detail).toContain(word);
    expect((await ada.get('/api/imports')).body.rows).toEqual([]);
  });

  it.each([
    [
      'a quotation mark that is never closed',
      `${expenseList('1/22/2020,13 F-150,Parts,door,10.00', '1/22/2020,"13 F-150,Parts,door,10.00')}\n`,
      'line 3',
    ],
    ['zero bytes inside', `${expenseList('1/22/2020,13 F-150,Parts,do\0or,10.00')}\n`, 'zero bytes'],
    ['one cell of a million letters', expenseList(`1/2/2020,13 F-150,Parts,${'x'.repeat(1_200_000)},10.00`), 'million'],
    ['a sheet without headings', '1/22/2020,13 F-150,Parts,door,10.00\n1/3/2020,13 F-150,Parts,hood,10.00', 'headings'],
  ])('%s is refused with the reason, and nothing is saved', async (_, text, word) => {
    const api = await testApi();
    const ada = await api.owner();
    const read = await uploaded(ada, text);
    expect(read.state).toBe('refused');
    expect(read.refusal).toContain(word);
    expect((await ada.post(`/api/imports/${read.id}/commit`)).status).toBe(409);
    expect((await ada.get('/api/entries')).body.rows).toEqual([]);
  });

  it('a file over the limit is refused, and the server goes on', async () => {
    const api = await testApi({ IMPORT_MAX_BYTES: '1000' });
    const ada = await api.owner();
    expect((await upload(ada, 'x'.repeat(2000))).status).toBe(413);
    expect((await ada.get('/api/imports')).status).toBe(200);
  });

  it('an upload without a file, or in broken parts, is a clear 400', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const none = await ada
      .request('post', '/api/imports')
      .set('Idempotency-Key', 'some-key-1')
      .field('note', 'no file');
    const broken = await ada
      .request('post', '/api/imports')
      .set({ 'Idempotency-Key': 'some-key-2', 'Content-Type': 'multipart/form-data; boundary=x' })
      .send('--x\r\nContent-Disposition: form-data; name="file"; filename="a.csv"\r\n\r\nhalf');
    expect([none.status, broken.status]).toEqual([400, 400]);
  });

  it('a mechanic may not, an accountant only looks, and another shop sees nothing', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const file = expenseList('1/22/2020,13 F-150,Parts,door,10.00');
    const { id } = await broughtIn(ada, file);
    const mechanic = await api.member(ada, 'mechanic');
    const accountant = await api.member(ada, 'accountant');
    const other = await api.owner('Bo Tarn');
    expect((await upload(mechanic, file)).status).toBe(403);
    expect((await accountant.get(`/api/imports/${id}`)).status).toBe(200);
    expect((await accountant.post(`/api/imports/${id}/undo`)).status).toBe(403);
    for (const url of [`/api/imports/${id}`, `/api/imports/${id}/rows`])
      expect((await other.get(url)).status).toBe(404);
    expect((await other.post(`/api/imports/${id}/undo`)).status).toBe(404);
    expect((await other.post(`/api/imports/${id}/commit`)).status).toBe(404);
  });
});
