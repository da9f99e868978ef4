import { describe, expect, it } from 'vitest';
import { access } from '../../server/access.ts';
import { mount, type Services } from '../../server/platform/http.ts';
import { testApi } from '../support/api.ts';

interface Operation {
  readonly summary: string;
  readonly 'x-roles': readonly string[];
  readonly responses: Record<string, unknown>;
}

describe('the API document', () => {
  it('holds every route of the access table with the roles that may call it', async () => {
    const api = await testApi();
    const { status, body } = await api.anyone.get('/api/openapi.json');
    expect(status).toBe(200);
    const described = Object.entries(body.paths as Record<string, Record<string, Operation>>).flatMap(
      ([path, methods]) =>
        Object.entries(methods).map(([method, operation]) => [
          `${method.toUpperCase()} ${path.replace(/\{(\w+)\}/g, ':$1')}`,
          operation['x-roles'],
        ]),
    );
    const table = Object.entries(access).map(([name, who]) => [name, typeof who === 'string' ? [who] : who]);
    expect(new Map(described as [string, string[]][])).toEqual(new Map(table as [string, string[]][]));
  });
});

describe('the access table', () => {
  const none = {} as Services;

  it('stops the start when a route is missing from it', () => {
    const route = { contract: { method: 'GET', path: '/api/x' }, handle: async () => null };
    expect(() => mount({} as never, [route as never], {}, none)).toThrow('GET /api/x');
  });

  it('stops the start when it names a route that does not exist', () => {
    expect(() => mount({} as never, [], { 'GET /api/gone': 'everyone' }, none)).toThrow('GET /api/gone');
  });
});
