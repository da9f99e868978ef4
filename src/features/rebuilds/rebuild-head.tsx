import { Link } from 'react-router-dom';
import type { RebuildDetail } from '#shared/contracts/rebuilds.ts';
import { AnswerHeader, Mark } from '../../ui/answer-header.tsx';
import { useFormatter } from '../../ui/formatter-context.tsx';

/** Which rebuild, where it stands, how it went so far, and what a careful friend would add. */
export function RebuildHead({ detail, shopId }: { detail: RebuildDetail; shopId: string }) {
  const { row, source } = detail;
  const name = row.name ? `${row.tag} · ${row.name}` : row.tag;
  return (
    <AnswerHeader
      question={`${name} · ${row.stage}`}
      title={name}
      answer={<Outcome detail={detail} />}
      caution={
        <>
          {cautions(detail)}
          {source && (
            <>
              {' '}
              Came in with <Link to={`/s/${shopId}/import/${source.importId}`}>{source.fileName}</Link>
              {source.row !== null && `, row ${source.row}`}.
            </>
          )}
        </>
      }
    />
  );
}

function Outcome({ detail: { row } }: { detail: RebuildDetail }) {
  const format = useFormatter();
  if (row.keptCents !== null) {
    const verb = row.keptCents < 0 ? 'It lost' : 'It kept';
    return (
      <>
        {verb} <Mark>{format.money(Math.abs(row.keptCents))}</Mark>
        {row.keptPerHourCents !== null && row.ownSeconds !== null && (
          <>
            : <Mark>{format.money(row.keptPerHourCents)}</Mark> for each of its {format.hours(row.ownSeconds)} own hours
          </>
        )}
        .
      </>
    );
  }
  if (row.leftOn !== null)
    return <>It has left, but what it cost to buy is not known: nothing can be said of what it kept.</>;
  if (row.costCents === null) return <>Nothing is known of its purchase yet.</>;
  return (
    <>
      It holds <Mark>{format.money(row.costCents)}</Mark> so far
      {row.daysHeld !== null && <>, {format.days(row.daysHeld)} after it was bought</>}.
    </>
  );
}

function cautions({
  row,
  rebuild,
  secondDamageName,
  undatedCount,
  unknownForeseenCount,
  lateCount,
}: RebuildDetail): string {
  const damage = [row.damageName, secondDamageName].filter(Boolean).join(' and ');
  const seen =
    rebuild.isSeen === null
      ? 'not said whether seen before buying'
      : rebuild.isSeen
        ? 'seen before buying'
        : 'bought from pictures';
  const what = [row.className, damage && `${damage} damage`, seen].filter(Boolean).join(', ');
  const notes = [
    `${what.charAt(0).toUpperCase()}${what.slice(1)}.`,
    unknownForeseenCount > 0 &&
      `Of ${entries(unknownForeseenCount)} nobody said whether foreseen, so it is left out of surprise shares.`,
    undatedCount > 0 && `${entries(undatedCount, true)} without a day: no yearly return.`,
    lateCount > 0 && `${entries(lateCount, true)} dated after it left, counted with it.`,
  ];
  return notes.filter(Boolean).join(' ');
}

const entries = (count: number, capital = false) => {
  const words = count === 1 ? 'one entry' : `${count} entries`;
  return capital ? words.charAt(0).toUpperCase() + words.slice(1) : words;
};
