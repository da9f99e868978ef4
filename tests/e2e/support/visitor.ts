import { randomUUID } from 'node:crypto';
import type { BrowserContext, Page } from '@playwright/test';
import { sessionApi, sessionSchema } from '#shared/contracts/session.ts';
import type { Role } from '#shared/vocabulary.ts';
import { DEMO_MEMBERS, DEMO_OWNER, DEMO_PASSWORD } from '../../../seeds/demo/people.ts';

/** Whoever signs in: a page, or the context that its cookies live in. */
type Visitor = Pick<Page | BrowserContext, 'request'>;

export const PASSWORD = 'a long enough phrase 27';

/** Somebody new. Everybody has an address of their own: tests share a server. */
export const newPerson = () => ({
  name: 'Robin Ames',
  shopName: 'Ames & Daughter',
  email: `robin-${randomUUID()}@example.test`,
  password: PASSWORD,
});

/** Starts a shop without a row, over the API, and resolves to its address (`/s/ID`) and the owner's sign-in. */
export async function newShop(visitor: Visitor): Promise<{ shop: string; email: string }> {
  const person = newPerson();
  await post(visitor, sessionApi.signUp.path, person);
  return { shop: await shopOf(visitor), email: person.email };
}

/** Signs in as somebody of the demo shop, over the API, and resolves to the shop's address. */
export async function signInToDemo(visitor: Visitor, role: Role = 'owner'): Promise<string> {
  const person = [DEMO_OWNER, ...DEMO_MEMBERS].find((one) => one.role === role);
  await post(visitor, sessionApi.signIn.path, { email: person?.email, password: DEMO_PASSWORD });
  return shopOf(visitor);
}

async function post(visitor: Visitor, path: string, data: object): Promise<void> {
  const reply = await visitor.request.post(path, { data });
  if (!reply.ok()) throw new Error(`POST ${path} answered ${reply.status()}: ${await reply.text()}`);
}

async function shopOf(visitor: Visitor): Promise<string> {
  const reply = await visitor.request.get(sessionApi.get.path);
  return `/s/${sessionSchema.parse(await reply.json()).shop.id}`;
}
