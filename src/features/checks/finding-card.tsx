import { Link } from 'react-router-dom';
import type { CheckItem, Finding } from '#shared/contracts/checks.ts';
import { Button } from '../../ui/button.tsx';
import { Money } from '../../ui/figures.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { itemAddress } from './item-address.ts';
import { useSettleCheck } from './queries.ts';
import { ANSWER_NAMES, CHECK_WORDS } from './words.ts';

type Props = { finding: Finding; shopPath: string; canSettle: boolean };

/** One kind of fault: what it does to which answer, how to mend it, and, opened, each place where it stands. */
export function FindingCard({ finding, shopPath, canSettle }: Props) {
  const format = useFormatter();
  const { title, effect, mend } = CHECK_WORDS[finding.kind];
  const hidden = finding.count + finding.settledCount - finding.items.length;
  return (
    <li className="border-t border-rule py-4 first:border-t-0 first:pt-0 last:pb-0">
      <details>
        <summary className="min-h-6">
          <strong className="font-[640]">{title}</strong>: <HowMany finding={finding} />
        </summary>
        <ul className="mt-3 mb-1 grid gap-1 border-l-4 border-rule pl-4">
          {finding.items.map((item) => (
            <Item key={item.key} {...{ item, finding, shopPath, canSettle }} />
          ))}
          {hidden > 0 && <li>and {format.number(hidden)} more</li>}
        </ul>
      </details>
      <p className="mt-1 max-w-[46rem] text-soft">{effect}</p>
      <p className="mt-1 max-w-[46rem]">{mend}</p>
      {finding.answers.length > 0 && (
        <p className="mt-1 flex flex-wrap gap-x-4 text-soft">
          <span>Bends</span>
          {finding.answers.map((answer) => (
            <Link key={answer} to={`${shopPath}/${answer}`}>
              {ANSWER_NAMES[answer]}
            </Link>
          ))}
        </p>
      )}
    </li>
  );
}

function HowMany({ finding: { count, among, cents, settledCount } }: { finding: Finding }) {
  const format = useFormatter();
  return (
    <>
      {among === null ? format.number(count) : `${format.number(count)} of ${format.count(among, 'rebuild')}`}
      {cents !== null && (
        <>
          , <Money cents={cents} shown="always" /> in question
        </>
      )}
      {settledCount > 0 && <span className="text-soft"> · {format.number(settledCount)} said to be right</span>}
    </>
  );
}

function Item({ item, finding, shopPath, canSettle }: Props & { item: CheckItem }) {
  const format = useFormatter();
  const settle = useSettleCheck();
  const address = itemAddress(finding.kind, item);
  const { rebuild, text, on, cents, isSettled } = item;
  const named = rebuild ? [rebuild.tag, rebuild.name].filter(Boolean).join(' · ') : null;
  const label = named ?? text ?? 'Overhead';
  const beside = [named === null ? null : text, on === null ? null : format.day(on)].filter(Boolean).join(', ');
  return (
    <li className="flex flex-wrap items-center gap-x-4 gap-y-1">
      <span className={`min-w-0 flex-1 basis-72 ${isSettled ? 'text-soft' : ''}`}>
        {address === null ? label : <Link to={`${shopPath}/${address}`}>{label}</Link>}
        {beside && <span className="text-soft"> · {beside}</span>}
        {cents !== null && (
          <>
            {' '}
            · <Money cents={cents} shown="always" />
          </>
        )}
      </span>
      {canSettle && (
        <Button
          kind="quiet"
          disabled={settle.isPending}
          onClick={() => settle.mutate({ kind: finding.kind, key: item.key, isSettled: !isSettled })}
          aria-label={isSettled ? `Look at ${label} again` : `${label} is right as it is`}
        >
          {isSettled ? 'Look again' : 'It is right'}
        </Button>
      )}
      {settle.isError && (
        <span role="alert" className="basis-full text-oxide">
          {settle.error.message}
        </span>
      )}
    </li>
  );
}
