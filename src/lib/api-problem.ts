import type { FieldError } from '#shared/problem.ts';

/** What a refused or failed request throws: the one error class of the browser (RFC 9457). */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';
  readonly status: number;
  readonly type: string;
  readonly title: string;
  readonly detail: string | null;
  /** Fields that are wrong, by JSON pointer into the body that was sent. */
  readonly errors: readonly FieldError[];
  /** Members that a certain type of problem adds, such as the current version of a stale edit. */
  readonly extra: Readonly<Record<string, unknown>>;

  constructor(body: Record<string, unknown>, status: number) {
    const title = text(body['title']) ?? 'The request failed';
    super(text(body['detail']) ?? title);
    this.status = status;
    this.type = text(body['type']) ?? 'about:blank';
    this.title = title;
    this.detail = text(body['detail']);
    this.errors = Array.isArray(body['errors']) ? body['errors'].filter(isFieldError) : [];
    this.extra = body;
  }

  /** Reads the body of a failed reply; one that is not problem+json still becomes a problem. */
  static async from(reply: Response): Promise<ApiProblem> {
    const isJson = reply.headers.get('content-type')?.includes('json') ?? false;
    const body: unknown = isJson ? await reply.json().catch(() => null) : null;
    return new ApiProblem(isRecord(body) ? body : { title: STATUS_WORDS[reply.status] }, reply.status);
  }

  /** No reply at all: the network is down or the server is away. */
  static unreachable(): ApiProblem {
    return new ApiProblem(
      {
        type: '/problems/unreachable',
        title: 'The server cannot be reached',
        detail: 'Nothing was saved. Check the connection and try again.',
      },
      0,
    );
  }
}

const STATUS_WORDS: Record<number, string> = {
  413: 'That is too large',
  429: 'Too many requests; wait a little',
  502: 'The server is away',
  503: 'The server is busy',
};

function text(value: unknown): string | null {
  return typeof value === 'string' ? value : null;
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function isFieldError(value: unknown): value is FieldError {
  return isRecord(value) && typeof value['pointer'] === 'string' && typeof value['detail'] === 'string';
}
