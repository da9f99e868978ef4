import { ApiProblem } from './api-problem.ts';
import { isOtherShop, isSessionEnded, reportProblem } from './problem-watch.ts';
import { shownShop } from './shown-shop.ts';

export type Send = {
  method: string;
  /** Path with its query, ready to fetch. */
  url: string;
  body?: unknown;
  /** Made once when the form opens, so that a retry cannot create twice. */
  idempotencyKey?: string;
  /** The version that was read; a stale one answers 412. */
  version?: number;
  signal?: AbortSignal;
  /** About the session itself: it belongs to no shop, and the caller deals with a 401. */
  isAboutSession?: boolean;
  /** What carries it, where `fetch` will not do. */
  transport?: Transport;
};

export type Transport = (url: string, init: RequestInit) => Promise<Response>;

/**
 * Sends one request and returns the reply's JSON, unread (undefined when it is empty). Throws ApiProblem for anything
 * else than success. Pages use `call`, which knows the contract; sign-in uses this, to stay small.
 */
export async function send(request: Send): Promise<unknown> {
  const carry: Transport = request.transport ?? ((url, init) => fetch(url, init));
  const reply = await carry(request.url, {
    method: request.method,
    headers: headersOf(request),
    body: bodyOf(request.body),
    credentials: 'same-origin',
    ...(request.signal ? { signal: request.signal } : {}),
  }).catch((cause: unknown) => {
    if (cause instanceof DOMException && cause.name === 'AbortError') throw cause;
    throw ApiProblem.unreachable();
  });
  if (!reply.ok) throw await refused(reply, request);
  const text = await reply.text();
  return text === '' ? undefined : JSON.parse(text);
}

async function refused(reply: Response, request: Send): Promise<ApiProblem> {
  const problem = await ApiProblem.from(reply);
  if (!request.isAboutSession && (isSessionEnded(problem) || isOtherShop(problem))) reportProblem(problem);
  return problem;
}

function headersOf(request: Send): Headers {
  const headers = new Headers({ accept: 'application/json' });
  const shop = request.isAboutSession ? null : shownShop();
  if (shop) headers.set('Panelgap-Shop', shop);
  if (request.body !== undefined && !(request.body instanceof FormData))
    headers.set('Content-Type', 'application/json');
  if (request.idempotencyKey) headers.set('Idempotency-Key', request.idempotencyKey);
  if (request.version !== undefined) headers.set('If-Match', `"${request.version}"`);
  return headers;
}

function bodyOf(body: unknown): BodyInit | null {
  if (body === undefined) return null;
  return body instanceof FormData ? body : JSON.stringify(body);
}
