import type { ReactNode } from 'react';
import { Button } from './button.tsx';

/** An empty page that teaches: what will stand here (`title`, children) and the one `action` that gets there. */
export function EmptyState({ title, children, action }: { title: string; children?: ReactNode; action?: ReactNode }) {
  return (
    <section className="panel grid justify-items-start gap-3 border-dashed border-edge py-10">
      <h2 className="text-lead font-bold">{title}</h2>
      {children && <div className="max-w-[38rem] text-soft">{children}</div>}
      {action && <div className="mt-1 flex flex-wrap gap-3">{action}</div>}
    </section>
  );
}

const WIDTHS = ['w-11/12', 'w-3/4', 'w-5/6', 'w-2/3', 'w-4/5', 'w-1/2'];

/** While something loads: grey lines where text will stand. `label` is said aloud; `lines` (5). */
export function LoadingState({ label = 'Loading', lines = 5 }: { label?: string; lines?: number }) {
  return (
    <div aria-busy="true" role="status">
      <span className="sr-only">{label}</span>
      <div aria-hidden="true" className="grid gap-4 py-2">
        {Array.from({ length: lines }, (_, at) => (
          <span key={at} className={`skeleton ${WIDTHS[at % WIDTHS.length]}`} />
        ))}
      </div>
    </div>
  );
}

/** Why something did not load, in the server's words, and a way to try again. `error`: anything thrown; `onRetry`. */
export function ErrorState({ error, onRetry }: { error: unknown; onRetry?: () => void }) {
  const { title, detail, requestId } = wordsOf(error);
  return (
    <section role="alert" className="panel grid content-start justify-items-start gap-3 border-l-4 border-l-oxide">
      <h2 className="text-lead font-bold">{title}</h2>
      {detail && <p className="max-w-[38rem] text-soft">{detail}</p>}
      {requestId && <p className="text-label text-soft">Quote this number if you ask about it: {requestId}</p>}
      {onRetry && <Button onClick={onRetry}>Try again</Button>}
    </section>
  );
}

const REFUSED: ReadonlySet<unknown> = new Set([400, 409, 413, 415, 422]);

type Words = { title: string; detail: string | null; requestId: string | null };

function wordsOf(error: unknown): Words {
  const problem = typeof error === 'object' && error !== null ? (error as Record<string, unknown>) : {};
  const extra = (problem['extra'] ?? {}) as Record<string, unknown>;
  const text = (value: unknown) => (typeof value === 'string' ? value : null);
  const detail = text(problem['detail']);
  // What HTTP calls a refused request says nothing to people, and there is nothing to look up in the log.
  if (detail !== null && REFUSED.has(problem['status'])) {
    return { title: 'This cannot be taken as it is', detail, requestId: null };
  }
  return {
    title: text(problem['title']) ?? 'This page ran into an error of ours',
    detail: detail ?? (problem['title'] ? null : 'What you saved is safe. Try again; if it stays, reload the page.'),
    requestId: text(extra['requestId']),
  };
}
