import type { Knex } from 'knex';
import { fromRow } from '../../platform/rows.ts';
import type { Role } from '#shared/vocabulary.ts';

export interface User {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly passwordHash: string;
}

/** People and the shops they belong to. Not bound to one shop: this is where a session's shop comes from. */
export function userStore(db: Knex) {
  return {
    async findByEmail(email: string): Promise<User | null> {
      const row: object | undefined = await db('users').where({ email: email.trim().toLowerCase() }).first();
      return row ? fromRow<User>(row) : null;
    },
    async get(id: string): Promise<User> {
      const row: object = await db('users').where({ id }).first();
      return fromRow<User>(row);
    },
    async create(user: User): Promise<void> {
      await db('users').insert({
        id: user.id,
        email: user.email,
        name: user.name,
        password_hash: user.passwordHash,
        created_at: new Date().toISOString(),
      });
    },
    /** The person's shops by name, with their role in each. */
    async shopsOf(userId: string): Promise<{ id: string; name: string; role: Role }[]> {
      return db('memberships')
        .join('shops', 'shops.id', 'memberships.shop_id')
        .where('memberships.user_id', userId)
        .orderBy('shops.name')
        .select('shops.id', 'shops.name', 'memberships.role');
    },
  };
}
