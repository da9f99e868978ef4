import { MAX_SECONDS } from '#shared/fields.ts';

const CLOCK = /^(\d{1,4}):([0-5]\d)(?::00)?$/;
const LETTER = /^(\d{1,4})\s*h(?:rs?|ours?)?\s*(?:([0-5]?\d)\s*(?:m|min)?)?$/i;
const MINUTES = /^(\d{1,5})\s*(?:m|min|mins|minutes)$/i;
const DECIMAL = /^(\d{1,6}(?:[.,]\d{1,4})?)\s*(?:h|hr|hrs|hours|std\.?)?$/i;

const HALVES: Readonly<Record<string, number>> = {
  '½': 0.5,
  '1/2': 0.5,
  '¼': 0.25,
  '1/4': 0.25,
  '¾': 0.75,
  '3/4': 0.75,
};
const WITH_PART = /^(\d{0,3})\s*(½|¼|¾|1\/2|1\/4|3\/4)\s*(?:h|hr|hrs|hours|std\.?)?$/i;

/** Reads hours as typed (`3.5`, `3:30`, `3h30`, `90 min`) into whole seconds; more than the books hold is bad. */
export function readHours(text: string): number | 'bad' | 'blank' {
  const seconds = secondsOf(text);
  return typeof seconds === 'number' && seconds > MAX_SECONDS ? 'bad' : seconds;
}

function secondsOf(text: string): number | 'bad' | 'blank' {
  const trimmed = text.trim();
  if (trimmed === '' || trimmed === '-') return 'blank';
  const parts = CLOCK.exec(trimmed) ?? LETTER.exec(trimmed);
  if (parts) return Number(parts[1]) * 3600 + Number(parts[2] ?? 0) * 60;
  const minutes = MINUTES.exec(trimmed);
  if (minutes) return Number(minutes[1]) * 60;
  const part = WITH_PART.exec(trimmed);
  if (part) return Math.round((Number(part[1]) + (HALVES[part[2] ?? ''] ?? 0)) * 3600);
  const decimal = DECIMAL.exec(trimmed);
  return decimal ? Math.round(Number((decimal[1] ?? '').replace(',', '.')) * 3600) : 'bad';
}

const DAY_HOURS = 8;
const DAYS =
  /^(half|halber|halben|medio|demi|all|full|whole|ganzer|ganzen|todo el|\d(?:[.,]5)?)[\s-]*(?:a )?(?:days?|tage?|d[ií]as?|journ[ée]es?|jours?)$/i;
const ABOUT = /^(?:~|≈|ca\.?|about|approx\.?|etwa|unos|environ)\s*|\s*(?:-?ish|\?+|or so)$/gi;

/** Hours that are only said roughly (`half day` = 4, `~3`), in whole seconds; null = not even that. */
export function aboutHours(text: string): number | null {
  const days = DAYS.exec(text.trim());
  if (days) {
    const word = (days[1] ?? '').toLowerCase();
    const count = /^\d/.test(word) ? Number(word.replace(',', '.')) : /^(?:half|halb|medio|demi)/.test(word) ? 0.5 : 1;
    return count * DAY_HOURS * 3600;
  }
  const plain = text.trim().replace(ABOUT, '');
  const seconds = plain === text.trim() ? 'bad' : readHours(plain);
  return typeof seconds === 'number' ? seconds : null;
}
