import { useQuery } from '@tanstack/react-query';
import { shopQuery } from '../features/shop/queries.ts';
import { ShopFacts, ShopPanel } from '../features/shop/shop-panel.tsx';
import { WordsPanel } from '../features/shop/words-panel.tsx';
import { WorkersPanel } from '../features/shop/workers-panel.tsx';
import { listsQuery } from '../lib/lists.ts';
import { useSession } from '../lib/session.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { EmptyState, ErrorState, LoadingState } from '../ui/states.tsx';

const READERS = ['owner', 'bookkeeper', 'accountant'];

/** The shop's name, how it counts, and the words of its lists. An owner changes them; who reads the books reads them. */
export function ShopPage() {
  const { role } = useSession();
  if (!READERS.includes(role))
    return (
      <>
        <PageHeader title="Shop" />
        <EmptyState title="How the shop counts is for those who see its books">
          <p>Your role here is {role}. Ask an owner of the shop if it should be another.</p>
        </EmptyState>
      </>
    );
  return (
    <>
      <PageHeader
        title="Shop"
        note="How the shop counts, and the words its forms offer. Nothing is deleted here: what is retired stays on what has it."
      />
      <div className="grid gap-6">
        <Settings canEdit={role === 'owner'} />
        <Lists canEdit={role === 'owner'} canEditWorkers={role === 'owner' || role === 'bookkeeper'} />
      </div>
    </>
  );
}

function Settings({ canEdit }: { canEdit: boolean }) {
  const { data, error, refetch } = useQuery(shopQuery());
  if (data) return canEdit ? <ShopPanel shop={data} /> : <ShopFacts shop={data} />;
  if (error) return <ErrorState error={error} onRetry={() => void refetch()} />;
  return <LoadingState label="Reading the shop" />;
}

function Lists({ canEdit, canEditWorkers }: { canEdit: boolean; canEditWorkers: boolean }) {
  const { data, error, refetch } = useQuery(listsQuery());
  if (!data) {
    if (error) return <ErrorState error={error} onRetry={() => void refetch()} />;
    return <LoadingState label="Reading the lists" lines={8} />;
  }
  const { classes, damages, categories, workers } = data;
  return (
    <div className="grid items-start gap-6 lg:grid-cols-2">
      <div className="grid gap-6">
        <WordsPanel
          kind="classes"
          title="Vehicle classes"
          subtitle="What kind of vehicle a rebuild is."
          addLabel="New class"
          items={classes}
          canEdit={canEdit}
        />
        <WordsPanel
          kind="damages"
          title="Damage types"
          subtitle="What had happened to it."
          addLabel="New damage type"
          items={damages}
          canEdit={canEdit}
        />
        <WorkersPanel workers={workers} canEdit={canEditWorkers} />
      </div>
      <WordsPanel
        kind="categories"
        title="Categories"
        subtitle="What money is spent on. The purchase is kept apart, on the rebuild."
        addLabel="New category"
        items={categories}
        canEdit={canEdit}
      />
    </div>
  );
}
