import { Dialog } from '../ui/dialog.tsx';
import { type KeyHelp, useShownKeys } from '../ui/page-keys.ts';

const EVERYWHERE: readonly KeyHelp[] = [
  { keys: 'Ctrl K or ⌘ K', does: 'Find a rebuild, a page or an action' },
  { keys: '?', does: 'This list' },
  { keys: 'Esc', does: 'Close what is open' },
  { keys: 'Arrow keys', does: 'On a picture: from one rebuild to the next; Enter opens it' },
];

/** The keys: those that work everywhere, then those of the page below. */
export function KeysHelp({ onClose }: { onClose: () => void }) {
  const shown = useShownKeys();
  return (
    <Dialog open onClose={onClose} title="Keys">
      {shown.length > 0 && <KeyList title="On this page" keys={shown} />}
      <KeyList title="Everywhere" keys={EVERYWHERE} />
    </Dialog>
  );
}

function KeyList({ title, keys }: { title: string; keys: readonly KeyHelp[] }) {
  return (
    <section>
      <h3 className="field-label mb-1">{title}</h3>
      <dl className="grid grid-cols-[9rem_1fr] gap-y-1.5">
        {keys.map((key) => (
          <div key={key.keys} className="contents">
            <dt className="font-[640]">{key.keys}</dt>
            <dd className="text-soft">{key.does}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
