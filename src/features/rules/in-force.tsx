import type { ContingencyAnswer } from '#shared/contracts/answers-contingency.ts';
import type { Formatter } from '#shared/formatter.ts';
import { useFormatter } from '../../ui/formatter-context.tsx';
import { ruleText } from './rule-words.ts';

type Year = ContingencyAnswer['thisYear'];

/** The rules of this year and the next, and how this year's has done on what was bought under it and is finished. */
export function InForce({ years }: { years: readonly Year[] }) {
  const format = useFormatter();
  if (years.every(({ rule }) => rule === null)) {
    return <p>No rule is adopted for {years.map(({ year }) => year).join(' or ')} yet.</p>;
  }
  return (
    <ul className="grid gap-1">
      {years.map((one) => (
        <li key={one.year}>{inForceText(one, format)}</li>
      ))}
    </ul>
  );
}

/** `In force for 2026: 18%, adopted 3 Jan 2026. It covered 6 of the 9 bought since and finished; 2 are not finished.` */
export function inForceText({ year, rule }: Year, format: Formatter): string {
  if (!rule) return `No rule is adopted for ${year} yet.`;
  const adopted = `In force for ${year}: ${ruleText(rule, format)}, adopted ${format.day(rule.adoptedOn)}.`;
  return `${adopted} ${recordText(rule.record, format)}`;
}

function recordText(record: NonNullable<Year['rule']>['record'], format: Formatter): string {
  const open =
    record.openCount === 0 ? '' : `${record.openCount} ${record.openCount === 1 ? 'is' : 'are'} not finished`;
  if (record.n === 0) {
    return open ? `Nothing bought under it has left yet; ${open}.` : 'Nothing has been bought under it so far.';
  }
  const short = record.shortCents > 0 ? `, short by ${format.money(record.shortCents)} in all` : '';
  return `It covered ${record.x} of ${record.n} bought since and finished${short}${open ? `; ${open}` : ''}.`;
}
