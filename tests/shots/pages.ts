/** A page to photograph. `path` is below the shop's address unless it starts with a slash. */
export interface PageToShoot {
  readonly name: string;
  readonly path: string;
  /** Go on to the address of the first link that matches this selector; without such a link the page is left out. */
  readonly follow?: string;
  readonly isSignedOut?: true;
}

/** Every page of the product, in the order of the contact sheets. A new page adds its line. */
export const PAGES: readonly PageToShoot[] = [
  { name: 'sign-in', path: '/sign-in', isSignedOut: true },
  { name: 'sign-up', path: '/sign-up', isSignedOut: true },
  { name: 'year', path: 'year' },
  { name: 'what-pays', path: 'what-pays' },
  { name: 'overruns', path: 'overruns' },
  { name: 'time-to-sell', path: 'time-to-sell' },
  { name: 'contingency', path: 'contingency' },
  { name: 'rule-review', path: 'contingency/review' },
  { name: 'pre-bid', path: 'pre-bid' },
  { name: 'pre-bids', path: 'pre-bids' },
  { name: 'one-pre-bid', path: 'pre-bids', follow: 'main a[href*="/pre-bid/"]' },
  { name: 'rebuilds', path: 'rebuilds' },
  { name: 'one-rebuild', path: 'rebuilds', follow: 'main a[href*="/rebuilds/"]' },
  { name: 'ledger', path: 'ledger' },
  { name: 'hours', path: 'hours' },
  { name: 'own-hours', path: 'hours?view=mine' },
  { name: 'import', path: 'import' },
  { name: 'one-import', path: 'import', follow: 'main a[href*="/import/"]' },
  { name: 'data-check', path: 'data-check' },
  { name: 'definitions', path: 'definitions' },
  { name: 'people', path: 'people' },
  { name: 'shop', path: 'shop' },
];
