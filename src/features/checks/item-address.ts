import type { CheckItem, CheckKind } from '#shared/contracts/checks.ts';

/** Where one thing can be mended, below the shop's address. null = nowhere in particular. */
export function itemAddress(kind: CheckKind, { importId, rebuild, on, entryIds }: CheckItem): string | null {
  if (importId !== null) return `import/${importId}`;
  const rows = new URLSearchParams();
  if (rebuild) rows.set('rebuild', rebuild.id);
  if (on !== null) for (const end of ['from', 'to']) rows.set(end, on);
  if (kind === 'long day') return `hours?${rows}`;
  if (entryIds.length > 0) {
    if (!rebuild) rows.set('rebuild', 'none');
    return `ledger?${rows}`;
  }
  if (!rebuild) return null;
  if (kind === 'entry without a day') return `ledger?rebuild=${rebuild.id}&dated=no`;
  return kind === 'foreseen not said' ? `ledger?rebuild=${rebuild.id}` : `rebuilds/${rebuild.id}`;
}
