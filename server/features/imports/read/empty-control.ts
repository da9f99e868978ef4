import type { Control } from '#shared/contracts/import-reading.ts';

/** The control totals of a file of which nothing has been read yet. Each call gives its own. */
export function emptyControl(): Control {
  return {
    rowsRead: 0,
    taken: 0,
    putAside: 0,
    notData: 0,
    blankRows: 0,
    rebuilds: 0,
    entries: 0,
    centsByCategory: {},
    costCents: 0,
    creditCents: 0,
    saleCents: 0,
    estimateCents: 0,
    putAsideCents: 0,
    hoursSeconds: 0,
  };
}
