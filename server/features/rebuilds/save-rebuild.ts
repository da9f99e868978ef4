import type { Rebuild, RebuildFields } from '#shared/contracts/rebuilds.ts';
import type { FieldError } from '#shared/problem.ts';
import type { Books } from '../../books/books.ts';
import { type Reference, refuseFaults, refuseStrangers } from '../../books/references.ts';
import { type Patch, patched } from '../../platform/rows.ts';

type Exit = Pick<RebuildFields, 'soldOn' | 'saleCents' | 'exitKind' | 'exitOn' | 'exitCents'>;

const NO_EXIT: Exit = { soldOn: null, saleCents: null, exitKind: null, exitOn: null, exitCents: null };

export async function createRebuild(books: Books, fields: Patch<RebuildFields> & { tag: string }): Promise<Rebuild> {
  await refuseStrangers(books.scope, referencesOf(fields));
  refuseFaults(exitFaults(patched(NO_EXIT, fields)));
  return books.rebuilds.create(fields);
}

export async function updateRebuild(
  books: Books,
  before: Rebuild,
  version: number,
  change: Patch<RebuildFields>,
): Promise<Rebuild> {
  await refuseStrangers(books.scope, referencesOf(change));
  // A stale edit must hear that it is stale, not what a mix of two people's fields would lack.
  if (before.version === version) refuseFaults(exitFaults(patched<RebuildFields>(before, change)));
  return books.rebuilds.update(before.id, version, change);
}

/** How a rebuild may leave: by a sale with its price, or in one other way with its day and what it brought (0 is a value). */
export function exitFaults(exit: Exit): FieldError[] {
  const faults: FieldError[] = [];
  const wrong = (field: keyof Exit, detail: string) => faults.push({ pointer: `/${field}`, detail });
  if (exit.soldOn && exit.saleCents === null) wrong('saleCents', 'A sale needs its price.');
  if (exit.exitKind) {
    if (exit.soldOn || exit.saleCents !== null) wrong('exitKind', 'It is sold; it cannot leave in another way too.');
    if (!exit.exitOn) wrong('exitOn', 'Say on which day it left.');
    if (exit.exitCents === null) wrong('exitCents', 'Say what it brought; 0 if nothing.');
  } else if (exit.exitOn || exit.exitCents !== null) wrong('exitKind', 'Say in which way it left.');
  return faults;
}

function referencesOf(fields: Patch<RebuildFields>): Reference[] {
  return [
    { pointer: '/classId', table: 'vehicle_classes', id: fields.classId },
    { pointer: '/damageId', table: 'damage_types', id: fields.damageId },
    { pointer: '/secondDamageId', table: 'damage_types', id: fields.secondDamageId },
  ];
}
