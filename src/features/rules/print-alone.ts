/** What can be printed by itself; the styles of paper know it by this name. */
export type Printed = 'card' | 'sheet';

/** Prints one part of the page alone. */
export function printAlone(part: Printed): void {
  const root = document.documentElement;
  root.dataset['print'] = part;
  window.print();
  delete root.dataset['print'];
}
