import { describe, expect, it } from 'vitest';
import { testApi } from '../support/api.ts';

describe('a request that cannot be read', () => {
  it('whose address holds a broken escape is the caller’s mistake', async () => {
    const ada = await (await testApi()).owner();
    const reply = await ada.get('/api/rebuilds/%E0%A4%A');
    expect(reply.status).toBe(400);
    expect(reply.headers['content-type']).toContain('application/problem+json');
  });

  it.each(['text/plain', 'application/x-www-form-urlencoded'])(
    'whose edit comes as %s is refused, not taken for an edit of nothing',
    async (type) => {
      const ada = await (await testApi()).owner();
      const { body: rebuild } = await ada.post('/api/rebuilds', { tag: 'A-1' });
      const reply = await ada
        .request('patch', `/api/rebuilds/${rebuild.id}`)
        .set('If-Match', '"1"')
        .set('Content-Type', type)
        .send('{"notes":"bent"}');
      expect(reply.status).toBe(415);
      const after = await ada.get(`/api/rebuilds/${rebuild.id}`);
      expect(after.body.rebuild).toMatchObject({ version: 1, notes: null });
    },
  );

  it('whose text is not UTF-8 is refused, not mended in silence', async () => {
    const ada = await (await testApi()).owner();
    const text = Buffer.concat([Buffer.from('{"tag":"A'), Buffer.from([0xff]), Buffer.from('"}')]);
    const reply = await ada
      .request('post', '/api/rebuilds')
      .set('Idempotency-Key', 'broken-text-1')
      .set('Content-Type', 'application/json')
      .serialize((bytes: unknown) => bytes as string)
      .send(text);
    expect(reply.status).toBe(400);
    expect((await ada.get('/api/rebuilds')).body.rows).toEqual([]);
  });
});
