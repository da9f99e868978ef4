import type { FieldError } from '#shared/problem.ts';
import { ProblemError } from '../platform/problems.ts';
import type { ShopScope } from './scope.ts';

type Table = 'rebuilds' | 'categories' | 'vehicle_classes' | 'damage_types' | 'workers' | 'imports';

/** An id that a body names: where it stands, what it must be. null and undefined name nothing. */
export interface Reference {
  readonly pointer: string;
  readonly table: Table;
  readonly id: string | null | undefined;
}

const WORDS: Record<Table, string> = {
  rebuilds: 'There is no such rebuild in this shop.',
  categories: 'There is no such category in this shop.',
  vehicle_classes: 'There is no such class in this shop.',
  damage_types: 'There is no such damage type in this shop.',
  workers: 'There is no such worker in this shop.',
  imports: 'There is no such import in this shop.',
};

/** 422 that marks every field whose id is not of this shop: another shop's and an unknown one answer alike. */
export async function refuseStrangers(scope: ShopScope, references: readonly Reference[]): Promise<void> {
  const faults: FieldError[] = [];
  for (const { pointer, table, id } of references) {
    if (id && !(await scope.find(table, id))) faults.push({ pointer, detail: WORDS[table] });
  }
  refuseFaults(faults);
}

/** 422 with every fault at its field; nothing if there is none. */
export function refuseFaults(faults: readonly FieldError[]): void {
  if (faults.length === 0) return;
  throw new ProblemError(422, { detail: faults.map((fault) => fault.detail).join(' '), errors: faults });
}
