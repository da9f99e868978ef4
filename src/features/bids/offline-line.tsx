import type { BidBasis } from '#shared/contracts/bids-basis.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { useIsOnline, useKeptPages } from './signal.ts';

/** Says on which books the sheet rests, and whether it opens without signal. `isOld`: the server could not be asked. */
export function OfflineLine({ basis, isOld }: { basis: BidBasis; isOld: boolean }) {
  const format = useFormatter();
  const pages = useKeptPages();
  const isOnline = useIsOnline();
  const books = `the books as they stood on ${format.day(basis.asOf)}`;
  if (!isOnline || isOld) {
    return (
      <p role="status" className="offline-line no-print" data-offline>
        <strong className="font-[660]">No signal.</strong> Worked out from {books}. What you keep stays in this browser
        and is sent when there is signal.
      </p>
    );
  }
  return (
    <p role="status" className="offline-line no-print">
      {pages === 'ready' && `Works without signal from here on, with ${books}.`}
      {pages === 'asked' && `Worked out from ${books}.`}
      {pages === 'never' &&
        `Worked out from ${books}. Once opened it goes on without signal; it cannot be opened anew.`}
    </p>
  );
}
