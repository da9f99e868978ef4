import { useSuspenseQuery } from '@tanstack/react-query';
import { useCallback, useEffect, useRef, useState } from 'react';
import { Link, useNavigate, useParams, useSearchParams } from 'react-router-dom';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { Import } from '#shared/contracts/imports.ts';
import { Workbench, type WorkbenchHandle } from '../features/imports/desk/workbench.tsx';
import type { Place } from '../features/imports/place.ts';
import { isUnderWay } from '../features/imports/queries.ts';
import { AfterBooking } from '../features/imports/review/after-booking.tsx';
import { AsidesTable } from '../features/imports/review/asides-table.tsx';
import { ChoicesPanel } from '../features/imports/review/choices-panel.tsx';
import { ColumnTable } from '../features/imports/review/column-table.tsx';
import { ControlTotals } from '../features/imports/review/control-totals.tsx';
import { EarlierNote } from '../features/imports/review/earlier-note.tsx';
import { HintsList } from '../features/imports/review/hints-list.tsx';
import { ImportActs } from '../features/imports/review/import-acts.tsx';
import { ImportAnswer } from '../features/imports/review/import-answer.tsx';
import { ImportProgress } from '../features/imports/review/import-progress.tsx';
import { RebuildsFound } from '../features/imports/review/rebuilds-found.tsx';
import { StatedTotals } from '../features/imports/review/stated-totals.tsx';
import { useImport } from '../features/imports/use-import.ts';
import { type Settings, useSettings } from '../features/imports/use-settings.ts';
import { listsQuery } from '../lib/lists.ts';
import { useSession } from '../lib/session.ts';
import { usePageKeys } from '../ui/page-keys.ts';
import { Panel, Panels } from '../ui/panel.tsx';

const KEYS = [
  { keys: '↑ ↓', does: 'From row to row of the file; above the first row, its columns' },
  { keys: '← →', does: 'From cell to cell' },
  { keys: 'Enter', does: 'Into what was understood, to put a cell right; Enter again leads back' },
];

/** One import: is it all in, and does it agree? */
export function ImportPage() {
  const { importId = '' } = useParams();
  const { shop, role } = useSession();
  const navigate = useNavigate();
  const file = useImport(importId);
  const settings = useSettings(file);
  const shown = useLastRead(file);
  usePageKeys(KEYS);
  const canWrite = role === 'owner' || role === 'bookkeeper';
  const list = `/s/${shop.id}/import`;
  const isReadingAgain = file.state === 'reading' && shown !== null;
  const isWorking = isUnderWay(file.state) && !isReadingAgain;
  return (
    <>
      <ImportAnswer file={file} actions={<Link to={list}>All imports</Link>} />
      {isWorking && <ImportProgress file={file} />}
      {file.refusal && (
        <Panel title="Why it cannot come in" className="mb-6">
          <p className="max-w-[42rem]">{file.refusal}</p>
        </Panel>
      )}
      {canWrite && !isWorking && (
        <ImportActs file={file} settings={settings} isReading={isReadingAgain} onDropped={() => void navigate(list)} />
      )}
      {shown?.reading && !isWorking && (
        <Review file={shown} reading={shown.reading} settings={settings} canWrite={canWrite && !isReadingAgain} />
      )}
    </>
  );
}

type ReviewProps = { file: Import; reading: Reading; settings: Settings; canWrite: boolean };

/** Everything that was understood of the file: what is open, the file itself, what was put aside, its totals. */
function Review({ file, reading, settings, canWrite }: ReviewProps) {
  const { shop } = useSession();
  const { data: lists } = useSuspenseQuery(listsQuery());
  const { desk, start, onJump } = useJumps();
  const canChange = canWrite && (file.state === 'ready' || file.state === 'refused');
  const categories = lists.categories.filter((category) => !category.isRetired).map((category) => category.name);
  const isBooked = file.state === 'committed';
  const to = (path: string) => `/s/${shop.id}/${path}`;
  const shared = { reading, settings, canChange, onJump };
  return (
    <>
      {isBooked && <AfterBooking reading={reading} to={to} />}
      <EarlierNote reading={reading} to={(importId) => to(`import/${importId}`)} />
      {!isBooked && <ChoicesPanel {...shared} />}
      {reading.firstRows.length > 0 && (
        <Workbench
          ref={desk}
          {...{ file, reading, settings, categories, canChange, start }}
          entryTo={(entryId) => to(`ledger?import=${file.id}&entry=${entryId}`)}
        />
      )}
      <div className="grid gap-6">
        <AsidesTable {...shared} />
        {isBooked && <ChoicesPanel {...shared} />}
        {reading.shape && (
          <Panels>
            <ControlTotals reading={reading} />
            <StatedTotals reading={reading} onJump={onJump} />
          </Panels>
        )}
        <RebuildsFound {...shared} />
        <HintsList reading={reading} onJump={onJump} />
        {reading.columns.length > 0 && <ColumnTable {...shared} categories={categories} />}
      </div>
    </>
  );
}

/** The place that the address names, `?sheet=&row=&col=`, and the way to any other. */
function useJumps() {
  const [search] = useSearchParams();
  const desk = useRef<WorkbenchHandle>(null);
  const address = search.toString();
  const start = placeIn(search);
  const asked = useRef(start);
  asked.current = start;
  useEffect(() => {
    // After the frame has shown the page from its top.
    const next = requestAnimationFrame(() => asked.current && desk.current?.go(asked.current));
    return () => cancelAnimationFrame(next);
  }, [address]);
  const onJump = useCallback((place: Place) => desk.current?.go(place), []);
  return { desk, start, onJump };
}

function placeIn(search: URLSearchParams): Place | null {
  const number = (name: string) => {
    const value = Number(search.get(name));
    return Number.isInteger(value) && value > 0 ? value : null;
  };
  const row = number('row');
  return row === null ? null : { sheet: number('sheet') ?? 1, row, col: number('col') };
}

/** The import as it was understood last: it stays in view while the file is read again with what was changed. */
function useLastRead(file: Import): Import | null {
  const [last, setLast] = useState(file);
  if (file.reading && file !== last) setLast(file);
  if (file.reading) return file;
  return file.state === 'reading' && last.reading ? last : null;
}
