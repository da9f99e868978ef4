import { useEffect } from 'react';
import { drop, keep, kept } from '../../lib/kept.ts';
import type { SheetForm } from './sheet-form.ts';

/** What was typed on a sheet and is not kept on the server yet. */
export interface Draft {
  readonly values: SheetForm;
  /** Version of the kept sheet that it changes; null = a new sheet. */
  readonly version: number | null;
}

/** Where what is typed on a sheet stays until it is kept; null = a new sheet. */
const nameOf = (home: string, bidId: string | null) => `${home}draft.${bidId ?? 'new'}`;

/** The draft of a sheet, over the values that it would start with; null = nothing was typed. */
export function draftOf(home: string, bidId: string | null, start: SheetForm): Draft | null {
  const found = kept(nameOf(home, bidId)) as Partial<Draft> | null;
  if (!found?.values) return null;
  const amounts = { ...start.amounts, ...found.values.amounts };
  return { values: { ...start, ...found.values, amounts }, version: found.version ?? null };
}

/** Was a new sheet begun here that is not kept yet? */
export function hasNewDraft(home: string): boolean {
  return kept(nameOf(home, null)) !== null;
}

export function keepDraft(home: string, bidId: string | null, draft: Draft): void {
  keep(nameOf(home, bidId), draft);
}

export function dropDraft(home: string, bidId: string | null): void {
  drop(nameOf(home, bidId));
}

/** Keeps what is typed for as long as it differs from what the sheet starts with. */
export function useDraft(home: string, bidId: string | null, draft: Draft, isChanged: boolean): void {
  const { values, version } = draft;
  useEffect(() => {
    if (isChanged) keepDraft(home, bidId, { values, version });
    else dropDraft(home, bidId);
  }, [home, bidId, values, version, isChanged]);
}
