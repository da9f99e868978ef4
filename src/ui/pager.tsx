import { Button } from './button.tsx';

/** Leads to the next piece of a long list. `hasMore`, `onMore`, `busy`, `size` (100), `shown` (how many stand there). */
export function Pager(props: {
  hasMore: boolean;
  onMore: () => void;
  busy?: boolean;
  size?: number;
  shown: number;
  noun?: string;
}) {
  const { hasMore, onMore, busy = false, size = 100, shown, noun = 'lines' } = props;
  if (!hasMore) return null;
  return (
    <div className="no-print mt-4 flex items-center gap-4">
      <Button onClick={onMore} busy={busy}>
        Next {size}
      </Button>
      <span className="text-soft">
        {shown} {noun} shown, more follow
      </span>
    </div>
  );
}
