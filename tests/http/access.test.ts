import { describe, expect, it } from 'vitest';
import { access } from '../../server/access.ts';
import { ROLES, type Role } from '#shared/vocabulary.ts';
import { type Member, testApi } from '../support/api.ts';

type Method = 'get' | 'post' | 'patch' | 'put' | 'delete';

/** Every route that only some may call. Sign-out would end the session that asks, so it is not here ('everyone'). */
const guarded = Object.entries(access).flatMap(([name, roles]) => {
  const [method = '', path = ''] = name.split(' ');
  return typeof roles === 'string' ? [] : [{ name, method: method.toLowerCase() as Method, path, roles }];
});

/** The address with ids that nobody has. */
const url = (path: string) => path.replace(':kind', 'classes').replace(/:\w+/g, 'AAAAAAAAAAAAAAAAAAAAAA');

async function allRoles(): Promise<Record<Role, Member>> {
  const api = await testApi();
  const owner = await api.owner();
  const members = await Promise.all(
    ROLES.map(async (role) => [role, role === 'owner' ? owner : await api.member(owner, role)]),
  );
  return Object.fromEntries(members) as Record<Role, Member>;
}

describe('every route lets in those that the access table names, and nobody else', () => {
  it('by role', async () => {
    const members = await allRoles();
    for (const { name, method, path, roles } of guarded) {
      for (const role of ROLES) {
        const { status } = await members[role].request(method, url(path)).set('If-Match', '"0"');
        const found = `${name} as ${role}: ${roles.includes(role) ? status === 401 || status === 403 : status !== 403}`;
        expect(found).toBe(`${name} as ${role}: false`);
      }
    }
  });

  it('and no one who is not signed in', async () => {
    const { anyone } = await testApi();
    for (const { name, method, path } of guarded) {
      const { status } = await anyone.request(method, url(path));
      expect(`${name}: ${status}`).toBe(`${name}: 401`);
    }
  });

  it('leaves a mechanic no route to money, and a partner none to the books', () => {
    const open = (role: Role) => guarded.filter(({ roles }) => roles.includes(role)).map(({ name }) => name);
    expect(open('mechanic')).toEqual([
      'GET /api/shop/lists',
      'POST /api/receipts',
      'GET /api/board',
      'GET /api/my-hours',
      'POST /api/my-hours',
      'PATCH /api/my-hours/:hoursId',
      'POST /api/my-hours/:hoursId/void',
    ]);
    expect(open('partner')).toEqual(['GET /api/shop/lists']);
  });
});
