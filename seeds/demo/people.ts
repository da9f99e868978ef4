import type { Role } from '#shared/vocabulary.ts';

/** Everybody in the demo shop, one for each role. Invented, at an address that can never exist. */
export interface DemoPerson {
  readonly role: Role;
  readonly name: string;
  readonly email: string;
}

const person = (role: Role, name: string): DemoPerson => ({ role, name, email: `${role}@pennywhistle.example` });

export const DEMO_OWNER = person('owner', 'Wren Hollis');
export const DEMO_MECHANIC = person('mechanic', 'Tobin Ashby');
export const DEMO_MEMBERS: readonly DemoPerson[] = [
  person('bookkeeper', 'Odile Marsh'),
  DEMO_MECHANIC,
  person('partner', 'Garnet Pell'),
  person('accountant', 'Ines Corrow'),
];

/** The same for all of them; it keeps the product's own rule. */
export const DEMO_PASSWORD = 'six bent fenders and one hammer';
