import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { idSchema, textSchema } from '../fields.ts';
import { ROLES } from '../vocabulary.ts';
import { emailSchema, newPasswordSchema } from './session.ts';

const roleSchema = z.enum(ROLES);

export const memberSchema = z.object({
  userId: idSchema,
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  joinedAt: z.string(),
  version: z.int(),
});
export type Member = z.output<typeof memberSchema>;

export const invitationSchema = z.object({
  id: idSchema,
  email: z.string(),
  role: roleSchema,
  createdAt: z.string(),
  expiresAt: z.string(),
});
export type Invitation = z.output<typeof invitationSchema>;

const token = z.string().regex(/^[A-Za-z0-9_-]{43}$/, { error: 'This is no invitation.' });

export const peopleApi = {
  list: {
    method: 'GET',
    path: '/api/people',
    summary: 'Members of the shop and open invitations',
    response: z.object({ members: z.array(memberSchema), invitations: z.array(invitationSchema) }),
  },
  changeRole: {
    method: 'PATCH',
    path: '/api/people/:userId',
    summary: 'Give a member another role',
    params: z.strictObject({ userId: idSchema }),
    body: z.strictObject({ role: roleSchema }),
    response: memberSchema,
    edits: true,
  },
  remove: {
    method: 'DELETE',
    path: '/api/people/:userId',
    summary: 'Take a member out of the shop',
    params: z.strictObject({ userId: idSchema }),
    response: z.object({ userId: idSchema }),
    edits: true,
  },
  invite: {
    method: 'POST',
    path: '/api/people/invitations',
    summary: 'Invite someone: gives the secret of a link that works once, for seven days',
    body: z.strictObject({ email: emailSchema, role: roleSchema }),
    response: invitationSchema.extend({ token }),
    // Not `once`: the answer kept for a repeat would keep the secret too. A second link does no harm.
  },
  withdraw: {
    method: 'DELETE',
    path: '/api/people/invitations/:invitationId',
    summary: 'Make an invitation’s link useless',
    params: z.strictObject({ invitationId: idSchema }),
    response: z.object({ id: idSchema }),
  },
  /** The secret travels in the body, so that no log holds it. */
  look: {
    method: 'POST',
    path: '/api/join/look',
    summary: 'What an invitation says',
    body: z.strictObject({ token }),
    response: z.object({ shopName: z.string(), email: z.string(), role: roleSchema, hasAccount: z.boolean() }),
  },
  join: {
    method: 'POST',
    path: '/api/join',
    summary: 'Accept an invitation, with a new account or the password of one',
    body: z.strictObject({
      token,
      /** For a new account. */
      name: textSchema(80).optional(),
      password: z.string().min(1).max(256),
    }),
    response: z.void(),
  },
} as const satisfies FeatureApi;

/** A new account's password; the same rule as at sign-up. */
export const joinPasswordSchema = newPasswordSchema;
