import { fold } from '../cells/fold.ts';

// Monday first, as ISO 8601 counts.
const DAYS = [
  'mon monday mo montag lun lunes lundi',
  'tue tues tuesday di dienstag mar martes mardi',
  'wed weds wednesday mi mittwoch mie miercoles mer mercredi',
  'thu thur thurs thursday do donnerstag jue jueves jeu jeudi',
  'fri friday fr freitag vie viernes ven vendredi',
  'sat saturday sa samstag sonnabend sab sabado sam samedi',
  'sun sunday so sonntag dom domingo dim dimanche',
];
const DAY_OF = new Map(DAYS.flatMap((names, day) => names.split(' ').map((name) => [name, day] as const)));

/** The weekday that a heading names, 0 = Monday; null = none. */
export const weekdayOf = (heading: string): number | null => DAY_OF.get(fold(heading)) ?? null;
