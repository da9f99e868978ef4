import type { ConflictField } from '../../ui/conflict.tsx';
import type { ItemChange, WorkerChange } from './mutations.ts';

type Change = ItemChange & WorkerChange;

const LABELS: Record<keyof Change, string> = {
  name: 'Name',
  position: 'Place in the list',
  isRetired: 'Retired',
  isPaid: 'Paid',
};

/** A wanted change of a list's word beside what was saved meanwhile, in words. */
export function conflictFields(mine: Change, theirs: Change): ConflictField[] {
  const names = Object.keys(mine) as (keyof Change)[];
  return names.map((name) => ({ name: LABELS[name], mine: inWords(mine[name]), theirs: inWords(theirs[name]) }));
}

function inWords(value: Change[keyof Change]): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return typeof value === 'number' ? String(value + 1) : (value ?? '');
}
