import type { z } from 'zod';
import type { Contract } from '#shared/contract.ts';
import { send, type Transport } from './send.ts';

type Part<C, Name extends string, Key extends string = Name> =
  C extends Readonly<Record<Name, infer S extends z.ZodType>> ? { [K in Key]: z.input<S> } : unknown;

/** What a contract asks for; a contract without params, query or body leaves them out. */
export type CallInput<C extends Contract> = Part<C, 'params'> &
  Part<C, 'query'> &
  Part<C, 'body'> &
  (C extends { upload: true } ? { body: FormData } : unknown) &
  (C extends { once: true } ? { idempotencyKey: string } : unknown) &
  (C extends { edits: true }
    ? { version: number }
    : C extends { edits: 'optional' }
      ? { version?: number }
      : unknown) & { signal?: AbortSignal; transport?: Transport };

type Loose = {
  params?: Record<string, unknown>;
  query?: Record<string, unknown>;
  body?: unknown;
  idempotencyKey?: string;
  version?: number;
  signal?: AbortSignal;
  transport?: Transport;
};

/** Sends what the contract asks for and returns its reply, parsed by the same contract. Throws ApiProblem. */
export async function call<const C extends Contract>(
  contract: C,
  ...[input]: Record<never, never> extends CallInput<C> ? [input?: CallInput<C>] : [input: CallInput<C>]
): Promise<z.output<C['response']>> {
  const { params, query, ...rest }: Loose = input ?? {};
  const url = addressOf(contract, params) + queryText(query ?? {});
  const reply = await send({ method: contract.method, url, ...rest });
  return contract.response.parse(reply) as z.output<C['response']>;
}

/** A key for one creating form: make it when the form opens, and a new one after it was saved. */
export function newIdempotencyKey(): string {
  return crypto.randomUUID();
}

/** The address of a route, its parameters filled in. */
export function addressOf({ path }: Contract, params: Readonly<Record<string, unknown>> = {}): string {
  return path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(String(params[name])));
}

/** Query text of plain values; null and undefined are left out, lists repeat their name. */
export function queryText(query: Record<string, unknown>): string {
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    for (const one of Array.isArray(value) ? value : [value]) {
      if (one !== undefined && one !== null && one !== '') search.append(name, String(one));
    }
  }
  const text = search.toString();
  return text === '' ? '' : `?${text}`;
}
