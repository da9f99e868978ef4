import type { z } from 'zod';

/**
 * One route, written once and checked on both sides. `path` holds `:name` parameters. The server parses
 * `params`, `query` and `body` with these schemas and its reply with `response`; the client parses the reply.
 * `once` marks a write that creates: the client sends an Idempotency-Key with it.
 * `edits` marks a write that needs If-Match with the version that was read; 'optional' = it is honoured where it is sent.
 * `stream` marks an answer of server-sent events, each of which holds a `response`.
 */
export interface Contract {
  readonly method: 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE';
  readonly path: `/api/${string}`;
  /** One line for the API document. */
  readonly summary: string;
  readonly params?: z.ZodType;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType;
  /** A multipart upload in place of a JSON body. */
  readonly upload?: true;
  readonly response: z.ZodType;
  readonly once?: true;
  readonly edits?: true | 'optional';
  readonly stream?: true;
}

/** All routes of a feature, by name. */
export type FeatureApi = Readonly<Record<string, Contract>>;
