import type { Import } from '#shared/contracts/imports.ts';
import { Panel } from '../../../ui/panel.tsx';
import { ProgressBar } from '../progress-bar.tsx';

/** How far the server is with the file. The page can be left: it is found again in the list. */
export function ImportProgress({ file }: { file: Import }) {
  return (
    <Panel
      title={file.state === 'reading' ? 'Reading every row' : 'Booking every row'}
      subtitle="You may leave this page; the work goes on, and the list of imports leads back here."
      className="mb-6"
    >
      <ProgressBar share={file.progress ?? 0} label="Share of the file gone through" />
    </Panel>
  );
}
