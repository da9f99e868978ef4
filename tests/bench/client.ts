import { randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';

/** A signed-in owner of a shop of their own, over HTTP as a browser is. */
export async function signUp(origin: string) {
  const email = `${randomUUID()}@shop.example`;
  const body = { name: 'Bench', email, password: 'seven bent fenders in a row', shopName: 'Bench', timeZone: 'UTC' };
  const headers = { 'Content-Type': 'application/json' };
  const reply = await fetch(`${origin}/api/sign-up`, { method: 'POST', headers, body: JSON.stringify(body) });
  if (!reply.ok) throw new Error(`sign-up answered ${reply.status}`);
  const cookie = (reply.headers.getSetCookie().at(-1) ?? '').split(';')[0] ?? '';

  async function call<T>(method: string, path: string, content?: object | FormData, version?: number): Promise<T> {
    const isForm = content instanceof FormData;
    const answer = await fetch(`${origin}${path}`, {
      method,
      headers: {
        Cookie: cookie,
        'Idempotency-Key': randomUUID(),
        ...(content && !isForm && headers),
        ...(version !== undefined && { 'If-Match': `"${version}"` }),
      },
      ...(content && { body: isForm ? content : JSON.stringify(content) }),
    });
    const text = await answer.text();
    if (!answer.ok) throw new Error(`${method} ${path} answered ${answer.status}: ${text.slice(0, 300)}`);
    return JSON.parse(text) as T;
  }

  const { shop } = await call<{ shop: { id: string } }>('GET', '/api/session');
  return { call, shopId: shop.id };
}

export type Client = Awaited<ReturnType<typeof signUp>>;

/** The most memory that a process has held so far, MB (Linux). */
export function peakMegabytes(pid: number): number {
  const line = /VmHWM:\s+(\d+) kB/.exec(readFileSync(`/proc/${pid}/status`, 'utf8'));
  return Number(line?.[1] ?? 0) / 1024;
}
