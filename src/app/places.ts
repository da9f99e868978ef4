import type { Role } from '#shared/vocabulary.ts';

export type Place = {
  path: string;
  label: string;
  group: 'Answers' | 'Next car' | 'Books' | 'Shop';
  roles: readonly Role[];
};

const BOOKS: readonly Role[] = ['owner', 'bookkeeper', 'accountant'];

/** The places of the rail, in order, and who sees them. What a person may do there is the server's to say. */
export const PLACES: readonly Place[] = [
  { path: 'year', label: 'Year', group: 'Answers', roles: BOOKS },
  { path: 'what-pays', label: 'What pays', group: 'Answers', roles: BOOKS },
  { path: 'overruns', label: 'Overruns', group: 'Answers', roles: BOOKS },
  { path: 'time-to-sell', label: 'Time to sell', group: 'Answers', roles: BOOKS },
  { path: 'contingency', label: 'Contingency', group: 'Answers', roles: BOOKS },
  { path: 'pre-bid', label: 'Pre-bid sheet', group: 'Next car', roles: BOOKS },
  { path: 'pre-bids', label: 'Kept sheets', group: 'Next car', roles: BOOKS },
  { path: 'rebuilds', label: 'Rebuilds', group: 'Books', roles: [...BOOKS, 'mechanic', 'partner'] },
  { path: 'ledger', label: 'Ledger', group: 'Books', roles: BOOKS },
  { path: 'hours', label: 'Hours', group: 'Books', roles: [...BOOKS, 'mechanic'] },
  { path: 'import', label: 'Import', group: 'Books', roles: ['owner', 'bookkeeper'] },
  { path: 'data-check', label: 'Data check', group: 'Books', roles: BOOKS },
  { path: 'people', label: 'People', group: 'Shop', roles: ['owner'] },
  { path: 'shop', label: 'Shop', group: 'Shop', roles: BOOKS },
];

export const GROUPS = ['Answers', 'Next car', 'Books', 'Shop'] as const;

/** What a role sees in the rail. */
export function placesOf(role: Role): readonly Place[] {
  return PLACES.filter((place) => place.roles.includes(role));
}

const MOST_USED = ['year', 'rebuilds', 'ledger', 'hours'];

/** The four of the bottom bar. */
export function mostUsedOf(role: Role): readonly Place[] {
  return placesOf(role).filter((place) => MOST_USED.includes(place.path));
}

/** Where a role begins: the year for those who read the books, their own work for the others. */
export function startOf(role: Role): string {
  if (role === 'mechanic') return 'hours';
  return role === 'partner' ? 'rebuilds' : 'year';
}
