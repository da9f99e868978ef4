import { randomUUID } from 'node:crypto';
import { copyFileSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Express } from 'express';
import request from 'supertest';
import { afterAll, afterEach } from 'vitest';
import { createApp } from '../../server/app.ts';
import { readConfig } from '../../server/platform/config.ts';
import { migrate } from '../../server/platform/database.ts';
import type { Services } from '../../server/platform/http.ts';
import { openServices } from '../../server/services.ts';
import type { Role } from '#shared/vocabulary.ts';

export const PASSWORD = 'seven bent fenders in a row';
/** The moment at which tests run. */
export const NOW = new Date('2026-06-15T17:00:00Z');

const folder = mkdtempSync(path.join(tmpdir(), 'panelgap-test-'));
const template = path.join(folder, 'template.sqlite');
let isReady = false;
const open: Services[] = [];

afterEach(async () => {
  for (const services of open.splice(0)) await services.database.close();
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** A whole server on a SQLite file of its own (migrated once, then copied). `environment` overrides settings. */
export async function testApi(environment: NodeJS.ProcessEnv = {}) {
  if (!isReady) await migrate(template);
  isReady = true;
  const dataDir = path.join(folder, randomUUID());
  mkdirSync(dataDir);
  copyFileSync(template, path.join(dataDir, 'panelgap.sqlite'));
  const config = readConfig({ DATA_DIR: dataDir, LOG_LEVEL: 'silent', ...environment });
  const services = await openServices(config, () => NOW);
  open.push(services);
  const app = createApp(services);
  return {
    app,
    services,
    anyone: caller(app, null),
    /** Signs up an account with a shop of its own. */
    async owner(name = 'Ada Wick') {
      const email = `${name.toLowerCase().replaceAll(' ', '.')}@shop.example`;
      const body = { name, email, password: PASSWORD, shopName: `${name}'s yard`, timeZone: 'America/Chicago' };
      const reply = await request(app).post('/api/sign-up').send(body);
      if (reply.status !== 204) throw new Error(`sign-up answered ${reply.status}: ${reply.text}`);
      return member(app, cookieOf(reply), email);
    },
    /** Adds a member with this role to the owner's shop, straight in the warehouse, and signs them in. */
    async member(owner: Member, role: Role) {
      const email = `${role}.${randomUUID().slice(0, 8)}@shop.example`;
      const shopId = (await owner.get('/api/session')).body.shop.id as string;
      const id = randomUUID().replaceAll('-', '').slice(0, 22);
      const password_hash = await services.passwords.hash(PASSWORD);
      const stamp = NOW.toISOString();
      await services.database
        .writer('users')
        .insert({ id, email, name: `A ${role}`, password_hash, created_at: stamp });
      await services.database.writer('memberships').insert({ shop_id: shopId, user_id: id, role, joined_at: stamp });
      const reply = await request(app).post('/api/session').send({ email, password: PASSWORD });
      return member(app, cookieOf(reply), email);
    },
  };
}

export type TestApi = Awaited<ReturnType<typeof testApi>>;
export type Member = Awaited<ReturnType<typeof member>>;

async function member(app: Express, cookie: string, email: string) {
  const calls = caller(app, cookie);
  const session = await calls.get('/api/session');
  return { ...calls, email, cookie, shopId: session.body.shop.id as string };
}

function cookieOf(reply: request.Response): string {
  const cookies = reply.headers['set-cookie'] as unknown as string[];
  return (cookies.at(-1) ?? '').split(';')[0] ?? '';
}

/** Calls as the browser makes them: with the cookie, a fresh Idempotency-Key, and If-Match where given. */
function caller(app: Express, cookie: string | null) {
  const from = (test: request.Test) => (cookie ? test.set('Cookie', cookie) : test);
  return {
    get: (url: string) => from(request(app).get(url)),
    post: (url: string, body: object = {}, key: string = randomUUID()) =>
      from(request(app).post(url)).set('Idempotency-Key', key).send(body),
    put: (url: string, body: object = {}) => from(request(app).put(url)).send(body),
    patch: (url: string, version: number, body: object) =>
      from(request(app).patch(url)).set('If-Match', `"${version}"`).send(body),
    delete: (url: string) => from(request(app).delete(url)),
    request: (method: 'get' | 'post' | 'patch' | 'put' | 'delete', url: string) => from(request(app)[method](url)),
  };
}
