import { joinPasswordSchema, peopleApi } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import { shopScope } from '../../books/scope.ts';
import { write } from '../../books/write.ts';
import { type Context, type Route, route } from '../../platform/http.ts';
import { invalidRequest, ProblemError } from '../../platform/problems.ts';
import { joinShop } from './join-shop.ts';
import { findInvitation, memberStore } from './store.ts';

export const peopleRoutes: Route[] = [
  route(peopleApi.list, async (ctx) => {
    const members = memberStore(shopScope(ctx.services.database.reader, ctx.actor.shopId));
    return { members: await members.list(), invitations: await members.invitations(stamp(ctx)) };
  }),

  route(peopleApi.changeRole, async (ctx) => {
    const { userId } = ctx.params;
    const ready = await write(ctx, { action: 'change role', subject: 'person' }, async ({ scope }) => {
      const members = memberStore(scope);
      const before = await members.get(userId);
      if (ctx.body.role !== 'owner') await keepAnOwner(members, userId);
      const after = await members.changeRole(userId, ctx.ifMatch ?? 0, ctx.body.role);
      return { id: userId, before, after, reply: after, version: after.version };
    });
    if (userId !== ctx.actor.userId) await ctx.services.sessions.endInShop(userId, ctx.actor.shopId);
    return ready;
  }),

  route(peopleApi.remove, async (ctx) => {
    const { userId } = ctx.params;
    const ready = await write(ctx, { action: 'remove person', subject: 'person' }, async ({ scope }) => {
      const members = memberStore(scope);
      const before = await members.get(userId);
      await keepAnOwner(members, userId);
      await members.remove(userId, ctx.ifMatch ?? 0);
      return { id: userId, before, after: null, reply: { userId } };
    });
    await ctx.services.sessions.endInShop(userId, ctx.actor.shopId);
    return ready;
  }),

  route(peopleApi.invite, (ctx) =>
    write(ctx, { action: 'invite person', subject: 'invitation' }, async ({ scope }) => {
      const members = memberStore(scope);
      const { email, role } = ctx.body;
      if ((await members.list()).some((member) => member.email === email)) {
        throw new ProblemError(409, {
          detail: 'This person belongs to the shop already.',
          errors: [{ pointer: '/email', detail: 'This person belongs to the shop already.' }],
        });
      }
      const { token, ...invitation } = await members.invite(email, role, ctx.actor.userId, ctx.services.now());
      return { id: invitation.id, before: null, after: invitation, reply: { ...invitation, token } };
    }),
  ),

  route(peopleApi.withdraw, (ctx) =>
    write(ctx, { action: 'withdraw invitation', subject: 'invitation' }, async ({ scope }) => {
      const { invitationId: id } = ctx.params;
      await memberStore(scope).withdraw(id, stamp(ctx));
      return { id, before: null, after: null, reply: { id } };
    }),
  ),

  route(peopleApi.look, async (ctx) => {
    const { reader } = ctx.services.database;
    const { shopName, email, role } = await findInvitation(reader, ctx.body.token, stamp(ctx));
    const account = await reader('users').where({ email }).first('id');
    return { shopName, email, role, hasAccount: account !== undefined };
  }),

  route(peopleApi.join, async (ctx) => {
    if (ctx.body.name) {
      const parsed = joinPasswordSchema.safeParse(ctx.body.password);
      if (!parsed.success) throw invalidRequest(prefixed(parsed.error, 'password'));
    }
    const from = { source: ctx.req.ip ?? 'unknown', requestId: String(ctx.req.id) };
    const { userId, shopId } = await joinShop(ctx.services, ctx.body, from);
    const { sessions } = ctx.services;
    if (ctx.viewer) await sessions.end(ctx.viewer.sessionId);
    ctx.res.appendHeader('Set-Cookie', await sessions.start(userId, shopId, ctx.req.headers['user-agent']));
  }),
];

type SafeError = Parameters<typeof invalidRequest>[0];

/** The same complaint, said of a field of the body. */
function prefixed(error: SafeError, field: string): SafeError {
  for (const issue of error.issues) issue.path.unshift(field);
  return error;
}

function stamp(ctx: Pick<Context, 'services'>): string {
  return ctx.services.now().toISOString();
}

/** The last owner stays: a shop without one could never be managed again. */
async function keepAnOwner(members: ReturnType<typeof memberStore>, leaving: string): Promise<void> {
  const owner: Role = 'owner';
  const others = (await members.list()).filter((member) => member.role === owner && member.userId !== leaving);
  if (others.length === 0)
    throw new ProblemError(409, { detail: 'The last owner stays. Make someone else an owner first.' });
}
