import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { HoursDesk } from '../features/hours/hours-desk.tsx';
import { LedgerDesk } from '../features/ledger/ledger-desk.tsx';
import { CautionsPanel } from '../features/rebuilds/cautions-panel.tsx';
import { DatesForm } from '../features/rebuilds/dates-form.tsx';
import { EstimatesPanel } from '../features/rebuilds/estimates-panel.tsx';
import { FactsForm } from '../features/rebuilds/facts-form.tsx';
import { LeavingForm } from '../features/rebuilds/leaving-form.tsx';
import { MoneyLines } from '../features/rebuilds/money-lines.tsx';
import { PlanAgainstActual } from '../features/rebuilds/plan-against-actual.tsx';
import { rebuildQuery } from '../features/rebuilds/queries.ts';
import { RebuildHead } from '../features/rebuilds/rebuild-head.tsx';
import { useSaveRebuild } from '../features/rebuilds/use-save-rebuild.tsx';
import { WordsForm } from '../features/rebuilds/words-form.tsx';
import { listsQuery, optionsOf } from '../lib/lists.ts';
import { rebuildNamesQuery, rebuildOptions } from '../lib/rebuild-names.ts';
import { useSession } from '../lib/session.ts';
import { Panel, Panels } from '../ui/panel.tsx';

/** How did this one go? Plan against actual, its dates, its entries and hours, and what was learned. */
export function RebuildPage() {
  const { rebuildId = '' } = useParams();
  return <Rebuild key={rebuildId} rebuildId={rebuildId} />;
}

function Rebuild({ rebuildId }: { rebuildId: string }) {
  const { shop, role } = useSession();
  const { data: detail } = useSuspenseQuery(rebuildQuery(rebuildId));
  const { data: lists } = useSuspenseQuery(listsQuery());
  const { data: names } = useSuspenseQuery(rebuildNamesQuery());
  const { rebuild } = detail;
  const canWrite = role === 'owner' || role === 'bookkeeper';
  const words = [...lists.classes, ...lists.damages];
  const { save, conflict, generation } = useSaveRebuild(
    rebuild,
    (id) => words.find((word) => word.id === id)?.name ?? null,
  );
  const classes = optionsOf(lists.classes, rebuild.classId);
  const damages = lists.damages.filter(
    (one) => !one.isRetired || one.id === rebuild.damageId || one.id === rebuild.secondDamageId,
  );
  const categories = optionsOf(lists.categories);
  const rebuilds = rebuildOptions(names);
  const desk = { shopId: shop.id, today: shop.today, rebuildId, canWrite, rebuilds };
  const part = { detail, canWrite, save };
  return (
    <>
      <RebuildHead detail={detail} shopId={shop.id} />
      <CautionsPanel detail={detail} />
      <Panel
        title="Plan against actual"
        subtitle="Outline: the locked plan. Ink: spent as foreseen. Rust: over. Hatch: surprises. Chosen extras stand apart."
        className="mb-6"
      >
        <PlanAgainstActual detail={detail} />
      </Panel>
      <Panels>
        <Panel title="What it came to">
          <MoneyLines detail={detail} />
        </Panel>
        <Panel title="Sale, or another way out">
          <LeavingForm key={generation} {...part} />
        </Panel>
      </Panels>
      <Panel title="Its dates" className="mb-6">
        <DatesForm key={generation} {...part} />
      </Panel>
      <Panel title="Estimate" subtitle="Locked before work starts; revisions are kept beside it." className="mb-6">
        <EstimatesPanel detail={detail} categories={categories} canWrite={canWrite} />
      </Panel>
      <Panel title="Entries" className="mb-6">
        <LedgerDesk
          {...desk}
          filters={{ rebuild: rebuildId, void: 'show' }}
          categories={categories}
          empty={<p className="text-soft">No cost or credit yet.</p>}
        />
      </Panel>
      <Panel title="Hours" className="mb-6">
        <HoursDesk
          {...desk}
          filters={{ rebuild: rebuildId, void: 'show' }}
          workers={optionsOf(lists.workers)}
          empty={<p className="text-soft">No hours yet.</p>}
        />
      </Panel>
      <Panel title="What it is" className="mb-6">
        <FactsForm key={generation} {...part} classes={classes} damages={optionsOf(damages, null)} />
      </Panel>
      <Panel title="Notes and lessons">
        <WordsForm key={generation} {...part} />
      </Panel>
      {conflict}
    </>
  );
}
