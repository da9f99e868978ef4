import type { ReactNode } from 'react';

type Props = {
  title: string;
  subtitle?: ReactNode;
  actions?: ReactNode;
  children: ReactNode;
  className?: string;
  id?: string;
};

/** A sheet with a title. `title`, `subtitle`, `actions` (at the right of the title), `className` (grid placement), `id` (to lead to it). */
export function Panel({ title, subtitle, actions, children, className, id }: Props) {
  return (
    <section id={id} className={`panel ${className ?? ''}`}>
      <div className="mb-4 flex flex-wrap items-start justify-between gap-x-6 gap-y-2">
        <div className="min-w-[14rem] flex-1">
          <h2 className="text-lead leading-snug font-[660]">{title}</h2>
          {subtitle && <p className="text-soft">{subtitle}</p>}
        </div>
        {actions && <div className="no-print flex flex-wrap gap-2">{actions}</div>}
      </div>
      {children}
    </section>
  );
}

/** A sheet that opens by its title: for what proves more than most visits ask. Closed, it is not printed. */
export function FoldedPanel({ title, subtitle, children }: Omit<Props, 'actions' | 'className'>) {
  return (
    <details className="panel disclosure mb-6">
      <summary className="min-h-6">
        <h2 className="inline text-lead leading-snug font-[660]">{title}</h2>
        {subtitle && <span className="block text-soft">{subtitle}</span>}
      </summary>
      <div className="mt-4">{children}</div>
    </details>
  );
}

/** Panels beside each other where there is room: `wide` gives the first about three fifths. */
export function Panels({ children, wide = false }: { children: ReactNode; wide?: boolean }) {
  return (
    <div className={`mb-6 grid gap-6 ${wide ? 'xl:grid-cols-[minmax(0,7fr)_minmax(0,5fr)]' : 'lg:grid-cols-2'}`}>
      {children}
    </div>
  );
}

/** "How this is worked out": opens the formula in words with this shop's figures. Children: what it says; `label` to say it otherwise. */
export function HowWorkedOut({ children, label = 'How this is worked out' }: { children: ReactNode; label?: string }) {
  return (
    <details className="disclosure min-w-0">
      <summary className="inline-block min-h-6 text-steel underline underline-offset-3">{label}</summary>
      <div className="mt-3 grid min-w-0 max-w-[58rem] gap-2 border-l-4 border-rule pl-4 *:min-w-0">{children}</div>
    </details>
  );
}
