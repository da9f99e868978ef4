import { useEffect } from 'react';
import { useLocation } from 'react-router-dom';
import { MeasureText } from '../features/definitions/measure-text.tsx';
import { MEASURES } from '../features/definitions/measures.ts';
import { PageHeader } from '../ui/answer-header.tsx';
import { Panel } from '../ui/panel.tsx';

/** Every measure once, in plain words; each has an address of its own, which "How this is worked out" links to. */
export function DefinitionsPage() {
  useHashTarget();
  return (
    <>
      <PageHeader
        title="How figures are worked out"
        note="One meaning for each measure, the same on every page. With this shop's own figures put in it stands on each page under “How this is worked out”."
      />
      <nav aria-label="Measures" className="no-print mb-6">
        <ul className="flex flex-wrap gap-x-5 gap-y-1">
          {MEASURES.flatMap(({ measures }) => measures).map(({ id, title }) => (
            <li key={id} className="min-h-6">
              <a href={`#${id}`}>{title}</a>
            </li>
          ))}
        </ul>
      </nav>
      {MEASURES.map(({ title, measures }) => (
        <Panel key={title} className="mb-6" title={title}>
          <div className="grid max-w-[58rem] gap-7">
            {measures.map((measure) => (
              <MeasureText key={measure.id} measure={measure} />
            ))}
          </div>
        </Panel>
      ))}
    </>
  );
}

/** Moves to the measure that the address names: the page comes after its address, so the browser does not. */
function useHashTarget(): void {
  const { hash } = useLocation();
  useEffect(() => {
    const title = document.getElementById(`${hash.slice(1)}-title`);
    title?.scrollIntoView();
    title?.focus({ preventScroll: true });
  }, [hash]);
}
