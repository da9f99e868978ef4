import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { useSession } from '../../lib/session.ts';
import { Money } from '../../ui/figures.tsx';
import { entryQuery } from './queries.ts';

/** Where an entry came from (file, row, column, the row as it was read) and the other shares of its bill. */
export function EntrySource({ entryId }: { entryId: string }) {
  const { shop } = useSession();
  const { data: entry } = useQuery(entryQuery(entryId));
  if (!entry || (!entry.source && entry.shares.length === 0)) return null;
  const { source, shares } = entry;
  return (
    <section className="grid gap-2 border-t border-rule pt-4">
      {source && (
        <p>
          From{' '}
          <Link to={`/s/${shop.id}/import/${source.importId}${placeIn(source)}`}>
            {source.fileName}
            {source.row !== null && `, row ${source.row}`}
            {source.col !== null && `, column ${source.col}`}
          </Link>
        </p>
      )}
      {source?.cells && <p className="text-label text-soft">{source.cells.filter(Boolean).join(' · ')}</p>}
      {shares.length > 0 && (
        <div>
          <h3 className="field-label">One bill over {shares.length} rebuilds</h3>
          <ul>
            {shares.map((share) => (
              <li key={share.id} className="flex justify-between gap-4">
                <span>{share.rebuildTag ?? 'Overhead'}</span>
                <Money cents={share.cents} shown="always" />
              </li>
            ))}
          </ul>
        </div>
      )}
    </section>
  );
}

/** The end of the address that shows the very cell in its file. */
function placeIn({ sheet, row, col }: { sheet: number | null; row: number | null; col: number | null }): string {
  if (row === null) return '';
  return `?sheet=${sheet ?? 1}&row=${row}${col === null ? '' : `&col=${col}`}`;
}
