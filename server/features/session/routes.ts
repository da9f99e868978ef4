import { type Session, sessionApi } from '#shared/contracts/session.ts';
import type { Shop } from '#shared/contracts/shop.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { ProblemError } from '../../platform/problems.ts';
import { fromRow } from '../../platform/rows.ts';
import { signUp } from './sign-up.ts';
import { userStore } from './store.ts';

export const sessionRoutes: Route[] = [
  route(sessionApi.get, describeSession),

  route(sessionApi.signIn, async (ctx) => {
    const { sessions, passwords, throttle, database, logger } = ctx.services;
    const email = ctx.body.email.trim().toLowerCase();
    const source = ctx.req.ip ?? 'unknown';
    await throttle.check(email, source);
    const users = userStore(database.reader);
    const user = await users.findByEmail(email);
    const fits = await passwords.fits(user?.passwordHash ?? null, ctx.body.password);
    // Guesses sent at the same moment all got past the first look; who comes after the limit learns nothing.
    await throttle.check(email, source);
    if (!user || !fits) {
      await throttle.failed(email, source);
      logger.warn({ requestId: ctx.req.id, source }, 'sign-in refused');
      throw new ProblemError(401, { name: 'wrong-sign-in', detail: 'Address and password do not fit.' });
    }
    const shops = await users.shopsOf(user.id);
    if (!shops[0]) {
      throw new ProblemError(403, { detail: 'You belong to no shop any more. Ask for an invitation to one.' });
    }
    await leave(ctx);
    const cookie = await sessions.start(user.id, shops[0].id, ctx.req.headers['user-agent']);
    ctx.res.appendHeader('Set-Cookie', cookie);
    logger.info({ requestId: ctx.req.id, userId: user.id }, 'signed in');
  }),

  route(sessionApi.signOut, async (ctx) => {
    const cookie = await leave(ctx);
    if (cookie) ctx.res.appendHeader('Set-Cookie', cookie);
  }),

  route(sessionApi.signUp, async (ctx) => {
    const { userId, shopId } = await signUp(ctx.services, ctx.body, String(ctx.req.id));
    await leave(ctx);
    const cookie = await ctx.services.sessions.start(userId, shopId, ctx.req.headers['user-agent']);
    ctx.res.appendHeader('Set-Cookie', cookie);
  }),

  route(sessionApi.switchShop, async (ctx) => {
    const viewer = ctx.viewer;
    if (!viewer) throw new ProblemError(401);
    const shops = await userStore(ctx.services.database.reader).shopsOf(viewer.userId);
    if (!shops.some((shop) => shop.id === ctx.body.shopId)) {
      throw new ProblemError(404, { detail: 'You belong to no such shop.' });
    }
    await ctx.services.sessions.showShop(viewer.sessionId, ctx.body.shopId);
  }),
];

/** Ends the session that the request came with, if any: a sign-in never goes on under an old token. */
async function leave(ctx: Pick<Context, 'viewer' | 'services'>): Promise<string | null> {
  return ctx.viewer ? ctx.services.sessions.end(ctx.viewer.sessionId) : null;
}

async function describeSession(ctx: Context<typeof sessionApi.get>): Promise<Session | null> {
  if (!ctx.viewer?.shop) return null;
  const { database } = ctx.services;
  const users = userStore(database.reader);
  const [user, shops] = await Promise.all([users.get(ctx.viewer.userId), users.shopsOf(ctx.viewer.userId)]);
  const { shopId, role } = ctx.actor;
  const shop = fromRow<Shop>(await database.reader('shops').where({ id: shopId }).first<object>());
  return {
    user: { id: user.id, name: user.name, email: user.email },
    role,
    shops,
    shop: { ...shop, today: await ctx.today() },
  };
}
