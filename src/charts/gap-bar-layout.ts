/** What one gap bar shows. Spent = foreseen + surprise; all in cents. No locked estimate = null. */
export type GapBarData = { lockedCents: number | null; foreseenCents: number; surpriseCents: number };

export type GapPart = { kind: 'foreseen' | 'surprise'; isOver: boolean; from: number; to: number };

export type GapBarShapes = {
  /** Right end of the outline; null without a locked estimate. */
  outline: number | null;
  parts: GapPart[];
  /** More was spent than the bar has room for. */
  isCut: boolean;
};

/**
 * Cents to pixels. Foreseen comes first, surprise after it; each is cut where it crosses the outline, so that what lies
 * beyond can be drawn as over. `maxCents` is the amount at the right end. Credits that outweigh costs count as nothing spent.
 */
export function gapBarLayout(data: GapBarData, size: { width: number; maxCents: number }): GapBarShapes {
  const { lockedCents: locked } = data;
  const toX = (cents: number) =>
    size.maxCents <= 0 ? 0 : (Math.min(cents, size.maxCents) / size.maxCents) * size.width;
  const foreseen = Math.max(0, data.foreseenCents);
  const spent = Math.max(foreseen, foreseen + data.surpriseCents);
  const border = locked ?? Number.POSITIVE_INFINITY;
  const cuts = [
    { kind: 'foreseen', isOver: false, from: 0, to: Math.min(foreseen, border) },
    { kind: 'foreseen', isOver: true, from: border, to: foreseen },
    { kind: 'surprise', isOver: false, from: foreseen, to: Math.min(spent, border) },
    { kind: 'surprise', isOver: true, from: Math.max(foreseen, border), to: spent },
  ] as const;
  return {
    outline: locked === null ? null : toX(locked),
    parts: cuts
      .map((part) => ({ ...part, from: toX(part.from), to: toX(part.to) }))
      .filter((part) => part.to > part.from),
    isCut: spent > size.maxCents,
  };
}
