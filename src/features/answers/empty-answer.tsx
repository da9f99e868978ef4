import { LinkButton } from '../../ui/button.tsx';
import { EmptyState } from '../../ui/states.tsx';
import { useShopPath } from './rebuild-link.tsx';

/** An answer page of a shop without a rebuild: `title` and `teaches` say what will stand here; it leads to the first import. */
export function EmptyAnswer({ title, teaches, canImport }: { title: string; teaches: string; canImport: boolean }) {
  const path = useShopPath();
  return (
    <EmptyState
      title={title}
      action={
        canImport && (
          <>
            <LinkButton kind="main" to={path('import')}>
              Import a spreadsheet
            </LinkButton>
            <LinkButton to={path('rebuilds')}>Add a rebuild by hand</LinkButton>
          </>
        )
      }
    >
      <p>{teaches}</p>
      {canImport && <p className="mt-2">An old list of receipts or one row for each car is enough to start.</p>}
    </EmptyState>
  );
}
