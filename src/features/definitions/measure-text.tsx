import type { Measure } from './measures.ts';

/** One measure: what it says, how it is worked out, what is left out. Its heading is what links lead to. */
export function MeasureText({ measure }: { measure: Measure }) {
  const { id, title, says, formula, edges, example, source } = measure;
  return (
    <section id={id} aria-labelledby={`${id}-title`} className="scroll-mt-6">
      <h3 id={`${id}-title`} tabIndex={-1} className="text-lead font-[660]">
        {title}
      </h3>
      <p className="mt-1">{says}</p>
      <p className="mt-2 border-l-4 border-rule pl-4">{formula}</p>
      <p className="mt-2 text-soft">{edges}</p>
      {example && <p className="mt-2 tabular-nums">Example: {example}</p>}
      {source && <p className="mt-2 text-label text-soft">Method: {source}</p>}
    </section>
  );
}
