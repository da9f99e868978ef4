import { fold, remembered } from '../cells/fold.ts';

const OWN_WORK =
  /^(?:(?:my|own|our|shop|owners?|self|in house)\s)?(?:labou?r|hours|hrs|time|work|time spent|arbeit|arbeitszeit|eigenleistung(?:en)?|eigenarbeit|eigene arbeit|eigene stunden|stunden|zeit|mano de obra|horas|trabajo|main d oeuvre|heures|travail|temps)(?:\s(?:log|h|std|hours|hrs|spent|own|mine|my own|me|self|by me|propia|propio|propias|eigene?|interne|perso|cost|costs|value|kosten|horas|stunden|heures))?$/;
const MINE =
  /\b(?:my|own|our|owners?|self) (?:labou?r|hours|hrs|time|work)\b|\b(?:eigenleistung|eigenarbeit|eigene (?:arbeit|stunden|zeit)|arbeitszeit eigen|mano de obra propia|horas propias|mi tiempo|mi trabajo|main d oeuvre propre|mon temps|mes heures)\b/;
// `@ $25`, `x 25/hr`, `12h`: what stands beside the word without changing it.
const RATE =
  /[@×x]\s*[$€£]?\s*\d+(?:[.,]\d+)?\s*(?:[$€£]|\/\s*h(?:r|our)?)?|[$€£]?\s*\d+(?:[.,]\d+)?\s*[$€£]?\s*(?:\/|per)\s*(?:h|hr|hour|std|stunde|hora|heure)\b|\d+(?:[.,]\d+)?\s*(?:h|hrs?|hours?|std|stunden|horas?|heures?)\b\.?|[()]/gi;

/** Does a text say of a cost, or of the rows below it, that it is own work? */
export const isOwnWork = (text: string) => OWN_WORK.test(fold(text.replace(RATE, ' ')));

/** Does a text say outright that the work was one's own, not just that it was work? */
export const isMine = (text: string) => MINE.test(fold(text));

/** Does a heading of own work name hours? */
export const saysHours = (heading: string) =>
  /\b(?:h|hrs?|hours?|std|stunden|horas?|heures?)\b/.test(fold(heading.replace(RATE, ' ')));

const MAY_BE_OWN =
  /labo|time|work|hour|hrs|arbeit|eigen|stunden|zeit|mano|horas|trabajo|tiempo|main|heure|travail|temps/i;

/** Does any of a row's words say that it is labor, or own time outright? */
export const saysWork = remembered(
  (text) => MAY_BE_OWN.test(text) && text.length < 80 && (isOwnWork(text) || isMine(text)),
);

const HOURS_INSIDE = /(\d{1,4}(?:[.,]\d{1,2})?)\s*(?:h|hrs?|hours?|std|stunden|horas?|heures?)\b/i;

/** The hours that a text of own work names (`labor 12h x $25`), in whole seconds; null = none. */
export function hoursInside(text: string): number | null {
  const found = HOURS_INSIDE.exec(text)?.[1];
  return found === undefined ? null : Math.round(Number(found.replace(',', '.')) * 3600);
}
