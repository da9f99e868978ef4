import { z } from 'zod';
import type { FeatureApi } from '../contract.ts';
import { idSchema, textSchema } from '../fields.ts';
import { ROLES } from '../vocabulary.ts';

const roleSchema = z.enum(ROLES);

/** The shop that a session is in. `today` is its own calendar day: the demo's stands still. */
export const sessionShopSchema = z.object({
  id: z.string(),
  name: z.string(),
  currency: z.string(),
  locale: z.string(),
  timeZone: z.string(),
  today: z.string(),
  isDemo: z.boolean(),
  /** 1–12. */
  yearStartMonth: z.int(),
});

export const sessionSchema = z.object({
  user: z.object({ id: z.string(), name: z.string(), email: z.string() }),
  shop: sessionShopSchema,
  role: roleSchema,
  /** Every shop the person belongs to, this one included. */
  shops: z.array(z.object({ id: z.string(), name: z.string(), role: roleSchema })),
});
export type Session = z.infer<typeof sessionSchema>;

/** Compared and kept in lower case. */
export const emailSchema = z
  .string()
  .max(254)
  .transform((text) => text.trim().toLowerCase())
  .pipe(z.email({ error: 'Give an e-mail address.' }));

/** A password to be set. Any characters, never cut; length is what makes it hard to guess. */
export const newPasswordSchema = z
  .string()
  .min(15, { error: 'At least 15 characters; a short sentence is easiest to remember.' })
  .max(256, { error: 'At most 256 characters.' })
  .refine((text) => new Set(text).size >= 5, { error: 'Use more than a few different characters.' });

export const signInSchema = z.strictObject({
  email: z.string().min(1, { error: 'Fill this in.' }).max(254),
  password: z.string().min(1, { error: 'Fill this in.' }).max(256),
});
export const signUpSchema = z.strictObject({
  name: textSchema(80),
  email: emailSchema,
  password: newPasswordSchema,
  shopName: textSchema(80),
  /** The browser's own, if it knows; the shop can be changed later. */
  timeZone: z.string().max(60).optional(),
});

export const sessionApi = {
  get: {
    method: 'GET',
    path: '/api/session',
    summary: 'Who is signed in, in which shop, as what; null when nobody is',
    response: sessionSchema.nullable(),
  },
  signIn: { method: 'POST', path: '/api/session', summary: 'Sign in', body: signInSchema, response: z.void() },
  signOut: { method: 'DELETE', path: '/api/session', summary: 'Sign out', response: z.void() },
  signUp: {
    method: 'POST',
    path: '/api/sign-up',
    summary: 'Make an account and its shop',
    body: signUpSchema,
    response: z.void(),
  },
  switchShop: {
    method: 'PUT',
    path: '/api/session/shop',
    summary: 'Move the session to another of your shops',
    body: z.strictObject({ shopId: idSchema }),
    response: z.void(),
  },
} as const satisfies FeatureApi;
