import type { Request, RequestHandler, Response, Router } from 'express';
import type { Logger } from 'pino';
import { z } from 'zod';
import type { Contract } from '#shared/contract.ts';
import type { Day } from '#shared/day.ts';
import { dayInZone } from '#shared/day.ts';
import type { Role } from '#shared/vocabulary.ts';
import type { Config } from './config.ts';
import type { Database } from './database.ts';
import { Events, sendEvents } from './event-stream.ts';
import { sha256 } from './ids.ts';
import type { PasswordService } from './passwords.ts';
import { invalidRequest, ProblemError } from './problems.ts';
import type { SessionService, Viewer } from './session.ts';
import type { SignInThrottle } from './throttle.ts';

/** What the running server is made of; handed to every route. */
export interface Services {
  readonly config: Config;
  readonly database: Database;
  readonly sessions: SessionService;
  readonly passwords: PasswordService;
  readonly throttle: SignInThrottle;
  readonly logger: Logger;
  /** The moment; tests hold it still. */
  readonly now: () => Date;
}

/** Who acts, in which shop. Every store and read model is bound to `shopId`. */
export interface Actor {
  readonly userId: string;
  readonly shopId: string;
  readonly role: Role;
}

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;

/** One request, checked: what a handler gets. */
export interface Context<C extends Contract = Contract> {
  readonly contract: C;
  readonly params: Parsed<C['params']>;
  readonly query: Parsed<C['query']>;
  readonly body: Parsed<C['body']>;
  /** Throws 401 if nobody is signed in, 403 if they show no shop. */
  readonly actor: Actor;
  readonly viewer: Viewer | null;
  /** The shop's day: its calendar, its zone; the demo shop's stands still. */
  today(): Promise<Day>;
  /** The version that an edit was made on. */
  readonly ifMatch: number | null;
  /** Key and fingerprint of a write that must happen once. An upload's fingerprint knows nothing of its file yet. */
  readonly once: { readonly key: string; readonly fingerprint: string } | null;
  readonly services: Services;
  readonly req: Request;
  readonly res: Response;
}

/** An answer that is already text, with its status and version (of a write, or from a cache). */
export class Ready {
  readonly status: number;
  readonly json: string;
  readonly version: number | null;
  constructor(status: number, json: string, version: number | null = null) {
    this.status = status;
    this.json = json;
    this.version = version;
  }
}

/** An answer with a version for the ETag, so that it can be edited. */
export interface Versioned<T> {
  readonly version: number;
  readonly versioned: T;
}

type Reply<C extends Contract> = z.input<C['response']>;

export interface Route {
  readonly contract: Contract;
  readonly handle: (ctx: Context) => Promise<unknown>;
  readonly upload?: RequestHandler;
}

/** Joins a contract to the function that answers it. `upload` reads a multipart body first. */
export function route<C extends Contract>(
  contract: C,
  handle: (ctx: Context<C>) => Promise<Reply<C> | Versioned<Reply<C>> | Ready | Events<Reply<C>>>,
  upload?: RequestHandler,
): Route {
  return { contract, handle: handle as Route['handle'], ...(upload ? { upload } : {}) };
}

/** Who may call a route: everyone, anyone signed in, or members of the shown shop with one of these roles. */
export type Access = 'everyone' | 'signed in' | readonly Role[];
export type AccessTable = Readonly<Record<string, Access>>;

/** Mounts routes. Throws, and so stops the start, if a route is not in the table or the table names none. */
export function mount(router: Router, routes: readonly Route[], table: AccessTable, services: Services): void {
  const unused = new Set(Object.keys(table));
  for (const { contract, handle, upload } of routes) {
    const name = `${contract.method} ${contract.path}`;
    const access = table[name];
    if (!access) throw new Error(`Route ${name} is not in the access table`);
    if (!unused.delete(name)) throw new Error(`Route ${name} is mounted twice`);
    const method = contract.method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete';
    const steps = upload ? [guard(access, services), upload] : [guard(access, services)];
    router[method](contract.path, ...steps, async (req: Request, res: Response) => {
      const ctx = await contextOf(contract, req, res, services);
      await answer(contract, res, await handle(ctx));
    });
  }
  if (unused.size > 0) throw new Error(`The access table names routes that do not exist: ${[...unused].join(', ')}`);
}

