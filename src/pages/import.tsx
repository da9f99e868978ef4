import { useSuspenseQuery } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import type { Reading } from '#shared/contracts/import-reading.ts';
import type { Import } from '#shared/contracts/imports.ts';
import { AsidesTable } from '../features/imports/asides-table.tsx';
import { ChoicesPanel } from '../features/imports/choices-panel.tsx';
import { ColumnTable } from '../features/imports/column-table.tsx';
import { ControlTotals, StatedTotals } from '../features/imports/control-totals.tsx';
import { FirstRows } from '../features/imports/first-rows.tsx';
import { ImportActs } from '../features/imports/import-acts.tsx';
import { ImportAnswer } from '../features/imports/import-answer.tsx';
import { ImportProgress } from '../features/imports/import-progress.tsx';
import { KeptRows } from '../features/imports/kept-rows.tsx';
import { importQuery, isUnderWay } from '../features/imports/queries.ts';
import { RebuildsFound } from '../features/imports/rebuilds-found.tsx';
import { type Settings, useSettings } from '../features/imports/use-settings.ts';
import { useBooksChanged } from '../lib/books-changed.ts';
import { listsQuery } from '../lib/lists.ts';
import { useSession } from '../lib/session.ts';
import { Panel, Panels } from '../ui/panel.tsx';

/** One file: is it all in, and does it agree? */
export function ImportPage() {
  const { importId = '' } = useParams();
  const { shop, role } = useSession();
  const navigate = useNavigate();
  const { data: file } = useSuspenseQuery(importQuery(importId));
  const settings = useSettings(file);
  useBooksKeptFresh(file);
  const canWrite = role === 'owner' || role === 'bookkeeper';
  const list = `/s/${shop.id}/import`;
  return (
    <>
      <ImportAnswer file={file} actions={<Link to={list}>All files</Link>} />
      {isUnderWay(file.state) && <ImportProgress file={file} />}
      {file.refusal && (
        <Panel title="Why it cannot come in" className="mb-6">
          <p className="max-w-[42rem]">{file.refusal}</p>
        </Panel>
      )}
      {canWrite && !isUnderWay(file.state) && (
        <ImportActs file={file} settings={settings} onDropped={() => void navigate(list)} />
      )}
      {file.reading && !isUnderWay(file.state) && (
        <Review file={file} reading={file.reading} settings={settings} canWrite={canWrite} />
      )}
    </>
  );
}

/** Everything that was understood of the file, from its totals down to its rows. */
function Review(props: { file: Import; reading: Reading; settings: Settings; canWrite: boolean }) {
  const { file, reading, settings, canWrite } = props;
  const { data: lists } = useSuspenseQuery(listsQuery());
  const canChange = canWrite && (file.state === 'ready' || file.state === 'refused');
  const categories = lists.categories.filter((category) => !category.isRetired).map((category) => category.name);
  return (
    <>
      <ChoicesPanel reading={reading} settings={settings} canChange={canChange} />
      {reading.shape && (
        <Panels>
          <ControlTotals reading={reading} />
          <StatedTotals reading={reading} />
        </Panels>
      )}
      <div className="grid gap-6">
        <AsidesTable reading={reading} />
        {reading.columns.length > 0 && <ColumnTable {...{ reading, settings, categories, canChange }} />}
        <RebuildsFound reading={reading} />
        {file.state === 'committed' ? (
          <KeptRows importId={file.id} />
        ) : (
          reading.shape && <FirstRows reading={reading} />
        )}
      </div>
    </>
  );
}

/** Once a file is booked, every page that was read before is out of date. */
function useBooksKeptFresh(file: Import): void {
  const changed = useBooksChanged();
  const before = useRef(file.state);
  useEffect(() => {
    if (before.current === 'committing' && file.state === 'committed') void changed();
    before.current = file.state;
  });
}
