import { randomUUID } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { createApp } from '../../server/app.ts';
import { readConfig } from '../../server/platform/config.ts';
import { openServices } from '../../server/services.ts';

const ACCOUNT = {
  name: 'Ada Wick',
  email: 'ada.wick@shop.example',
  password: 'seven bent fenders in a row',
  shopName: 'Checking yard',
  timeZone: 'America/Chicago',
};

/** A server over an empty warehouse of its own, with its owner signed in. Money is kept in this currency. */
export async function ownServer(currency: string, locale: string) {
  const dataDir = mkdtempSync(path.join(tmpdir(), 'panelgap-check-'));
  const services = await openServices(readConfig({ DATA_DIR: dataDir, LOG_LEVEL: 'silent' }));
  const app = createApp(services);
  const signUp = await request(app).post('/api/sign-up').send(ACCOUNT);
  const cookies = signUp.headers['set-cookie'] as unknown as string[];
  const cookie = (cookies.at(-1) ?? '').split(';')[0] ?? '';
  const sure = async (test: request.Test): Promise<request.Response> => {
    const reply = await test.set('Cookie', cookie);
    if (reply.status >= 400) throw new ServerSaidNo(reply);
    return reply;
  };
  const calls = {
    get: async (url: string) => (await sure(request(app).get(url))).body,
    post: async (url: string) => (await sure(request(app).post(url).send({}))).body,
    patch: async (url: string, version: number, body: object) =>
      (await sure(request(app).patch(url).set('If-Match', `"${version}"`).send(body))).body,
    upload: async (bytes: Buffer, name: string) =>
      (await sure(request(app).post('/api/imports').set('Idempotency-Key', randomUUID()).attach('file', bytes, name)))
        .body,
    async close() {
      await services.database.close();
      rmSync(dataDir, { recursive: true, force: true });
    },
  };
  const shop = await calls.get('/api/shop');
  await calls.patch('/api/shop', shop.version, { currency, locale });
  return calls;
}
export type OwnServer = Awaited<ReturnType<typeof ownServer>>;

/** A refusal of the server: its status, and what it says to the person. */
export class ServerSaidNo extends Error {
  readonly status: number;

  constructor(reply: request.Response) {
    super(String(reply.body?.detail ?? reply.text));
    this.status = reply.status;
  }
}
