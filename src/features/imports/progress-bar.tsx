/** How much of some work is done, as a bar and in percent. `share` 0–1, `label` for the ear. */
export function ProgressBar({ share, label }: { share: number; label: string }) {
  const percent = Math.round(share * 100);
  return (
    <div className="grid max-w-[38rem] gap-2">
      <div
        role="progressbar"
        aria-label={label}
        aria-valuenow={percent}
        aria-valuemin={0}
        aria-valuemax={100}
        className="h-3 border border-edge bg-paper"
      >
        <div className="h-full bg-ink" style={{ width: `${percent}%` }} />
      </div>
      <p className="text-soft tabular-nums">{percent} %</p>
    </div>
  );
}
