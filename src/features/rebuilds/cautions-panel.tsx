import { useState } from 'react';
import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { Button } from '../../ui/button.tsx';

/** Cautions for the kind of work on this one; each can be put away, and comes back on the next vehicle. */
export function CautionsPanel({ detail }: { detail: RebuildDetail }) {
  const [putAway, setPutAway] = useState(() => readPutAway(detail.rebuild.id));
  const shown = detail.cautions.filter((caution) => caution.asked === null && !putAway.includes(caution.about));
  if (shown.length === 0) return null;
  const onPutAway = (about: string) => {
    const all = [...putAway, about];
    setPutAway(all);
    sessionStorage.setItem(keyOf(detail.rebuild.id), all.join('|'));
  };
  return (
    <ul aria-label="Cautions" className="mb-6 grid gap-2">
      {shown.map((caution) => (
        <li key={caution.about} className="caution-note">
          <p>
            <strong className="font-[680]">{`Caution, ${caution.about}. `}</strong>
            {caution.text}
          </p>
          <Button
            size="small"
            kind="plain"
            className="flex-none"
            onClick={() => onPutAway(caution.about)}
            aria-label={`Put away the caution on ${caution.about}`}
          >
            Put away
          </Button>
        </li>
      ))}
    </ul>
  );
}

const keyOf = (rebuildId: string) => `cautions-${rebuildId}`;

function readPutAway(rebuildId: string): string[] {
  return sessionStorage.getItem(keyOf(rebuildId))?.split('|') ?? [];
}
