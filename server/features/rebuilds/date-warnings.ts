import type { Rebuild } from '#shared/contracts/rebuilds.ts';
import type { Day } from '#shared/day.ts';
import { REBUILD_DATES } from '#shared/vocabulary.ts';

export interface Warning {
  readonly pointer: string;
  readonly detail: string;
}

/**
 * What looks odd about a rebuild's days; none of it blocks, since real records have gaps and wrong orders. A day
 * earlier than the latest known one before it (in the usual order), one that lies ahead of `today`, a price without a day.
 */
export function dateWarnings(rebuild: Rebuild, today: Day): Warning[] {
  const warnings: Warning[] = [];
  let latest: { word: string; day: Day } | null = null;
  for (const [field, word] of REBUILD_DATES) {
    const day = rebuild[field];
    if (day === null) continue;
    if (day > today) warnings.push({ pointer: `/${field}`, detail: `${word} lies ahead of today.` });
    if (latest && day < latest.day) {
      const risk = field === 'listedOn' && latest.word === 'Title issued' ? ' That is common, and risky.' : '';
      warnings.push({ pointer: `/${field}`, detail: `${word} before ${latest.word.toLowerCase()}.${risk}` });
    }
    if (!latest || day > latest.day) latest = { word, day };
  }
  if (rebuild.exitOn && rebuild.boughtOn && rebuild.exitOn < rebuild.boughtOn) {
    warnings.push({ pointer: '/exitOn', detail: 'It left before it was bought.' });
  }
  if (rebuild.saleCents !== null && rebuild.soldOn === null) {
    warnings.push({
      pointer: '/soldOn',
      detail: 'There is a sale price but no day: it counts as unsold until there is.',
    });
  }
  return warnings;
}
