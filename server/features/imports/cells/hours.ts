import { MAX_SECONDS } from '#shared/fields.ts';

const CLOCK = /^(\d{1,4}):([0-5]\d)(?::00)?$/;
const LETTER = /^(\d{1,4})\s*h(?:rs?|ours?)?\s*(?:([0-5]?\d)\s*(?:m|min)?)?$/i;
const MINUTES = /^(\d{1,5})\s*(?:m|min|mins|minutes)$/i;
const DECIMAL = /^(\d{1,6}(?:[.,]\d{1,4})?)\s*(?:h|hr|hrs|hours|std\.?)?$/i;

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
  const decimal = DECIMAL.exec(trimmed);
  return decimal ? Math.round(Number((decimal[1] ?? '').replace(',', '.')) * 3600) : 'bad';
}
