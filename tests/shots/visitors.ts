import type { APIRequestContext, BrowserContext } from 'playwright-core';
import { sessionApi, sessionSchema } from '#shared/contracts/session.ts';
import { DEMO_OWNER, DEMO_PASSWORD } from '../../seeds/demo/people.ts';
import type { RunningServer } from '../e2e/support/server.ts';

/** Signs somebody in within a browser context; resolves to the id of the shop that they stand in. */
export type Visitor = (context: BrowserContext, server: RunningServer) => Promise<string>;

/** The owner of the demo shop. */
export const demoOwner: Visitor = async (context) => {
  await post(context.request, sessionApi.signIn.path, { email: DEMO_OWNER.email, password: DEMO_PASSWORD });
  return shopOf(context.request);
};

/** Somebody who has just signed up: a shop without a single row. */
export const emptyShop: Visitor = async (context) => {
  await post(context.request, sessionApi.signUp.path, {
    name: 'Robin Ames',
    email: 'robin@example.test',
    password: 'a long enough phrase 27',
    shopName: 'Ames & Daughter',
  });
  return shopOf(context.request);
};

async function post(request: APIRequestContext, path: string, data: object): Promise<void> {
  const reply = await request.post(path, { data });
  if (!reply.ok()) throw new Error(`POST ${path} answered ${reply.status()}: ${await reply.text()}`);
}

async function shopOf(request: APIRequestContext): Promise<string> {
  const reply = await request.get(sessionApi.get.path);
  return sessionSchema.parse(await reply.json()).shop.id;
}
