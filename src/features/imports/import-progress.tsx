import type { Import } from '#shared/contracts/imports.ts';
import { Panel } from '../../ui/panel.tsx';

/** How far the server is with the file. The page can be left: it is found again in the list. */
export function ImportProgress({ file }: { file: Import }) {
  const share = Math.round((file.progress ?? 0) * 100);
  return (
    <Panel
      title={file.state === 'reading' ? 'Reading every row' : 'Booking every row'}
      subtitle="You may leave this page; the work goes on."
    >
      <div className="grid max-w-[38rem] gap-2">
        <div
          role="progressbar"
          aria-label="Share of the file gone through"
          aria-valuenow={share}
          aria-valuemin={0}
          aria-valuemax={100}
          className="h-3 border border-edge bg-paper"
        >
          <div className="h-full bg-ink" style={{ width: `${share}%` }} />
        </div>
        <p className="text-soft tabular-nums">{share} %</p>
      </div>
    </Panel>
  );
}
