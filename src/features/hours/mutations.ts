import type { z } from 'zod';
import {
  type HoursRow,
  type hoursFieldsSchema,
  hoursApi,
  type newHoursSchema,
  type newOwnHoursSchema,
  type OwnHours,
} from '#shared/contracts/hours.ts';
import { call } from '../../lib/api.ts';
import { useBooksChanged } from '../../lib/books-changed.ts';
import { notify } from '../../ui/toast.tsx';
import { tryUndo } from '../../ui/undo.ts';

export type HoursChange = Partial<z.input<typeof hoursFieldsSchema>>;
type Named = { readonly id: string; readonly version: number };

const UNDONE = 'Undone right after it was added';

/** Writes to the hours of anybody. */
export function useHoursWrites() {
  const changed = useBooksChanged();

  async function voidHours({ id, version }: Named, reason: string): Promise<HoursRow> {
    const hours = await call(hoursApi.void, { params: { hoursId: id }, version, body: { reason } });
    await changed();
    return hours;
  }

  async function change({ id, version }: Named, body: HoursChange): Promise<HoursRow> {
    const hours = await call(hoursApi.update, { params: { hoursId: id }, version, body });
    await changed();
    return hours;
  }

  async function add(body: z.input<typeof newHoursSchema>, idempotencyKey: string): Promise<HoursRow> {
    const hours = await call(hoursApi.create, { body, idempotencyKey });
    notify('Hours saved', { undo: () => void tryUndo(voidHours(hours, UNDONE)) });
    await changed();
    return hours;
  }

  return { add, change, voidHours };
}

/** Writes to one's own hours. */
export function useOwnHoursWrites() {
  const changed = useBooksChanged();

  async function voidMine({ id, version }: Named, reason: string): Promise<OwnHours> {
    const hours = await call(hoursApi.voidMine, { params: { hoursId: id }, version, body: { reason } });
    await changed();
    return hours;
  }

  async function changeMine(
    { id, version }: Named,
    body: Partial<z.input<typeof newOwnHoursSchema>>,
  ): Promise<OwnHours> {
    const hours = await call(hoursApi.changeMine, { params: { hoursId: id }, version, body });
    await changed();
    return hours;
  }

  async function log(body: z.input<typeof newOwnHoursSchema>, idempotencyKey: string): Promise<OwnHours> {
    const hours = await call(hoursApi.logMine, { body, idempotencyKey });
    notify('Hours logged', { undo: () => void tryUndo(voidMine(hours, UNDONE)) });
    await changed();
    return hours;
  }

  return { log, changeMine, voidMine };
}
