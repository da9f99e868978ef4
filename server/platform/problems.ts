import { STATUS_CODES } from 'node:http';
import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express';
import type { Logger } from 'pino';
import type { z } from 'zod';
import type { FieldError, Problem } from '#shared/problem.ts';

interface ProblemDetails {
  /** A kebab-case name, only if a screen must react to this problem. */
  readonly name?: string;
  readonly detail?: string;
  readonly errors?: readonly FieldError[];
  readonly headers?: Readonly<Record<string, string>>;
}

/** An expected failure, told to the caller as application/problem+json (RFC 9457). */
export class ProblemError extends Error {
  readonly status: number;
  readonly details: ProblemDetails;

  constructor(status: number, details: ProblemDetails = {}) {
    super(details.detail ?? STATUS_CODES[status] ?? 'Problem');
    this.status = status;
    this.details = details;
  }
}

/** 400 with the faulty fields, from what a schema says of a request. */
export function invalidRequest(error: z.ZodError): ProblemError {
  const errors = error.issues.flatMap((issue) => {
    const keys = issue.code === 'unrecognized_keys' ? issue.keys.map((key) => [...issue.path, key]) : [issue.path];
    return keys.map((parts) => ({ pointer: pointerOf(parts), detail: issue.message }));
  });
  return new ProblemError(400, { detail: 'Some fields cannot be taken as they are.', errors });
}

/** 422 on one field: readable, but impossible. */
export function impossible(pointer: string, detail: string): ProblemError {
  return new ProblemError(422, { detail, errors: [{ pointer, detail }] });
}

function pointerOf(parts: readonly PropertyKey[]): string {
  return parts.map((part) => `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');
}

/** 404 for an API address that nobody serves. */
export const noSuchRoute: RequestHandler = () => {
  throw new ProblemError(404, { detail: 'Nothing is served at this address.' });
};

/** The one place that turns an error into an answer. Unexpected ones are logged whole and told to nobody. */
export function problemHandler(logger: Logger): ErrorRequestHandler {
  return (error: unknown, req: Request, res: Response, next) => {
    if (res.headersSent) return next(error);
    const problem = asProblem(error);
    if (problem.status >= 500) logger.error({ err: error, requestId: req.id }, 'request failed');
    send(res, req, problem);
  };
}

function asProblem(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error;
  const fault = error as { status?: unknown; expose?: unknown; code?: unknown; message?: string };
  if (fault.code === 'SQLITE_FULL') {
    return new ProblemError(507, { detail: 'The disk is full; nothing was saved.' });
  }
  if (error instanceof URIError) return new ProblemError(400, { detail: 'This address is malformed.' });
  if (typeof fault.status === 'number' && fault.status < 500 && fault.expose === true) {
    return new ProblemError(fault.status, { detail: fault.message ?? '' });
  }
  return new ProblemError(500);
}

function send(res: Response, req: Request, problem: ProblemError): void {
  const { name, detail, errors, headers } = problem.details;
  const body: Problem = {
    type: name ? `/problems/${name}` : 'about:blank',
    title: STATUS_CODES[problem.status] ?? 'Problem',
    status: problem.status,
    ...(detail ? { detail } : {}),
    requestId: String(req.id),
    ...(errors ? { errors: [...errors] } : {}),
  };
  res
    .status(problem.status)
    .set(headers ?? {})
    .type('application/problem+json')
    .send(JSON.stringify(body));
}
