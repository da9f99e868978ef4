import type { Reading } from '#shared/contracts/import-reading.ts';
import { LinkButton } from '../../../ui/button.tsx';
import { useFormatter } from '../../../ui/formatter-context.tsx';
import { Panel } from '../../../ui/panel.tsx';

const ANSWERS = [
  { path: 'year', label: 'Did the work pay this year?' },
  { path: 'what-pays', label: 'Which wrecks pay?' },
  { path: 'overruns', label: 'Where does the money run over?' },
  { path: 'rebuilds', label: 'The rebuilds' },
];

/** Once a file is booked: where its rows speak, and what is left to do by hand. `to` gives an address of the shop. */
export function AfterBooking({ reading, to }: { reading: Reading; to: (path: string) => string }) {
  const format = useFormatter();
  const { asideCount } = reading;
  return (
    <Panel title="It is in. What it says now" className="mb-6">
      <div className="flex flex-wrap gap-3">
        {ANSWERS.map(({ path, label }, at) => (
          <LinkButton key={path} to={to(path)} kind={at === 0 ? 'main' : 'quiet'}>
            {label}
          </LinkButton>
        ))}
      </div>
      {asideCount > 0 && (
        <p className="mt-4 text-soft">
          {format.count(asideCount, 'place')} {asideCount === 1 ? 'was' : 'were'} left aside and{' '}
          {asideCount === 1 ? 'is' : 'are'} listed below. Enter by hand in the ledger what matters.
        </p>
      )}
    </Panel>
  );
}