/** Lets only those in whom the table names, before anything of the request is read. */
function guard(access: Access, services: Services): RequestHandler {
  return async (req, res, next) => {
    const { viewer, cookie } = await services.sessions.find(req.headers.cookie);
    if (cookie) res.appendHeader('Set-Cookie', cookie);
    res.locals['viewer'] = viewer;
    if (access === 'everyone') return next();
    if (!viewer) throw new ProblemError(401, { detail: 'Sign in to go on.' });
    if (access === 'signed in') return next();
    const shown = req.headers['panelgap-shop'];
    if (shown && shown !== viewer.shop?.id) {
      throw new ProblemError(409, { name: 'other-shop', detail: 'You are now working in another shop.' });
    }
    if (!viewer.shop || !access.includes(viewer.shop.role)) {
      throw new ProblemError(403, { detail: 'Your role in this shop does not allow this.' });
    }
    next();
  };
}

async function contextOf(contract: Contract, req: Request, res: Response, services: Services): Promise<Context> {
  const viewer = res.locals['viewer'] as Viewer | null;
  const body = contract.body ? read(contract.body, readJson(req)) : undefined;
  const ctx: Context = {
    contract,
    params: (contract.params ? read(contract.params, req.params) : undefined) as never,
    query: (contract.query ? read(contract.query, req.query) : undefined) as never,
    body: body as never,
    viewer,
    get actor() {
      if (!viewer) throw new ProblemError(401, { detail: 'Sign in to go on.' });
      if (!viewer.shop) throw new ProblemError(403, { detail: 'Choose a shop first.' });
      return { userId: viewer.userId, shopId: viewer.shop.id, role: viewer.shop.role };
    },
    today: () => todayOf(services, ctx.actor.shopId),
    ifMatch: contract.edits === true || (contract.edits && req.headers['if-match']) ? readIfMatch(req) : null,
    once: contract.once ? readOnce(req) : null,
    services,
    req,
    res,
  };
  return ctx;
}

/** Parses what came from outside; the caller's mistake is a 400 that names the fields. */
export function read<S extends z.ZodType>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value);
  if (!parsed.success) throw invalidRequest(parsed.error);
  return parsed.data;
}

/** The JSON that was sent. Anything else is refused: read as nothing, an edit would be lost with a 200. */
function readJson(req: Request): unknown {
  if (req.body !== undefined) return req.body;
  throw new ProblemError(415, { detail: 'Send a JSON body, as application/json.' });
}

function readIfMatch(req: Request): number {
  const match = /^(?:W\/)?"(\d+)"$/.exec(req.headers['if-match'] ?? '');
  if (!match) throw new ProblemError(428, { detail: 'Send If-Match with the version that you changed.' });
  return Number(match[1]);
}

function readOnce(req: Request): Context['once'] {
  const key = req.headers['idempotency-key'];
  if (typeof key !== 'string' || !/^[\x21-\x7e]{8,128}$/.test(key)) {
    throw new ProblemError(400, { detail: 'Send an Idempotency-Key of 8 to 128 characters with this.' });
  }
  return { key, fingerprint: sha256(`${req.method} ${req.path} ${JSON.stringify(req.body)}`) };
}

async function todayOf({ database, now }: Services, shopId: string): Promise<Day> {
  const shop = await database
    .reader('shops')
    .where({ id: shopId })
    .first<{ fixed_today: Day | null; time_zone: string }>('fixed_today', 'time_zone');
  return shop.fixed_today ?? dayInZone(now(), shop.time_zone);
}

async function answer(contract: Contract, res: Response, reply: unknown): Promise<void> {
  if (res.headersSent) return;
  if (reply instanceof Events) return sendEvents(res, reply, (value) => JSON.stringify(contract.response.parse(value)));
  if (reply === undefined) {
    res.status(204).end();
    return;
  }
  if (reply instanceof Ready) {
    if (reply.version !== null) res.set('ETag', `"${reply.version}"`);
    res.status(reply.status).type('application/json').send(reply.json);
    return;
  }
  const { version, versioned } = isVersioned(reply) ? reply : { version: null, versioned: reply };
  if (version !== null) res.set('ETag', `"${version}"`);
  res.status(200).json(contract.response.parse(versioned));
}

function isVersioned(reply: unknown): reply is Versioned<unknown> {
  return typeof reply === 'object' && reply !== null && 'versioned' in reply;
}
