import type { Knex } from 'knex';
import type { Invitation, Member } from '#shared/contracts/people.ts';
import type { Role } from '#shared/vocabulary.ts';
import type { ShopScope } from '../../books/scope.ts';
import { newId, newToken, sha256 } from '../../platform/ids.ts';
import { ProblemError } from '../../platform/problems.ts';
import { fromRow } from '../../platform/rows.ts';

const DAYS_OPEN = 7;

/** Members of one shop and its open invitations. */
export function memberStore(scope: ShopScope) {
  const members = () =>
    scope
      .table('memberships')
      .join('users', 'users.id', 'memberships.user_id')
      .select('user_id', 'users.name', 'email', 'role', 'joined_at', 'version');

  return {
    async list(): Promise<Member[]> {
      const rows: object[] = await members().orderBy('users.name');
      return rows.map((row) => fromRow<Member>(row));
    },
    async get(userId: string): Promise<Member> {
      const row: object | undefined = await members().where('user_id', userId).first();
      if (!row) throw new ProblemError(404, { detail: 'There is no such person in this shop.' });
      return fromRow<Member>(row);
    },
    async changeRole(userId: string, version: number, role: Role): Promise<Member> {
      const changed = await scope
        .table('memberships')
        .where({ user_id: userId, version })
        .update({ role, version: version + 1 });
      if (changed !== 1) throw changedMeanwhile();
      return this.get(userId);
    },
    async remove(userId: string, version: number): Promise<void> {
      const removed = await scope.table('memberships').where({ user_id: userId, version }).delete();
      if (removed !== 1) throw changedMeanwhile();
    },
    async invitations(now: string): Promise<Invitation[]> {
      const rows: object[] = await scope
        .table('invitations')
        .whereNull('used_at')
        .whereNull('withdrawn_at')
        .where('expires_at', '>', now)
        .orderBy('created_at');
      return rows.map((row) => fromRow<Invitation>(row));
    },
    async invite(email: string, role: Role, invitedBy: string, now: Date): Promise<Invitation & { token: string }> {
      const token = newToken();
      const invitation = {
        id: newId(),
        email,
        role,
        createdAt: now.toISOString(),
        expiresAt: new Date(now.getTime() + DAYS_OPEN * 86_400_000).toISOString(),
      };
      await scope.insert('invitations', { ...invitation, tokenHash: sha256(token), invitedBy });
      return { ...invitation, token };
    },
    async withdraw(id: string, now: string): Promise<void> {
      await scope.get('invitations', id);
      await scope.table('invitations').where({ id }).whereNull('used_at').update({ withdrawn_at: now });
    },
  };
}

function changedMeanwhile(): ProblemError {
  return new ProblemError(412, { name: 'changed-meanwhile', detail: 'Someone changed this meanwhile.' });
}

export interface OpenInvitation {
  readonly id: string;
  readonly shopId: string;
  readonly shopName: string;
  readonly email: string;
  readonly role: Role;
}

/** The invitation that a link's secret stands for; 404 if it is unknown, used, withdrawn or too old. */
export async function findInvitation(db: Knex, token: string, now: string): Promise<OpenInvitation> {
  const row: object | undefined = await db('invitations')
    .join('shops', 'shops.id', 'invitations.shop_id')
    .where({ token_hash: sha256(token) })
    .whereNull('used_at')
    .whereNull('withdrawn_at')
    .where('expires_at', '>', now)
    .first('invitations.id', 'shop_id', 'shops.name as shop_name', 'email', 'role');
  if (!row)
    throw new ProblemError(404, { detail: 'This invitation is used up, withdrawn or too old. Ask for a new one.' });
  return fromRow<OpenInvitation>(row);
}
