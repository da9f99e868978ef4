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
        <progress
          className="h-3 w-full accent-ink"
          max={100}
          value={share}
          aria-label="Share of the file gone through"
        />
        <p className="text-soft tabular-nums" role="status">
          {share} %
        </p>
      </div>
    </Panel>
  );
}
