import type { Adapter, DatabaseSession, DatabaseUser } from 'lucia';
import { generateIdFromEntropySize, Lucia, TimeSpan } from 'lucia';
import type { Role } from '#shared/vocabulary.ts';
import type { Database } from './database.ts';
import { sha256 } from './ids.ts';

/** Who is asking, looked up anew for each request. `shop` is null while the person belongs to none. */
export interface Viewer {
  readonly sessionId: string;
  readonly userId: string;
  readonly shop: { readonly id: string; readonly role: Role } | null;
}

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof createLucia>;
    DatabaseSessionAttributes: { shop_id: string | null; created_at: number; user_agent: string | null };
  }
}

const LONGEST_DAYS = 30;
const IDLE_DAYS = 7;

interface SessionRow {
  id: string;
  user_id: string;
  shop_id: string | null;
  expires_at: number;
  created_at: number;
  user_agent: string | null;
}

/** Keeps sessions in the warehouse, under the SHA-256 of their id: a copy of the file opens no session. */
function sessionAdapter(database: Database): Adapter {
  const { reader, writer, lock } = database;
  const asSession = (id: string, row: SessionRow): DatabaseSession => ({
    id,
    userId: row.user_id,
    expiresAt: new Date(row.expires_at),
    attributes: { shop_id: row.shop_id, created_at: row.created_at, user_agent: row.user_agent },
  });
  return {
    async getSessionAndUser(id): Promise<[DatabaseSession | null, DatabaseUser | null]> {
      const row = await reader<SessionRow>('sessions')
        .where({ id: sha256(id) })
        .where('expires_at', '>', Date.now())
        .where('created_at', '>', Date.now() - LONGEST_DAYS * 86_400_000)
        .first();
      if (!row) return [null, null];
      return [asSession(id, row), { id: row.user_id, attributes: {} }];
    },
    async getUserSessions(userId) {
      const rows = await reader<SessionRow>('sessions').where({ user_id: userId });
      return rows.map((row) => asSession(row.id, row));
    },
    async setSession(session) {
      await lock(() =>
        writer('sessions').insert({
          id: sha256(session.id),
          user_id: session.userId,
          expires_at: session.expiresAt.getTime(),
          ...session.attributes,
        }),
      );
    },
    // Nobody waits for this: a read would stand behind whoever writes. If it fails, the next request prolongs.
    async updateSessionExpiration(id, expiresAt) {
      lock(() =>
        writer('sessions')
          .where({ id: sha256(id) })
          .update({ expires_at: expiresAt.getTime() }),
      ).catch(() => undefined);
    },
    async deleteSession(id) {
      await lock(() =>
        writer('sessions')
          .where({ id: sha256(id) })
          .delete(),
      );
    },
    async deleteUserSessions(userId) {
      await lock(() => writer('sessions').where({ user_id: userId }).delete());
    },
    async deleteExpiredSessions() {
      await lock(() => writer('sessions').where('expires_at', '<=', Date.now()).delete());
    },
  };
}

function createLucia(database: Database, isSecure: boolean) {
  return new Lucia(sessionAdapter(database), {
    sessionExpiresIn: new TimeSpan(IDLE_DAYS, 'd'),
    sessionCookie: {
      name: isSecure ? '__Host-panelgap' : 'panelgap',
      attributes: { secure: isSecure, sameSite: 'lax', path: '/' },
    },
    getSessionAttributes: (row) => ({ shopId: row.shop_id }),
  });
}

/**
 * Sign-in state behind one file: the only one that knows lucia, so that another library can take its place.
 * Sessions end after seven idle days and after thirty in any case.
 */
export function sessionService(database: Database, origin: string | null) {
  const lucia = createLucia(database, origin?.startsWith('https:') ?? false);

  /** The viewer that a Cookie header stands for, and a cookie to send if the session was prolonged. */
  async function find(cookies: string | undefined): Promise<{ viewer: Viewer | null; cookie: string | null }> {
    const id = lucia.readSessionCookie(cookies ?? '');
    if (!id) return { viewer: null, cookie: null };
    const { session } = await lucia.validateSession(id);
    if (!session) return { viewer: null, cookie: lucia.createBlankSessionCookie().serialize() };
    const shop = session.shopId ? await shopOf(session.userId, session.shopId) : null;
    return {
      viewer: { sessionId: id, userId: session.userId, shop },
      cookie: session.fresh ? lucia.createSessionCookie(id).serialize() : null,
    };
  }

  async function shopOf(userId: string, shopId: string): Promise<Viewer['shop']> {
    const row = await database
      .reader<{ role: Role; shop_id: string; user_id: string }>('memberships')
      .where({ user_id: userId, shop_id: shopId })
      .first('role');
    return row ? { id: shopId, role: row.role } : null;
  }

  /** Starts a session and gives the cookie that carries it. */
  async function start(userId: string, shopId: string | null, userAgent: string | undefined): Promise<string> {
    const session = await lucia.createSession(
      userId,
      { shop_id: shopId, created_at: Date.now(), user_agent: userAgent?.slice(0, 200) ?? null },
      { sessionId: generateIdFromEntropySize(25) },
    );
    return lucia.createSessionCookie(session.id).serialize();
  }

  /** Ends one session; the cookie that it gives clears the browser's. */
  async function end(sessionId: string): Promise<string> {
    await lucia.invalidateSession(sessionId);
    return lucia.createBlankSessionCookie().serialize();
  }

  /** Ends every session of a person that shows this shop: their next request there must sign in again. */
  async function endInShop(userId: string, shopId: string): Promise<void> {
    await database.lock(() => database.writer('sessions').where({ user_id: userId, shop_id: shopId }).delete());
  }

  /** Makes the session show another shop. Whether the person belongs to it is checked on each request. */
  async function showShop(sessionId: string, shopId: string): Promise<void> {
    await database.lock(() =>
      database
        .writer('sessions')
        .where({ id: sha256(sessionId) })
        .update({ shop_id: shopId }),
    );
  }

  return { find, start, end, endInShop, showShop, sweep: () => lucia.deleteExpiredSessions() };
}

export type SessionService = ReturnType<typeof sessionService>;
