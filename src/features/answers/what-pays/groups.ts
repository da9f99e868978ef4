import type { Comparison, WhatPaysAnswer } from '#shared/contracts/answers-what-pays.ts';
import type { GridCell } from '../../../charts/grid-cells.tsx';
import type { Group } from '../sentences/what-pays.ts';

/** The figure that a group stands for: pulled toward the average where that can be done, else its own mean. */
export function figureOf(group: Group): { value: number; low: number | null; high: number | null } {
  if (group.pulled) return { value: group.pulled.value, low: group.pulled.lower, high: group.pulled.upper };
  return { value: group.mean, low: group.lower, high: group.upper };
}

const NOTHING: GridCell = { value: null, low: null, high: null, n: 0 };

/** A group as a cell of the grid; too few yet: its count alone. */
export function cellOf(group: Group | undefined, href: (group: Group) => string): GridCell {
  if (!group) return NOTHING;
  if (group.isThin) return { ...NOTHING, n: group.n, href: href(group) };
  return { ...figureOf(group), n: group.n, href: href(group) };
}

/** Classes down and damage across, in the shop's own order; only those that occur. */
export function gridOf(fits: WhatPaysAnswer['fits'], options: WhatPaysAnswer['filters']) {
  const inOrder = (list: readonly { id: string; name: string }[], found: Comparison, key: 'classId' | 'damageId') =>
    list.flatMap(({ id, name }) => {
      const margin = found.groups.find((group) => group[key] === id);
      return margin ? [{ id, name, margin }] : [];
    });
  return {
    classes: inOrder(options.classes, fits.classes, 'classId'),
    damages: inOrder(options.damages, fits.damages, 'damageId'),
    cell: (classId: string, damageId: string) =>
      fits.cells.groups.find((group) => group.classId === classId && group.damageId === damageId),
  };
}

/** Ranked ones first in their order, then those with too few, the larger first. */
export function inRank(groups: readonly Group[]): Group[] {
  return groups.toSorted((a, b) => (a.rank ?? Infinity) - (b.rank ?? Infinity) || b.n - a.n);
}

/** The address of a group's rebuilds in the list. */
export function groupSearch(group: Group): string {
  const search = new URLSearchParams();
  if (group.classId) search.set('class', group.classId);
  if (group.damageId) search.set('damage', group.damageId);
  return search.toString();
}
