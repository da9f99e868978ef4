import { createServer, get, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterEach, describe, expect, it } from 'vitest';
import { progressSchema } from '#shared/contracts/imports.ts';
import { waiting } from '../../server/features/imports/progress.ts';
import { endStreams, openStreams } from '../../server/platform/event-stream.ts';
import { type Member, type TestApi, testApi } from '../support/api.ts';
import { expenseList, settled, upload, uploaded } from './imports-support.ts';

const LONG = expenseList(...Array.from({ length: 6000 }, (_, i) => `1/22/2020,13 F-150,Parts,door ${i},10.00`));
const closing: (() => void)[] = [];
afterEach(() => {
  for (const close of closing.splice(0)) close();
});

/** Opens the stream as a browser does, over a real connection. */
async function follow(api: TestApi, member: Member, id: string): Promise<IncomingMessage> {
  const server = createServer(api.app).listen(0);
  closing.push(() => server.close());
  const { port } = server.address() as AddressInfo;
  return new Promise((resolve, reject) => {
    get({ port, path: `/api/imports/${id}/progress`, headers: { cookie: member.cookie } }, resolve).once(
      'error',
      reject,
    );
  });
}

async function eventsOf(stream: IncomingMessage) {
  let text = '';
  for await (const piece of stream) text += String(piece);
  return text
    .split('\n\n')
    .filter((event) => event.startsWith('data: '))
    .map((event) => progressSchema.parse(JSON.parse(event.slice('data: '.length))));
}

describe('following an import', () => {
  it('tells each step of reading and ends when it is done', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { body } = await upload(ada, LONG);
    const stream = await follow(api, ada, body.id);
    expect(stream.headers['content-type']).toMatch(/^text\/event-stream/);
    const events = await eventsOf(stream);
    expect(events[0]?.state).toBe('reading');
    expect(events.at(-1)).toEqual({ state: 'ready', progress: null });
    const shares = events.flatMap(({ progress }) => progress ?? []);
    expect(shares).toEqual(shares.toSorted((a, b) => a - b));
    expect([waiting(body.id), openStreams()]).toEqual([0, 0]);
  });

  it('tells of booking, too, and of an import at rest at once', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id } = await uploaded(ada, LONG);
    expect(await eventsOf(await follow(api, ada, id))).toEqual([{ state: 'ready', progress: null }]);
    await ada.post(`/api/imports/${id}/commit`);
    expect((await eventsOf(await follow(api, ada, id))).at(-1)).toEqual({ state: 'committed', progress: null });
  });

  it('leaves nobody waiting when the browser goes, or the server stops', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id } = await uploaded(ada, LONG);
    await api.services.database.writer('imports').where({ id }).update({ state: 'reading' });
    const gone = await follow(api, ada, id);
    gone.destroy();
    const ended = await follow(api, ada, id);
    const events = eventsOf(ended);
    await new Promise((resolve) => setTimeout(resolve, 100));
    endStreams();
    expect(await events).toEqual([{ state: 'reading', progress: null }]);
    await expect.poll(() => [waiting(id), openStreams()]).toEqual([0, 0]);
  });

  it('is for members of the shop', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const { id } = await uploaded(ada, LONG);
    const bob = await api.owner('Bob Stone');
    expect((await bob.get(`/api/imports/${id}/progress`)).status).toBe(404);
    expect((await api.anyone.get(`/api/imports/${id}/progress`)).status).toBe(401);
  });

  it('stands in the API document as a stream', async () => {
    const api = await testApi();
    const { body } = await api.anyone.get('/api/openapi.json');
    const { responses } = body.paths['/api/imports/{importId}/progress'].get;
    expect(Object.keys(responses[200].content)).toEqual(['text/event-stream']);
  });
});

describe('booking what was seen', () => {
  it('is refused when the file was read again since', async () => {
    const api = await testApi();
    const ada = await api.owner();
    const seen = await uploaded(ada, expenseList('1/22/2020,13 F-150,Parts,door,10.00'));
    await ada.patch(`/api/imports/${seen.id}`, seen.version, { leftOut: [] });
    const now = await settled(ada, seen.id);
    const commit = (version: number) =>
      ada.request('post', `/api/imports/${seen.id}/commit`).set('If-Match', `"${version}"`);
    const stale = await commit(seen.version);
    expect([stale.status, stale.body.type]).toEqual([412, '/problems/changed-meanwhile']);
    expect((await commit(now.version)).status).toBe(200);
    expect((await settled(ada, seen.id)).state).toBe('committed');
  });
});
