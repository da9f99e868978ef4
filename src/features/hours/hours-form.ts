import { z } from 'zod';
import { type HoursRow, newHoursSchema } from '#shared/contracts/hours.ts';
import { into, optionalDay, optionalPick, optionalText } from '../../lib/form-text.ts';
import { hoursTextSchema, hoursToText } from '../../lib/hours-text.ts';
import type { HoursChange } from './mutations.ts';

/** What an hours form holds: text as typed. `isPaid` '' = as the worker is. */
export interface HoursForm {
  rebuildId: string;
  workerId: string;
  workedOn: string;
  seconds: string;
  isPaid: string;
  task: string;
}

export const EMPTY_HOURS: HoursForm = { rebuildId: '', workerId: '', workedOn: '', seconds: '', isPaid: '', task: '' };

/** Typed text to what the contract takes; names are the contract's. */
export const hoursFormSchema = z
  .object({
    rebuildId: z.string().min(1, { error: 'Choose a rebuild.' }),
    workerId: optionalPick,
    workedOn: optionalDay,
    seconds: hoursTextSchema,
    isPaid: z.string().transform((paid) => (paid === '' ? undefined : paid === 'yes')),
    task: optionalText,
  })
  .transform(into(newHoursSchema));

export function formOf(hours: HoursRow): HoursForm {
  return {
    rebuildId: hours.rebuildId,
    workerId: hours.workerId ?? '',
    workedOn: hours.workedOn ?? '',
    seconds: hoursToText(hours.seconds),
    isPaid: hours.isPaid ? 'yes' : 'no',
    task: hours.task ?? '',
  };
}

/** Only what is different from the hours as they were opened. */
export function changeOf(hours: HoursRow, body: z.output<typeof newHoursSchema>): HoursChange {
  const isSameLength = hoursToText(body.seconds) === hoursToText(hours.seconds);
  const fields = Object.entries(body).filter(([name, value]) => value !== hours[name as keyof HoursRow]);
  return Object.fromEntries(fields.filter(([name]) => name !== 'seconds' || !isSameLength));
}
