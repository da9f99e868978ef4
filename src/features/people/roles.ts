import { ROLES, type Role } from '#shared/vocabulary.ts';
import { capital } from '../../lib/capital.ts';

type Power = { does: string; roles: readonly Role[] };

/** What can be done in a shop and who may do it, in words. The server's access table decides; this tells people of it. */
export const POWERS: readonly Power[] = [
  { does: 'Put down own hours', roles: ['owner', 'bookkeeper', 'mechanic'] },
  { does: 'See rebuilds, ledger and hours, with their money', roles: ['owner', 'bookkeeper', 'accountant'] },
  { does: 'See the answers: profit, what pays, overruns', roles: ['owner', 'bookkeeper', 'accountant'] },
  { does: 'Write in the books, import, adopt a rule', roles: ['owner', 'bookkeeper'] },
  { does: 'Change the shop and its lists', roles: ['owner'] },
  { does: 'Invite people and change roles', roles: ['owner'] },
];

const WORDS: Record<Role, string> = {
  owner: 'sees and changes everything, people and the shop included',
  bookkeeper: 'sees and keeps all books, but changes neither people nor the shop',
  mechanic: 'puts down own hours on open rebuilds and sees no money',
  partner: 'sees no books yet: pages for the rebuilds they put money in come later',
  accountant: 'sees all books and answers, and changes nothing',
};

/** What a role may do, to stand after its name: "sees all books and answers, and changes nothing". */
export function roleWords(role: Role): string {
  return WORDS[role];
}

/** The same as a sentence: "An accountant sees all books and answers, and changes nothing." */
export function roleSentence(role: Role): string {
  return `${/^[aeiou]/.test(role) ? 'An' : 'A'} ${role} ${WORDS[role]}.`;
}

/** Roles as options of a field. */
export const ROLE_OPTIONS = ROLES.map((role) => ({ value: role, label: capital(role) }));

/** What someone could do as `from` and no longer can as `to`. Empty: the change takes nothing away. */
export function lostPowers(from: Role, to: Role): string[] {
  return POWERS.filter(({ roles }) => roles.includes(from) && !roles.includes(to)).map(({ does }) => does);
}
