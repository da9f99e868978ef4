import { type ReactNode, useState } from 'react';
import { Button } from './button.tsx';

/** The filters above a list; on a phone they wait behind one button. `label` for the ear; `count` of those in use. */
export function FilterBar({ label, count, children }: { label: string; count: number; children: ReactNode }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <div role="search" aria-label={label} className="filter-frame no-print">
      <Button size="small" className="filter-toggle" aria-expanded={isOpen} onClick={() => setOpen(!isOpen)}>
        {count === 0 ? 'Filters' : `Filters (${count} in use)`}
      </Button>
      <div className="filter-bar" data-open={isOpen || undefined}>
        {children}
      </div>
    </div>
  );
}
